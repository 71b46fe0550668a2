import { readdirSync, readFileSync } from 'node:fs';

/**
 * Sizes of the built page. The first screen is what the page loads by itself and what its plot loads:
 * every chunk that is imported on the way, however the bundler cut them.
 */
const folder = new URL('./dist/page/assets/', import.meta.url);
const chunks = readdirSync(folder).filter((name) => name.endsWith('.js'));

function withImports(name, seen = new Set()) {
  if (seen.has(name)) return seen;
  seen.add(name);
  const code = readFileSync(new URL(name, folder), 'utf8');
  for (const [, next] of code.matchAll(/(?:from|import)\s*["']\.\/([^"']+\.js)["']/g))
    withImports(next, seen);
  return seen;
}

const first = new Set();
for (const start of ['index', 'plot-chart']) {
  const name = chunks.find((chunk) => chunk.startsWith(`${start}-`));
  if (name === undefined)
    throw new Error(`There is no ${start} chunk in dist/page; run npm run build first.`);
  withImports(name, first);
}

export default [
  {
    name: 'First screen: the page and its plot',
    path: [...first].map((name) => `dist/page/assets/${name}`),
    limit: '100 kB',
    gzip: true,
  },
  { name: 'All JavaScript, sound included', path: 'dist/page/assets/*.js', limit: '220 kB', gzip: true },
];
