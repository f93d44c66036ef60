import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    // Field solvers and whole builds take seconds on a busy machine; a test that hangs still ends.
    testTimeout: 300_000,
    hookTimeout: 300_000,
  },
});
