import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';

const unit = ['shared/**/*.test.ts', 'server/**/*.test.ts', 'src/**/*.test.ts', 'src/**/*.test.tsx'];

/** Nothing is painted before the script that knows the chosen theme has run: no flash of the other one. */
const themeBeforePaint: Plugin = {
  name: 'theme-before-paint',
  transformIndexHtml: {
    order: 'post',
    handler: (html) => html.replaceAll('<script type="module"', '<script type="module" blocking="render"'),
  },
};

export default defineConfig({
  plugins: [react(), tailwindcss(), themeBeforePaint],
  build: { outDir: 'dist', target: 'es2022', sourcemap: false, chunkSizeWarningLimit: 4000 },
  server: { port: 5174, proxy: { '/api': `http://127.0.0.1:${process.env['PORT'] ?? '5273'}` } },
  worker: { format: 'es' },
  test: {
    maxWorkers: 2,
    projects: [
      { extends: true, test: { name: 'unit', include: unit, setupFiles: ['tests/setup/quiet.ts'] } },
      { extends: true, test: { name: 'reference', include: ['tests/reference/**/*.test.ts'] } },
      {
        extends: true,
        test: { name: 'properties', include: ['tests/properties/**/*.test.ts'], testTimeout: 60_000 },
      },
      {
        extends: true,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          globalSetup: ['tests/setup/database.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/setup/database.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: { name: 'commands', include: ['tests/setup/**/*.test.ts'], testTimeout: 60_000 },
      },
    ],
  },
});
