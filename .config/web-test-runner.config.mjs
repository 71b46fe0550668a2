import { fileURLToPath } from 'node:url';
import { esbuildPlugin } from '@web/dev-server-esbuild';
import { defaultReporter } from '@web/test-runner';
import { chromeLauncher } from '@web/test-runner-chrome';
import { ensureChromium } from '../tests/tools/browser.mjs';
import { bundleLibraries } from '../tests/tools/browser-bundles.mjs';
import { summaryReporter } from '../tests/tools/summary-reporter.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const bundles = await bundleLibraries(root);

/** Elements, sound and references in a real browser; `--files` runs one file alone. */
export default {
  rootDir: root,
  files: ['tests/{src,components,reference}/**/*.browser.test.ts'],
  nodeResolve: true,
  concurrency: 2,
  browserStartTimeout: 60_000,
  testsStartTimeout: 60_000,
  testsFinishTimeout: 180_000,
  testFramework: { config: { ui: 'bdd', timeout: '20000' } },
  browsers: [
    chromeLauncher({
      // Two pages run side by side; without it the one behind gets no frames.
      createPage: async ({ context }) => {
        const page = await context.newPage();
        const session = await page.createCDPSession();
        await session.send('Emulation.setFocusEmulationEnabled', { enabled: true });
        return page;
      },
      launchOptions: {
        executablePath: await ensureChromium(),
        args: [
          '--no-sandbox',
          '--disable-dev-shm-usage',
          '--disable-gpu',
          '--disable-quic',
          '--no-first-run',
          // Without it `await context.resume()` never resolves: there is no click in a test.
          '--autoplay-policy=no-user-gesture-required',
          '--disable-background-networking',
          '--disable-component-update',
          '--disable-sync',
          '--disable-default-apps',
          '--mute-audio',
          // Leak tests ask for a collection and look what is left.
          '--js-flags=--expose-gc',
        ],
      },
    }),
  ],
  plugins: [
    {
      name: 'bundled-libraries',
      resolveImport: ({ source }) => bundles.get(source),
    },
    esbuildPlugin({
      ts: true,
      target: 'es2022',
      tsconfig: fileURLToPath(new URL('../tsconfig.json', import.meta.url)),
    }),
  ],
  reporters: [defaultReporter({ reportTestProgress: false }), summaryReporter(process.env.NOTCHWORK_SUMMARY)],
};
