import { defineConfig } from 'vitest/config';

const conditions = ['holdwater-source', 'module', 'node', 'development|production'];

export default defineConfig({
  resolve: { conditions },
  ssr: { resolve: { conditions } },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'node',
          include: ['{shared-types,fake-services,backend}/src/**/*.spec.ts', 'tests/**/*.spec.ts'],
          environment: 'node',
          env: { TZ: 'UTC' },
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        oxc: { jsx: { runtime: 'automatic' } },
        test: {
          name: 'page',
          include: ['frontend/src/**/*.spec.{ts,tsx}'],
          environment: 'jsdom',
          setupFiles: ['frontend/src/test-setup.ts'],
          testTimeout: 60_000,
        },
      },
    ],
    globalSetup: ['backend/src/testing/global-setup.ts'],
    exclude: ['**/node_modules/**', '**/dist/**'],
    maxWorkers: 2,
  },
});
