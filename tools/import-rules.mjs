import { createRequire } from 'node:module';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { cruise } from 'dependency-cruiser';

const settings = createRequire(import.meta.url)('../.dependency-cruiser.cjs');
const folders = ['backend', 'db', 'src', 'stubs', 'e2e', 'tools'];
const doors = ['contract', 'stats', 'stats/prediction', 'figures', 'panel-data'].map(
  (it) => `backend/${it}/index.ts`,
);

/**
 * Reads every import under `root` and holds it to the import rules.
 *
 * @param root  a folder laid out like this project, with its own tsconfig.json.
 * @returns one line a breach: the rule, who imports whom, and for a circle the way round; and how much was read.
 */
export async function breachesOfImportRules(root) {
  const present = (await readdir(root)).filter((name) => folders.includes(name));
  const { output } = await cruise(
    present,
    {
      ...settings.options,
      tsConfig: { fileName: join(root, 'tsconfig.json') },
      ruleSet: { forbidden: settings.forbidden },
      validate: true,
      baseDir: root,
    },
    undefined,
    { tsConfig: { options: { baseUrl: root } } }, // aliases start from the root, not from the working folder
  );
  const breaches = output.summary.violations.map(({ rule, from, to, cycle }) => {
    const way = cycle === undefined ? to : cycle.map(({ name }) => name).join(' → ');
    return `${rule.name}: ${from} → ${way}`;
  });
  const stray = output.modules
    .map(({ source }) => source)
    .filter(
      (file) =>
        /^[a-z].*\/index\.ts$/.test(file) &&
        !file.includes('node_modules') &&
        !doors.includes(file),
    );
  return {
    breaches: [
      ...new Set([...breaches, ...stray.map((file) => `stray-index: ${file} is no door`)]),
    ].sort(),
    modules: output.summary.totalCruised,
    imports: output.summary.totalDependenciesCruised,
  };
}
