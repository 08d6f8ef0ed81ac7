/** The processes of a running Kinvale, from the built files: migration, stubs of payment and mail, server, demo. */
import { existsSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { request as requestPlain } from 'node:http';
import { request as requestSecure } from 'node:https';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { setTimeout as wait } from 'node:timers/promises';
import { launch, run } from './child-process.mjs';
import { Interrupted, PlainFailure } from './plain-failure.mjs';

const readyWithinMs = 60_000;

/** Brings the database to the expected version. */
export async function migrate(root, env, signal) {
  await run(process.execPath, entry('backend/migrate.js'), { cwd: root, env, signal });
}

/**
 * Fills the demo workspace unless the database says that it was filled.
 *
 * @returns the accounts, from the last line of the program's output: `[{ role, email, password }]`.
 */
export async function seedDemo(root, env, signal) {
  const output = await run(process.execPath, entry('tools/seed-demo.js'), {
    cwd: root,
    env,
    signal,
  });
  return JSON.parse(output.trim().split('\n').at(-1));
}

/**
 * @param stateFile  where the stub keeps its customers and subscriptions between starts.
 * @returns the process and the URL the stub says it listens on.
 */
export async function launchStripeStub(root, { stateFile, env }) {
  const { said, ...stub } = await launchStub(root, {
    name: 'The payment stub',
    file: 'stubs/stripe.js',
    env: { ...env, STRIPE_STUB_PORT: '0', STRIPE_STUB_STATE: stateFile },
  });
  return { ...stub, url: said.listening };
}

/** @returns the process, the URL that takes mail and the page that shows it. */
export async function launchSmtpStub(root, { env }) {
  const { said, ...stub } = await launchStub(root, {
    name: 'The mail stub',
    file: 'stubs/smtp.js',
    env: { ...env, SMTP_STUB_PORT: '0', SMTP_STUB_PAGE_PORT: '0' },
  });
  return { ...stub, url: said.listening, page: said.page };
}

/** Starts a stub and waits for the line of JSON that says where it listens. */
async function launchStub(root, { name, file, env }) {
  const stub = launch(process.execPath, entry(file), { cwd: root, env, readsStdout: true });
  const firstLine = new Promise((resolve) =>
    createInterface({ input: stub.child.stdout }).once('line', resolve),
  );
  const line = await Promise.race([
    firstLine,
    stub.exited.then(({ status }) => {
      throw new PlainFailure(`${name} ended with ${status} before it listened.`);
    }),
  ]);
  stub.child.stdout.resume();
  return { ...stub, said: JSON.parse(line) };
}

/**
 * Starts the server and waits until it says that it is ready.
 *
 * @param options.url  where it will answer.
 * @param options.log  file for its output.
 * @throws {PlainFailure} when it ends, or is not ready in time.
 */
export async function launchServer(root, { url, log, env, signal }) {
  const server = launch(process.execPath, entry('backend/main.js'), { cwd: root, env, log });
  const until = Date.now() + readyWithinMs;
  let ended;
  void server.exited.then((result) => (ended = result));
  while (!(await answersReady(url))) {
    if (ended === undefined && !signal?.aborted && Date.now() < until) {
      await wait(100);
      continue;
    }
    await server.stop();
    if (signal?.aborted) throw new Interrupted('server');
    const what =
      ended === undefined
        ? `was not ready within ${readyWithinMs / 1000} s`
        : `ended with ${ended.status}`;
    throw new PlainFailure(`The server ${what}: ${await lastWords(log)}`);
  }
  return server;
}

/** The last line of a log, as words: the message of a JSON line, or the line itself. */
export async function lastWords(log) {
  const lines = existsSync(log) ? (await readFile(log, 'utf8')).trim().split('\n') : [];
  const line = lines.findLast((text) => text.trim() !== '');
  if (line === undefined) return `it left no word in ${log}`;
  const message = /^\{.*"msg":("(?:[^"\\]|\\.)*")/.exec(line)?.[1];
  return `${message === undefined ? line.trim() : JSON.parse(message)} (log: ${log})`;
}

function entry(file) {
  return ['--enable-source-maps', join('dist', file)];
}

/** Certificates of a test stack are self-signed: only readiness is asked here, nothing secret is sent. */
function answersReady(url) {
  const request = url.startsWith('https:') ? requestSecure : requestPlain;
  return new Promise((resolve) => {
    request(`${url}/readyz`, { rejectUnauthorized: false, timeout: 2000 }, (response) => {
      response.resume();
      resolve(response.statusCode === 200);
    })
      .on('timeout', function () {
        this.destroy();
      })
      .on('error', () => resolve(false))
      .end();
  });
}
