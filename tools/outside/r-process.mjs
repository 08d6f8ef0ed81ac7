import { fileURLToPath } from 'node:url';
import { run } from '../child-process.mjs';
import { CommandFailed, PlainFailure } from '../plain-failure.mjs';
import { installPackages } from '../system-packages.mjs';

const root = fileURLToPath(new URL('../../', import.meta.url));

/** R packages by the Debian package that brings each. */
const packages = new Map([
  ['plm', 'r-cran-plm'],
  ['sandwich', 'r-cran-sandwich'],
  ['lmtest', 'r-cran-lmtest'],
  ['clubSandwich', 'r-cran-clubsandwich'],
  ['car', 'r-cran-car'],
  ['jsonlite', 'r-cran-jsonlite'],
]);

/** Runs an R script in a folder, the project's root unless told otherwise; resolves with what it prints. */
export function runR(args, options = {}) {
  return run('Rscript', ['--vanilla', ...args], { cwd: root, ...options });
}

/**
 * Installs R and the packages where they are missing, and only then.
 *
 * @throws {PlainFailure} where they cannot be installed, or are not there even then.
 */
export async function ensureR(say) {
  if (await hasPackages()) return;
  const wanted = ['r-base-core', ...packages.values()];
  await installPackages(wanted, 'R with its panel packages', say);
  if (!(await hasPackages())) {
    throw new PlainFailure(
      `R does not load ${[...packages.keys()].join(', ')}: install Debian's ${wanted.join(' ')} and start again.`,
    );
  }
}

async function hasPackages() {
  const names = [...packages.keys()].map((name) => `'${name}'`).join(', ');
  try {
    await runR(['-e', `for (name in c(${names})) loadNamespace(name)`]);
    return true;
  } catch (error) {
    if (error instanceof CommandFailed || error.code === 'ENOENT') return false;
    throw error;
  }
}
