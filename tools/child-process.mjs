import { spawn } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';
import { CommandFailed, Interrupted } from './plain-failure.mjs';

const keptLines = 60;
const patienceMs = 4000;

/**
 * Whether a script of ours runs us already: then its process group is ours and our children's, so that one signal
 * from above reaches all.
 */
const isInGroup = process.env.KINVALE_PROCESS_GROUP !== undefined;
const inGroup = (env = process.env) => ({ ...env, KINVALE_PROCESS_GROUP: '1' });

/**
 * Runs a command to its end, with stdin closed, in a process group of its own: Ctrl-C reaches this script only,
 * which then ends its children in order.
 *
 * @param options.signal  ends the whole group when aborted; the promise then rejects with Interrupted.
 * @param options.onText  receives what the command prints, as it prints it.
 * @param options.quiet  leaves the command's output to /dev/null, for a command that leaves a daemon behind:
 *   a daemon holding our pipe would keep us waiting for ever.
 * @returns what the command wrote to stdout.
 * @throws {CommandFailed} for any other status than 0.
 */
export function run(command, args, options = {}) {
  const { cwd, env, signal, onText, quiet = false } = options;
  return new Promise((resolve, reject) => {
    if (signal?.aborted) return reject(new Interrupted(command));
    const child = spawn(command, args, {
      cwd,
      env: inGroup(env),
      detached: !isInGroup,
      stdio: ['ignore', quiet ? 'ignore' : 'pipe', quiet ? 'ignore' : 'pipe'],
    });
    let stdout = '';
    let tail = '';
    const keep = (text) => {
      tail = (tail + text).split('\n').slice(-keptLines).join('\n');
      onText?.(text);
    };
    child.stdout?.setEncoding('utf8').on('data', (text) => {
      stdout += text;
      keep(text);
    });
    child.stderr?.setEncoding('utf8').on('data', keep);
    let insist;
    const interrupt = () => {
      signalGroup(child, 'SIGTERM');
      insist = setTimeout(() => signalGroup(child, 'SIGKILL'), patienceMs); // npm ci goes on for minutes
    };
    signal?.addEventListener('abort', interrupt, { once: true });
    child.once('error', reject);
    child.once('close', (status, ended) => {
      signal?.removeEventListener('abort', interrupt);
      clearTimeout(insist);
      if (signal?.aborted) reject(new Interrupted(command));
      else if (status === 0) resolve(stdout);
      else reject(new CommandFailed([command, ...args].join(' '), status ?? ended, tail));
    });
  });
}

/**
 * Starts a process that stays, its output going to a log file or to our own terminal.
 *
 * @param options.log  path of the log file, emptied first; without it the output is ours.
 * @param options.readsStdout  hands stdout to the caller as `child.stdout`.
 * @returns the child, the promise of its end, and `stop`, which asks politely and insists after `graceMs`.
 */
export function launch(command, args, options = {}) {
  const { cwd, env, log, readsStdout = false } = options;
  const sink = log === undefined ? 'inherit' : openSync(log, 'w', 0o600);
  const child = spawn(command, args, {
    cwd,
    env: inGroup(env),
    detached: !isInGroup,
    stdio: ['ignore', readsStdout ? 'pipe' : sink, sink],
  });
  if (typeof sink === 'number') closeSync(sink);
  const exited = new Promise((resolve) => {
    child.once('error', (error) => resolve({ status: 1, error }));
    child.once('exit', (status, ended) => resolve({ status: status ?? ended }));
  });
  async function stop(graceMs = 30_000) {
    signalGroup(child, 'SIGTERM');
    const insist = setTimeout(() => signalGroup(child, 'SIGKILL'), graceMs);
    await exited;
    clearTimeout(insist);
    signalGroup(child, 'SIGKILL'); // whatever the child left behind in its group
  }
  return { child, exited, stop };
}

function signalGroup(child, name) {
  if (child.pid === undefined) return;
  try {
    process.kill(isInGroup ? child.pid : -child.pid, name);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error; // gone already: nothing left to end
  }
}
