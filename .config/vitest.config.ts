import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

// Each project names the root itself: one inherited from elsewhere makes Vitest skip the tests outside it in silence.
const root = fileURLToPath(new URL('..', import.meta.url));
const setupFiles = ['tests/setup.ts'];

export default defineConfig({
  root,
  test: {
    passWithNoTests: false,
    allowOnly: false,
    dangerouslyIgnoreUnhandledErrors: false,
    maxWorkers: 2,
    projects: [
      {
        root,
        test: {
          name: 'geometry',
          // Pure functions leave nothing behind, so the files of a worker share what they have imported.
          isolate: false,
          setupFiles: [...setupFiles, 'tests/setup-properties.ts'],
          include: ['tests/{geometry,reference,structure}/**/*.test.ts'],
          testTimeout: 20_000,
        },
      },
      {
        root,
        test: {
          name: 'client-logic',
          setupFiles,
          isolate: false,
          include: ['tests/client/**/*.test.ts'],
          testTimeout: 20_000,
        },
      },
      {
        root,
        plugins: [react()],
        test: {
          name: 'client',
          setupFiles,
          environment: 'jsdom',
          include: ['tests/client/**/*.test.tsx'],
          testTimeout: 20_000,
        },
      },
      {
        root,
        test: {
          name: 'server',
          setupFiles: [...setupFiles, 'tests/setup-properties.ts'],
          globalSetup: ['tests/setup-database.ts'],
          // Each file has an application and a database of its own, so the files of a worker share what they have imported.
          isolate: false,
          include: ['tests/server/**/*.test.ts'],
          exclude: ['tests/server/start/**'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        root,
        test: {
          name: 'start',
          setupFiles,
          globalSetup: ['tests/setup-database.ts'],
          include: ['tests/server/start/**/*.test.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        root,
        test: {
          name: 'browser',
          setupFiles,
          globalSetup: ['tests/setup-database.ts', 'tests/setup-browser.ts'],
          include: ['tests/browser/**/*.test.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          maxWorkers: 2,
        },
      },
    ],
  },
});
