import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const shared = { root, setupFiles: ['tests/setup.ts'], passWithNoTests: false };

export default defineConfig({
  root,
  test: {
    passWithNoTests: false,
    reporters: ['default', ['json', { outputFile: '.data/test-report.json' }]],
    projects: [
      { root, test: { ...shared, name: 'geometry', include: ['tests/{geometry,reference}/**/*.test.ts'] } },
      {
        root,
        plugins: [react()],
        test: { ...shared, name: 'client', environment: 'jsdom', include: ['tests/client/**/*.test.{ts,tsx}'] },
      },
      { root, test: { ...shared, name: 'server', include: ['tests/server/**/*.test.ts'], testTimeout: 30_000, hookTimeout: 60_000 } },
      {
        root,
        test: {
          ...shared,
          name: 'browser',
          include: ['tests/browser/**/*.test.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
