/**
 * Measures the engine against a bare pass over the same columns, against R's panel package where R is installed, and
 * its memory: `npm run bench:fit`. Medians of interleaved rounds; the ratios are what counts.
 */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';
import { run } from './child-process.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const folder = await mkdtemp(join(tmpdir(), 'kinvale-bench-'));
const bundle = join(root, '.kinvale', 'bench', 'measure-fit.mjs');
try {
  await build({
    entryPoints: [join(root, 'tools', 'bench', 'measure-fit.ts')],
    outfile: bundle,
    bundle: true,
    platform: 'node',
    format: 'esm',
    packages: 'external',
    logLevel: 'warning',
  });
  await run(process.execPath, ['--expose-gc', bundle, folder, join(root, 'tools', 'bench')], {
    cwd: root,
    onText: (text) => process.stdout.write(text),
  });
} finally {
  await rm(folder, { recursive: true, force: true });
}
