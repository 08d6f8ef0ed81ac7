import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { access, constants, mkdir, readFile, statfs, writeFile } from 'node:fs/promises';
import { homedir } from 'node:os';
import { join } from 'node:path';
import { run } from './child-process.mjs';
import { PlainFailure } from './plain-failure.mjs';

const neededMb = 1500;
const oldestNode = 20;

/**
 * Installs the npm packages of the lock file unless the stamp says they are there. The stamp lies in node_modules
 * and is written last, so an interrupted installation is repeated.
 */
export async function ensureNodePackages(root, { say, signal }) {
  if (Number(process.versions.node.split('.')[0]) < oldestNode) {
    throw new PlainFailure(
      `Kinvale needs Node.js ${oldestNode} or later; this is ${process.versions.node}.`,
    );
  }
  const stamp = join(root, 'node_modules', '.kinvale-stamp');
  const lock = await readFile(join(root, 'package-lock.json'));
  const wanted = createHash('sha256')
    .update(lock)
    .update(`${process.versions.modules} ${process.platform} ${process.arch}`)
    .digest('hex');
  if (existsSync(stamp) && (await readFile(stamp, 'utf8')) === wanted) return;
  await requireSpace(root, neededMb);
  say('Installing the npm packages (about a minute)');
  // include=dev: with NODE_ENV=production npm would leave out the tools that build.
  await run('npm', ['ci', '--include=dev', '--no-progress'], {
    cwd: root,
    env: { ...process.env, ...(await writableCache(root)) },
    signal,
  });
  await writeFile(stamp, wanted);
}

/** @throws {PlainFailure} when the disk that holds `folder` has less than `mb` megabytes left. */
export async function requireSpace(folder, mb) {
  const { bavail, bsize } = await statfs(folder);
  const freeMb = Math.floor((bavail * bsize) / 2 ** 20);
  if (freeMb < mb) {
    throw new PlainFailure(
      `The disk is full: ${mb} MB are needed at ${folder}, ${freeMb} MB are free; free some space, then start again.`,
    );
  }
}

/** A service user often has no home folder, and npm insists on a cache it can write. */
async function writableCache(root) {
  try {
    await access(homedir(), constants.W_OK);
    return {};
  } catch (error) {
    if (!['ENOENT', 'EACCES', 'EROFS'].includes(error.code)) throw error;
    const cache = join(root, '.kinvale', 'npm-cache');
    await mkdir(cache, { recursive: true });
    return { npm_config_cache: cache };
  }
}
