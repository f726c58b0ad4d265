import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    environment: 'node',
    setupFiles: ['test/seeded.ts'],
    testTimeout: 30_000,
    hookTimeout: 30_000,
  },
});
