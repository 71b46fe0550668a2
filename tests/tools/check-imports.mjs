import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { cruise } from 'dependency-cruiser';
import extractTSConfig from 'dependency-cruiser/config-utl/extract-ts-config';

/** Checks the import rules of `.config/dependency-cruiser.cjs`, and that the tool really read the code. */
const root = fileURLToPath(new URL('../..', import.meta.url));
process.chdir(root);
const configuration = createRequire(import.meta.url)('../../.config/dependency-cruiser.cjs');

const { output } = await cruise(
  ['src', 'components'],
  { ...configuration.options, ruleSet: { forbidden: configuration.forbidden }, validate: true },
  undefined,
  { tsConfig: extractTSConfig('tsconfig.json') },
);
const comments = new Map(configuration.forbidden.map((rule) => [rule.name, rule.comment]));
const { violations, totalCruised } = output.summary;
for (const { from, to, rule } of violations) {
  console.error(`${rule.name}: ${from} → ${to}\n  ${comments.get(rule.name) ?? ''}`);
}
// A parser that does not know the TypeScript version reads nothing and is content with it.
const tooFew = totalCruised < 50;
if (tooFew) console.error(`Only ${totalCruised} modules were read; the import rules were not checked.`);
console.log(`${totalCruised} modules, ${violations.length} violations`);
process.exit(violations.length > 0 || tooFew ? 1 : 0);
