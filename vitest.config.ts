import { defineConfig } from 'vitest/config';

// Four projects, run in this order by `npm test`: the core and pure code, the screens, the API on a real
// PostgreSQL, and the browser. `npx vitest --project unit` runs one of them.
export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          include: ['shared/**/*.test.ts', 'worker/**/*.test.ts', 'tests/reference/**/*.test.ts'],
          testTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'client',
          // Tests of components begin with a line that asks for jsdom; models need no page.
          environment: 'node',
          include: ['src/**/*.test.{ts,tsx}'],
          testTimeout: 20_000,
        },
      },
      {
        test: {
          name: 'api',
          environment: 'node',
          include: ['server/**/*.test.ts'],
          globalSetup: ['tests/setup/database.ts'],
          fileParallelism: false,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/setup/database.ts'],
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
