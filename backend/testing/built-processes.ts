import { copyFileSync, mkdirSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const backendFolder = dirname(dirname(fileURLToPath(import.meta.url)));
/** Within the repository, so that packages are found from it; of this process alone, since several may run at once. */
const builtFolder = join(dirname(backendFolder), '.kinvale', `spec-backend-${process.pid}`);

let built: Promise<string> | undefined;

/**
 * The processes and threads that the server starts, bundled once as for production: compiling them on the way, at each
 * start, would take most of the specs' time.
 *
 * @returns the folder, laid out as `dist/backend`; it goes with this process.
 */
export function builtProcesses(): Promise<string> {
  return (built ??= buildProcesses());
}

async function buildProcesses(): Promise<string> {
  process.once('exit', () => {
    rmSync(builtFolder, { recursive: true, force: true });
  });
  await build({
    absWorkingDir: backendFolder,
    entryPoints: ['compute/fit-worker.ts', 'compute/parse-child.ts'],
    outdir: builtFolder,
    entryNames: '[name]',
    bundle: true,
    packages: 'external',
    platform: 'node',
    target: 'node20',
    format: 'esm',
    logLevel: 'warning',
  });
  for (const file of ['panels/sample-panel.csv', 'fits/replication/replication.R']) {
    mkdirSync(dirname(join(builtFolder, file)), { recursive: true });
    copyFileSync(join(backendFolder, file), join(builtFolder, file));
  }
  return builtFolder;
}
