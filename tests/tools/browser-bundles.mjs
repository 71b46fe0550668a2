import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { build } from 'esbuild';

/**
 * Libraries of hundreds of modules (or of CommonJS), bundled once for the browser tests: loading
 * them file by file takes most of a test's time. `splitting` makes them share what they share, so
 * that there is one audio library in a page, not two.
 */
const LIBRARIES = {
  tone: { name: 'tone', hasDefault: false },
  'standardized-audio-context': { name: 'standardized-audio-context', hasDefault: false },
  'chart.js': { name: 'chart', hasDefault: false },
  'chart.js/helpers': { name: 'chart-helpers', hasDefault: false },
  'fast-check': { name: 'fast-check', hasDefault: true },
  'fft.js': { name: 'fft', hasDefault: true, onlyDefault: true },
};

/** Text that changes with the versions of what goes into the bundles. */
function fingerprint(root) {
  const version = (name) =>
    JSON.parse(readFileSync(join(root, 'node_modules', name, 'package.json'), 'utf8')).version;
  const packages = [...new Set(Object.keys(LIBRARIES).map((name) => name.replace('/helpers', '')))];
  const versions = [...packages, 'esbuild'].map((name) => `${name}@${version(name)}`);
  return createHash('sha256')
    .update(JSON.stringify([LIBRARIES, versions]))
    .digest('hex')
    .slice(0, 16);
}

function entryText(specifier, { hasDefault, onlyDefault }) {
  const named = onlyDefault ? '' : `export * from '${specifier}';\n`;
  return named + (hasDefault ? `export { default } from '${specifier}';\n` : '');
}

/**
 * Bundles the libraries unless that was done before, and returns their web paths by specifier.
 *
 * @param root folder of the project, which is also the server's root.
 */
export async function bundleLibraries(root) {
  const relative = `node_modules/.cache/notchwork/browser-${fingerprint(root)}`;
  const folder = join(root, relative);
  if (!existsSync(folder)) {
    const cache = join(root, 'node_modules', '.cache', 'notchwork');
    const work = join(cache, `work-${process.pid}`);
    const source = join(work, 'source');
    mkdirSync(source, { recursive: true });
    const entryPoints = Object.entries(LIBRARIES).map(([specifier, library]) => {
      const file = join(source, `${library.name}.js`);
      writeFileSync(file, entryText(specifier, library));
      return file;
    });
    await build({
      entryPoints,
      outdir: join(work, 'out'),
      bundle: true,
      splitting: true,
      format: 'esm',
      platform: 'browser',
      target: 'es2022',
      define: { 'process.env.NODE_ENV': '"production"' },
      logLevel: 'warning',
    });
    // Two runs side by side may both have built; whichever renames first wins, the other is dropped.
    try {
      renameSync(join(work, 'out'), folder);
    } catch (error) {
      if (!existsSync(folder)) throw error;
    }
    rmSync(work, { recursive: true, force: true });
  }
  return new Map(
    Object.entries(LIBRARIES).map(([specifier, { name }]) => [specifier, `/${relative}/${name}.js`]),
  );
}
