import { defineConfig } from 'vitest/config';

export default defineConfig({
  resolve: { tsconfigPaths: true },
  test: {
    include: ['test/**/*.test.ts'],
    environment: 'node',
    pool: 'threads',
    isolate: false,
    testTimeout: 60_000,
  },
});
