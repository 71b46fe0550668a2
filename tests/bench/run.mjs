import { mkdirSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'esbuild';

/**
 * `npm run bench [words…]`: runs every `*.bench.ts` beside this file whose name holds one of the words
 * (all without words), and prints `what | ratio | aim`. A ratio over its aim is marked, and the run
 * then ends with 1.
 */
const here = fileURLToPath(new URL('.', import.meta.url));
const wanted = process.argv.slice(2);
const files = readdirSync(here)
  .filter((file) => file.endsWith('.bench.ts'))
  .filter((file) => wanted.length === 0 || wanted.some((word) => file.includes(word)))
  .sort();
// Inside node_modules, so that packages left out of a bundle are found.
const cache = fileURLToPath(new URL('../../node_modules/.cache/', import.meta.url));
mkdirSync(cache, { recursive: true });
const scratch = mkdtempSync(join(cache, 'notchwork-bench-'));

/** Bundles one benchmark and measures its rows; each file gets modules of its own, so none warms another's. */
async function measure(file) {
  const outfile = join(scratch, file.replace(/\.ts$/, '.mjs'));
  await build({
    entryPoints: [join(here, file)],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    logLevel: 'error',
  });
  const { rows } = await import(pathToFileURL(outfile).href);
  return rows();
}

const table = [];
try {
  for (const file of files) {
    for (const row of await measure(file)) table.push(row);
  }
} finally {
  rmSync(scratch, { recursive: true, force: true });
}

if (table.length === 0) {
  console.error(`No benchmark is named ${wanted.join(' or ')}.`);
  process.exit(2);
}
const width = Math.max(...table.map(({ what }) => what.length));
const line = (what, ratio, aim) =>
  console.log(`${what.padEnd(width)} | ${ratio.padStart(7)} | ${aim}`.trimEnd());
line('what', 'ratio', 'aim');
line('-'.repeat(width), '-'.repeat(7), '-'.repeat(8));
let missed = 0;
for (const { what, ratio, aim } of table) {
  const over = aim !== undefined && !(ratio <= aim);
  if (over) missed += 1;
  line(what, ratio.toFixed(2), aim === undefined ? '' : `≤ ${aim}${over ? '  MISSED' : ''}`);
}
process.exitCode = missed > 0 ? 1 : 0;
