import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'dist/client', emptyOutDir: true },
  test: {
    env: { TZ: 'UTC' },
    reporters: ['default'],
    projects: [
      {
        extends: true,
        test: { name: 'shared', environment: 'node', include: ['tests/shared/**/*.test.ts'] },
      },
      {
        extends: true,
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/server/**/*.test.ts', 'tests/architecture/**/*.test.ts'],
        },
      },
      {
        extends: true,
        test: { name: 'client', environment: 'jsdom', include: ['tests/client/**/*.test.{ts,tsx}'] },
      },
      {
        extends: true,
        test: { name: 'e2e', environment: 'node', include: ['tests/e2e/**/*.test.ts'] },
      },
    ],
  },
});
