/** The tests of the standalone executable, which `npm run standalone` makes and names in HALFSPACE_STANDALONE. */
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: { include: ['test/packaging/standalone.check.ts'], testTimeout: 60_000, hookTimeout: 60_000 },
});
