/** `npm run check`: what must hold at every commit: format, lint, types, import rules, unit specs. */
import { fileURLToPath } from 'node:url';
import { runSuites } from './run-suites.mjs';
import { chosenSuites } from './suites.mjs';

const atEveryCommit = ['format', 'lint', 'types', 'imports', 'unit'];
const { passed, failed } = await runSuites(
  fileURLToPath(new URL('..', import.meta.url)),
  chosenSuites(atEveryCommit),
  { envOf: () => ({ ...process.env, NO_COLOR: '1' }) },
);
console.log(`\n${passed} passed, ${failed} failed`);
process.exitCode = failed === 0 ? 0 : 1;
