import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** The server in production: plain files side by side, one for each entry and each thread; packages stay outside. */
export default defineConfig({
  root: here('.'),
  publicDir: false,
  build: {
    ssr: true,
    target: 'node20',
    minify: false,
    outDir: here('../dist/server'),
    emptyOutDir: true,
    rolldownOptions: {
      input: {
        main: here('main.ts'),
        config: here('config.ts'),
        simulate: here('cli/simulate.ts'),
        schema: here('cli/schema.ts'),
        shops: here('cli/shops.ts'),
        'simulate.thread': here('jobs/simulate.thread.ts'),
      },
      output: {
        entryFileNames: '[name].js',
        chunkFileNames: '[name]-[hash].js',
      },
    },
  },
});
