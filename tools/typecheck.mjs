/**
 * Strict type checks of every project; the Angular ones with their templates. Two at a time. `--build-follows` leaves
 * the application to its build, which checks the same files under the same settings and fails at the same errors.
 */
import { fileURLToPath } from 'node:url';
import { run } from './child-process.mjs';
import { CommandFailed } from './plain-failure.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const ngc = 'node_modules/@angular/compiler-cli/bundles/src/bin/ngc.js';
const tsc = 'node_modules/typescript/bin/tsc';

const projects = [
  ['tsconfig.app.json', ngc],
  ['tsconfig.spec.json', ngc],
  ['tsconfig.node.json', tsc],
  ['backend/stats/tsconfig.json', tsc],
  ['e2e/tsconfig.json', tsc],
];

const left = process.argv.includes('--build-follows') ? ['tsconfig.app.json'] : [];
for (const project of left) console.log(`${project}: left to the build`);
const waiting = projects.filter(([project]) => !left.includes(project));
async function worker() {
  for (let next = waiting.shift(); next !== undefined; next = waiting.shift()) {
    const [project, compiler] = next;
    let output = '';
    try {
      await run(process.execPath, [compiler, '-p', project, '--noEmit', '--pretty', 'false'], {
        cwd: root,
        onText: (text) => (output += text),
      });
      console.log(`${project}: no error`);
    } catch (error) {
      if (!(error instanceof CommandFailed)) throw error;
      console.error(`${project}:\n${output.trimEnd()}`);
      process.exitCode = 1;
    }
  }
}
await Promise.all([worker(), worker()]);
