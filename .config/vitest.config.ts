import { defineConfig } from 'vitest/config';

/**
 * Three groups: `unit` (everything that needs no browser), `e2e` (a real browser driven from Node)
 * and `soak` (long runs, never part of `npm test`). Browser component tests run in Web Test Runner.
 */
export default defineConfig({
  root: new URL('..', import.meta.url).pathname,
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/{reference,src,demo-audio}/**/*.test.ts'],
          exclude: ['tests/**/*.browser.test.ts'],
          testTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          testTimeout: 180_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
      {
        test: {
          name: 'soak',
          environment: 'node',
          include: ['tests/soak/**/*.test.ts'],
          testTimeout: 3_600_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
