/**
 * Holds the engine to R: recomputes the reference panels and the demo panel with public R packages and with short R
 * code for what no package has, prints the largest relative difference by figure, and runs replication packs.
 * Exits 1 where a difference exceeds its tolerance. Installs R from Debian's packages where it is missing.
 * `--freeze` writes the outside numbers that the specs hold to `backend/stats/golden/outside.json`.
 */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { checkOutside } from './outside/check-outside';
import { ensureR, runR } from './outside/r-process.mjs';
import { CommandFailed, PlainFailure } from './plain-failure.mjs';

const root = new URL('../', import.meta.url);
const say = (text) => process.stderr.write(`${text}\n`);

const { values } = parseArgs({ options: { freeze: { type: 'boolean', default: false } } });
const folder = await mkdtemp(join(tmpdir(), 'kinvale-outside-'));
try {
  await ensureR(say);
  const isHeld = await checkOutside({ root, folder, runR, say, freeze: values.freeze });
  process.exitCode = isHeld ? 0 : 1;
} catch (error) {
  if (error instanceof CommandFailed) say(`${error.message}\n${error.tail}`);
  else if (error instanceof PlainFailure) say(error.message);
  else throw error;
  process.exitCode = 1;
} finally {
  await rm(folder, { recursive: true, force: true });
}
