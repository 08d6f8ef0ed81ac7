import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, readFile, readdir, rm, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { run } from './child-process.mjs';
import { requireSpace } from './node-packages.mjs';

const settings = ['package-lock.json', 'tsconfig.json'];

const parts = [
  {
    name: 'browser application',
    stamp: 'browser.stamp',
    result: 'browser/index.html',
    inputs: [
      ...settings,
      'angular.json',
      'tsconfig.app.json',
      'src',
      'backend/contract',
      'backend/stats/prediction',
      'backend/figures',
      'backend/panel-data',
    ],
    command: ['tools/build-browser.mjs'],
  },
  {
    name: 'server',
    stamp: 'backend.stamp',
    result: 'backend/main.js',
    inputs: [...settings, 'backend', 'db', 'stubs', 'tools'],
    command: ['tools/build-backend.mjs'],
  },
];

/**
 * Builds what changed since its last build, judged by the content of its inputs. Each stamp is taken away before
 * a build and written after it, so an interrupted build is repeated.
 */
export async function buildWhenChanged(root, { say, signal, onText }) {
  await requireSpace(root, 200);
  const dist = join(root, 'dist');
  await mkdir(dist, { recursive: true });
  for (const { name, stamp, result, inputs, command } of parts) {
    const wanted = await contentHash(root, inputs);
    const path = join(dist, stamp);
    const isBuilt = existsSync(path) && existsSync(join(dist, result));
    if (isBuilt && (await readFile(path, 'utf8')) === wanted) continue;
    say(`Building the ${name}`);
    await rm(path, { force: true });
    await run(process.execPath, command, {
      cwd: root,
      env: { ...process.env, NG_CLI_ANALYTICS: 'false', NO_COLOR: '1' },
      signal,
      onText,
    });
    await writeFile(path, wanted);
  }
}

async function contentHash(root, inputs) {
  const hash = createHash('sha256');
  for (const input of inputs) {
    for (const file of (await filesOf(root, input)).sort()) {
      hash.update(`${file}\0`).update(await readFile(join(root, file)));
    }
  }
  return hash.digest('hex');
}

/** Files under `path`, relative to the root; specs and what only specs use do not reach the build. */
async function filesOf(root, path) {
  if ((await stat(join(root, path))).isFile()) return [path];
  const found = [];
  for (const entry of await readdir(join(root, path), { withFileTypes: true })) {
    const inner = join(path, entry.name);
    if (entry.isDirectory()) {
      if (!['testing', 'golden'].includes(entry.name)) found.push(...(await filesOf(root, inner)));
    } else if (!/\.(spec|harness)\.ts$|-harness\.ts$/.test(entry.name)) found.push(inner);
  }
  return found;
}
