import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const root = fileURLToPath(new URL('..', import.meta.url));

/** The page is served from the root; `npm run build` writes `dist`, which any static host can serve. */
export default defineConfig({
  root,
  base: './',
  publicDir: false,
  worker: { format: 'es' },
  build: {
    outDir: 'dist/page',
    emptyOutDir: true,
    target: 'es2022',
    sourcemap: true,
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
  },
});
