import { mkdir } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = fileURLToPath(new URL('../..', import.meta.url));

/** Where the bundled command lies; built by `npm ci` and again whenever a source file is newer. */
export const bundle = fileURLToPath(new URL('../../dist/cli/main.mjs', import.meta.url));

/** Bundles the command into one file that plain Node runs. */
export async function buildCommand() {
  await mkdir(new URL('../../dist/cli/', import.meta.url), { recursive: true });
  await build({
    absWorkingDir: root,
    entryPoints: ['src/cli/main.ts'],
    outfile: bundle,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    sourcemap: 'inline',
    sourcesContent: false,
    logLevel: 'warning',
  });
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await buildCommand();
