/** The tests that mutation testing runs: those named in HALFSPACE_MUTATE_TESTS, and no others. See tools/mutate.mjs. */
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: (process.env['HALFSPACE_MUTATE_TESTS'] ?? 'test/num/**/*.test.ts').split(' '),
    testTimeout: 60_000,
  },
});
