import { defineConfig } from 'vitest/config';

// One run: engine and shared code, published truth, the API, what goes wrong, and the screens' parts in jsdom.
export default defineConfig({
  test: {
    projects: [
      { test: { name: 'shared', include: ['shared/src/**/*.test.ts'], environment: 'node' } },
      { test: { name: 'truth', include: ['tests/truth/**/*.test.ts'], environment: 'node' } },
      {
        test: {
          name: 'backend',
          include: ['backend/src/**/*.test.ts', 'tests/start/**/*.test.ts'],
          environment: 'node',
          testTimeout: 20_000,
          globalSetup: './tests/support/seeded-database.ts',
        },
      },
      {
        test: {
          name: 'faults',
          include: ['tests/faults/**/*.test.ts'],
          environment: 'node',
          testTimeout: 120_000,
          globalSetup: './tests/support/seeded-database.ts',
        },
      },
      {
        extends: './frontend/vite.config.ts',
        test: { name: 'frontend', include: ['frontend/src/**/*.test.{ts,tsx}'], environment: 'jsdom' },
      },
    ],
  },
});
