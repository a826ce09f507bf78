import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/**/*.test.{ts,tsx}'],
    pool: 'forks',
    isolate: false,
    testTimeout: 20_000,
    hookTimeout: 60_000,
  },
});
