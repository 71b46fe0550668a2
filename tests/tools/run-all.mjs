import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureChromium } from './browser.mjs';

/**
 * `npm test`: every check that a change must pass, one after the other, with one closing line.
 * Tools that only say yes or no (types, import rules, …) count as one check each.
 */
const root = fileURLToPath(new URL('../..', import.meta.url));
const scratch = mkdtempSync(join(tmpdir(), 'notchwork-'));

function run(command, args, environment = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, {
      cwd: root,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, ...environment },
    });
    child.on('error', (error) => {
      console.error(error.message);
      resolve(1);
    });
    child.on('close', (code) => resolve(code ?? 1));
  });
}

const bin = (name) => join(root, 'node_modules', '.bin', name);

/** A tool without a count of its own. */
async function tool(name, command, args) {
  const code = await run(bin(command), args);
  return { name, passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
}

function readJson(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/** A Vitest project; a run that ends badly without counting a failure still fails. */
async function vitest(project) {
  const file = join(scratch, `${project}.json`);
  const code = await run(bin('vitest'), [
    'run',
    '--config',
    '.config/vitest.config.ts',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${file}`,
  ]);
  const report = readJson(file);
  const passed = report?.numPassedTests ?? 0;
  const failed = report?.numFailedTests ?? 0;
  return { name: project, passed, failed: failed || (code === 0 && passed > 0 ? 0 : 1) };
}

async function browser() {
  const file = join(scratch, 'browser.json');
  const code = await run(bin('web-test-runner'), ['--config', '.config/web-test-runner.config.mjs'], {
    NOTCHWORK_SUMMARY: file,
  });
  const report = readJson(file);
  const passed = report?.passed ?? 0;
  const failed = report?.failed ?? 0;
  return { name: 'browser', passed, failed: failed || (code === 0 && passed > 0 ? 0 : 1) };
}

const results = [];
async function step(title, action) {
  const start = Date.now();
  console.log(`\n── ${title}`);
  const result = await action();
  results.push(result);
  console.log(
    `── ${title}: ${result.failed === 0 ? 'passed' : 'FAILED'} in ${((Date.now() - start) / 1000).toFixed(0)} s`,
  );
}

await ensureChromium();
await step('format and lint', () => tool('lint', 'biome', ['check', '--error-on-warnings', '.']));
await step('types', () => tool('types', 'tsc', ['--noEmit']));
await step('types of the pure rooms, without the DOM', () =>
  tool('pure types', 'tsc', ['--noEmit', '--project', '.config/tsconfig.pure.json']),
);
await step('import rules', async () => {
  const code = await run(process.execPath, ['tests/tools/check-imports.mjs']);
  return { name: 'imports', passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
});
await step('unused code', () => tool('unused', 'knip', ['--config', '.config/knip.json']));
await step('unit tests and references', () => vitest('unit'));
await step('elements and sound in Chromium', browser);
await step('the main job, end to end', () => vitest('e2e'));

rmSync(scratch, { recursive: true, force: true });
const sum = (key) => results.reduce((total, result) => total + result[key], 0);
console.log('');
for (const { name, passed, failed } of results) console.log(`${name}: ${passed} passed, ${failed} failed`);
console.log(`\n${sum('passed')} passed, ${sum('failed')} failed`);
process.exit(sum('failed') === 0 ? 0 : 1);
