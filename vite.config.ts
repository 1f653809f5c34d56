import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const apiPort = process.env.API_PORT ?? '4173';
const withMariadb = ['tests/support/mariadb-global-setup.ts'];
const minuteMs = 60_000;

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'dist/client', emptyOutDir: true },
  server: { proxy: { '/api': `http://127.0.0.1:${apiPort}` } },
  test: {
    env: { TZ: 'UTC' },
    // A forgotten `.only` would let the other tests of its file pass unrun.
    allowOnly: false,
    // Two cores: more workers only wait for each other.
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'shared',
          environment: 'node',
          include: ['tests/shared/**/*.test.ts', 'tests/fixtures/**/*.test.ts'],
          testTimeout: minuteMs,
        },
      },
      {
        extends: true,
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/server/**/*.test.ts', 'tests/architecture/**/*.test.ts'],
          globalSetup: withMariadb,
          testTimeout: minuteMs,
          hookTimeout: minuteMs,
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          // A person's clicks take seconds where other work shares the cores.
          testTimeout: minuteMs,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: withMariadb,
          testTimeout: 5 * minuteMs,
          hookTimeout: 5 * minuteMs,
          fileParallelism: false,
        },
      },
    ],
  },
});
