/**
 * Bundles the processes that Node.js runs into dist/, packages left outside.
 *
 * `--partial` leaves out entries whose source is not there; without it a missing one is an error.
 */
import { existsSync } from 'node:fs';
import { copyFile, mkdir, rm } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = fileURLToPath(new URL('..', import.meta.url));

const entries = {
  'backend/main': 'backend/main.ts',
  'backend/migrate': 'backend/migrate-main.ts',
  'backend/fit-worker': 'backend/compute/fit-worker.ts',
  'backend/parse-child': 'backend/compute/parse-child.ts',
  'stubs/smtp': 'stubs/smtp/main.ts',
  'stubs/stripe': 'stubs/stripe/main.ts',
  'tools/seed-demo': 'tools/seed-demo.ts',
};

const missing = Object.values(entries).filter((source) => !existsSync(join(root, source)));
if (missing.length > 0 && !process.argv.includes('--partial')) {
  console.error(`expected every entry of the backend; missing: ${missing.join(', ')}`);
  process.exit(1);
}

for (const folder of ['backend', 'stubs', 'tools']) {
  await rm(join(root, 'dist', folder), { recursive: true, force: true });
}
await build({
  absWorkingDir: root,
  entryPoints: Object.fromEntries(
    Object.entries(entries).filter(([, source]) => !missing.includes(source)),
  ),
  outdir: 'dist',
  bundle: true,
  packages: 'external',
  platform: 'node',
  target: 'node20',
  format: 'esm',
  splitting: true,
  // Beside main.js: shared code finds fit-worker.js and parse-child.js next to its own import.meta.url.
  chunkNames: 'backend/[name]-[hash]',
  tsconfig: 'tsconfig.json',
  sourcemap: true,
  sourcesContent: false,
  logLevel: 'warning',
});

// Data that the server reads beside its code.
for (const file of ['backend/panels/sample-panel.csv', 'backend/fits/replication/replication.R']) {
  await mkdir(dirname(join(root, 'dist', file)), { recursive: true });
  await copyFile(join(root, file), join(root, 'dist', file));
}
