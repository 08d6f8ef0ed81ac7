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
const bundles = join(root, '.kinvale', 'bench');
try {
  await build({
    entryPoints: ['measure-fit', 'measure-memory'].map((name) =>
      join(root, 'tools', 'bench', `${name}.ts`),
    ),
    outdir: bundles,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    format: 'esm',
    packages: 'external',
    logLevel: 'warning',
  });
  const [fit, memory] = ['measure-fit', 'measure-memory'].map((name) =>
    join(bundles, `${name}.mjs`),
  );
  await run(process.execPath, [fit, folder, join(root, 'tools', 'bench'), memory], {
    cwd: root,
    onText: (text) => process.stdout.write(text),
  });
} finally {
  await rm(folder, { recursive: true, force: true });
}
