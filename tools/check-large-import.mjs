/**
 * Brings a file of 200,000 rows in through the screen, in a browser and with production settings, and measures how the
 * grid scrolls: `npm run check-large-import`. Prints its figures; ends with 1 when a promise is broken, never for a time.
 */
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { buildWhenChanged } from './build-when-changed.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const playwright = join(root, 'node_modules', '@playwright', 'test', 'cli.js');
const config = join(root, 'tools', 'large-import', 'playwright.config.ts');

await buildWhenChanged(root, { say: console.log });
const journey = spawn(process.execPath, [playwright, 'test', `--config=${config}`], {
  cwd: root,
  stdio: 'inherit',
});
const [status] = await once(journey, 'exit');
process.exitCode = status === 0 ? 0 : 1;
