import { fileURLToPath } from 'node:url';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));

export default defineConfig({
  root,
  base: './',
  plugins: [react(), tailwindcss()],
  html: { cspNonce: '__CSP_NONCE__' },
  worker: { format: 'es' },
  optimizeDeps: { include: ['odex'] },
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    assetsInlineLimit: 0,
    target: 'es2022',
    manifest: true,
    // Browsers that do not preload modules load them all the same.
    modulePreload: { polyfill: false },
  },
  server: { host: '127.0.0.1' },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          environment: 'node',
          testTimeout: 30_000,
          include: ['shared/**/*.test.ts', 'server/**/*.test.ts', 'src/**/*.test.ts', 'tests/architecture/**/*.test.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'web',
          environment: 'jsdom',
          include: ['src/**/*.test.tsx'],
          testTimeout: 30_000,
          setupFiles: ['tests/support/web-setup.ts'],
        },
      },
      {
        extends: true,
        test: { name: 'physics', environment: 'node', include: ['tests/physics/**/*.test.ts'], testTimeout: 120_000, hookTimeout: 120_000 },
      },
      {
        extends: true,
        test: {
          name: 'api',
          environment: 'node',
          include: ['tests/api/**/*.test.ts'],
          testTimeout: 60_000,
          hookTimeout: 120_000,
          globalSetup: ['tests/support/api-setup.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          testTimeout: 180_000,
          hookTimeout: 180_000,
          fileParallelism: false,
          globalSetup: ['tests/support/browser-setup.ts'],
        },
      },
    ],
  },
});
