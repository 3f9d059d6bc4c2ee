// Four kinds of tests by the ending of their name: pure rules, components, the real server, and stories in a browser.
import { defineConfig } from 'vitest/config';

const quiet = ['tests/support/quiet.ts'];
const database = ['tests/support/global-setup.ts'];

export default defineConfig({
  test: {
    allowOnly: false,
    reporters: ['default'],
    projects: [
      {
        test: {
          name: 'unit',
          include: ['tests/**/*.unit.test.ts', 'tests/architecture/*.test.ts'],
          environment: 'node',
          setupFiles: quiet,
          testTimeout: 30_000,
        },
      },
      {
        test: {
          name: 'ui',
          include: ['tests/**/*.ui.test.tsx'],
          environment: 'happy-dom',
          setupFiles: quiet,
          testTimeout: 20_000,
        },
      },
      {
        test: {
          name: 'api',
          include: ['tests/**/*.api.test.ts'],
          environment: 'node',
          globalSetup: database,
          setupFiles: quiet,
          testTimeout: 60_000,
          hookTimeout: 120_000,
          maxWorkers: 2,
        },
      },
      {
        test: {
          name: 'journeys',
          include: ['tests/journeys/*.journey.test.ts'],
          environment: 'node',
          globalSetup: database,
          testTimeout: 240_000,
          hookTimeout: 180_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
