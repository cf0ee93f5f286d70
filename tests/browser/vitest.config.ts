import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');

/** Browser tests: one server at a time, on the production build, with simulated stations on a clock 20 times real time. */
export default defineConfig({
  root,
  resolve: { alias: { '@': root } },
  test: {
    pool: 'forks',
    maxWorkers: 1,
    fileParallelism: false,
    testTimeout: 120_000,
    hookTimeout: 120_000,
    include: ['tests/browser/**/*.test.ts'],
  },
});
