import { fileURLToPath } from 'node:url';
import { defineConfig, type Plugin } from 'vite';

const root = fileURLToPath(new URL('..', import.meta.url));

/**
 * Takes the indents out of the templates that elements carry as text. Runs on minified code of our own
 * chunks, where line breaks are left in template literals only, and there count as one space.
 */
function shorterTemplates(): Plugin {
  return {
    name: 'shorter-templates',
    apply: 'build',
    generateBundle(_, bundle) {
      for (const chunk of Object.values(bundle)) {
        if (chunk.type !== 'chunk' || !/^(index|nw-)/.test(chunk.name)) continue;
        chunk.code = chunk.code.replace(/\n\s*(?!\/\/#)/g, ' ');
      }
    },
  };
}

/** Takes what a browser does not need out of the styles that elements carry as text. */
function shorterStyles(): Plugin {
  return {
    name: 'shorter-styles',
    apply: 'build',
    enforce: 'pre',
    transform(code, id) {
      if (!/components\/(theme|.*\.styles)\.ts$/.test(id)) return undefined;
      const shorter = code.replace(/css`[^`]*`/g, (text) =>
        text
          .replace(/\/\*[\s\S]*?\*\//g, '')
          .replace(/\s+/g, ' ')
          .replace(/ ?([{};,]) ?/g, '$1')
          .replace(/([\w-]): (?=[^{}]*[;}])/g, '$1:')
          .replace(/;}/g, '}'),
      );
      return { code: shorter, map: null };
    },
  };
}

/** The page is served from the root; `npm run build` writes `dist`, which any static host can serve. */
export default defineConfig({
  root,
  base: './',
  publicDir: false,
  plugins: [shorterStyles(), shorterTemplates()],
  resolve: { alias: { '@kurkle/color': `${root}components/chart/no-colour-arithmetic.ts` } },
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
