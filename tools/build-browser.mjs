/**
 * Builds the Angular application. On a busy machine the command line of Angular 21.2 says that it has written the files,
 * or that it failed, and then waits for ever on a request of its bundler that nobody answers; this ends it.
 */
import { fileURLToPath } from 'node:url';
import { run } from './child-process.mjs';
import { CommandFailed, Interrupted } from './plain-failure.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const graceMs = 5000;

const stuck = new AbortController();
let output = '';
let isEnding = false;
try {
  await run(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'build', '--no-progress'], {
    cwd: root,
    env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
    signal: stuck.signal,
    onText(text) {
      process.stdout.write(text);
      output += text;
      if (/bundle generation (failed|complete)/.test(output) && !isEnding) {
        isEnding = true;
        setTimeout(() => stuck.abort(), graceMs).unref();
      }
    },
  });
} catch (error) {
  if (!(error instanceof CommandFailed) && !(error instanceof Interrupted)) throw error;
  // Ended by us after the files were written: the build is done.
  const isWritten = /Output location: /.test(output) && !/bundle generation failed/.test(output);
  process.exitCode = error instanceof Interrupted && isWritten ? 0 : 1;
}
