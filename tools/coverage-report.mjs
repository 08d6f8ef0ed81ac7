/**
 * Simulates how often the engine's intervals hold the truth and writes backend/stats/COVERAGE.md:
 * `npm run coverage-report [-- --settings NAME,… --replications N]`. Exits 1 where a default interval falls short of
 * what the methods promise. With either option it prints the tables and writes nothing.
 */
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';
import { run } from './child-process.mjs';
import { CommandFailed } from './plain-failure.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const source = join(root, 'tools', 'coverage-report');
const outdir = join(root, '.kinvale', 'coverage-report');
// Bundled: a loader that compiles on the way would slow the hot loops.
await build({
  entryPoints: ['measure-coverage', 'coverage-worker'].map((name) => join(source, `${name}.ts`)),
  outdir,
  outExtension: { '.js': '.mjs' },
  bundle: true,
  platform: 'node',
  format: 'esm',
  packages: 'external',
  logLevel: 'warning',
});
const target = join(root, 'backend', 'stats', 'COVERAGE.md');
try {
  await run(
    process.execPath,
    [join(outdir, 'measure-coverage.mjs'), target, ...process.argv.slice(2)],
    { cwd: root, onText: (text) => process.stdout.write(text) },
  );
} catch (error) {
  if (!(error instanceof CommandFailed)) throw error;
  process.exitCode = error.status;
}
