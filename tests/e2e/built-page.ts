import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build, preview } from 'vite';

/** The page as `npm run build` makes it, served on a free port of this machine. */
export async function serveBuiltPage(): Promise<{ readonly url: string; close(): Promise<void> }> {
  const configFile = fileURLToPath(new URL('../../.config/vite.config.ts', import.meta.url));
  const outDir = mkdtempSync(join(tmpdir(), 'notchwork-page-'));
  await build({ configFile, logLevel: 'error', build: { outDir, emptyOutDir: true } });
  const server = await preview({
    configFile,
    logLevel: 'error',
    build: { outDir },
    preview: { port: 0, host: '127.0.0.1' },
  });
  const url = server.resolvedUrls?.local[0];
  if (url === undefined) throw new Error('the page is not being served');
  return {
    url,
    close: async () => {
      await server.close();
      rmSync(outDir, { recursive: true, force: true });
    },
  };
}
