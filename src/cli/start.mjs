import { readdirSync, statSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';

/** `npm run cli`: runs the bundled command, bundling it first when a source file is newer. */
const source = fileURLToPath(new URL('..', import.meta.url));
const bundle = fileURLToPath(new URL('../../dist/cli/main.mjs', import.meta.url));

function newest(folder) {
  let latest = 0;
  for (const entry of readdirSync(folder, { withFileTypes: true, recursive: true })) {
    if (entry.isFile() && entry.name.endsWith('.ts')) {
      latest = Math.max(latest, statSync(`${entry.path}/${entry.name}`).mtimeMs);
    }
  }
  return latest;
}

const built = statSync(bundle, { throwIfNoEntry: false })?.mtimeMs ?? 0;
if (newest(source) > built) {
  const { buildCommand } = await import('./build.mjs');
  await buildCommand();
}
const { main } = await import(pathToFileURL(bundle).href);
process.exitCode = await main(process.argv.slice(2));
