/**
 * Builds the Angular application. After some template errors the compiler of Angular 21.2 reports failure and then
 * waits for ever on a request of its bundler that nobody answers; this ends it.
 */
import { fileURLToPath } from 'node:url';
import { run } from './child-process.mjs';
import { CommandFailed, Interrupted } from './plain-failure.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const graceMs = 5000;

const stuck = new AbortController();
let output = '';
try {
  await run(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'build', '--no-progress'], {
    cwd: root,
    env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
    signal: stuck.signal,
    onText(text) {
      process.stdout.write(text);
      output += text;
      if (/bundle generation failed/.test(output)) {
        setTimeout(() => stuck.abort(), graceMs).unref();
      }
    },
  });
} catch (error) {
  if (!(error instanceof CommandFailed) && !(error instanceof Interrupted)) throw error;
  process.exitCode = 1;
}
