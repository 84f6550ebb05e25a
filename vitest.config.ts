import { defineConfig } from 'vitest/config';

/**
 * Three projects: `unit` (pure code, no services), `server` (real PostgreSQL, one clone of a
 * migrated template per file) and `client` (components under happy-dom).
 */
export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/shared/**/*.test.ts', 'tests/data/**/*.test.ts', 'tests/charts/**/*.test.ts'],
        },
      },
      {
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/server/**/*.test.ts', 'tests/db/**/*.test.ts'],
          globalSetup: ['tests/support/globalSetup.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
    ],
  },
});
