/**
 * Has LibreOffice compute the scenario sheets of the reference panels' workbooks, with inputs changed after they were
 * written, and holds every figure to the prediction code. Exits 1 where one differs. Installs LibreOffice from Debian's
 * packages where it is missing.
 */
import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PlainFailure } from './plain-failure.mjs';
import { installPackages } from './system-packages.mjs';
import { checkWorkbooks } from './workbook/check-workbook';

const root = new URL('../', import.meta.url);
const soffice = '/usr/bin/soffice';
const say = (text) => process.stderr.write(`${text}\n`);

const folder = await mkdtemp(join(tmpdir(), 'kinvale-workbook-'));
try {
  if (!existsSync(soffice)) await installPackages(['libreoffice-calc'], 'LibreOffice Calc', say);
  const isHeld = await checkWorkbooks({ root, folder, soffice, say });
  process.exitCode = isHeld ? 0 : 1;
} catch (error) {
  if (!(error instanceof PlainFailure)) throw error;
  say(error.message);
  process.exitCode = 1;
} finally {
  await rm(folder, { recursive: true, force: true });
}
