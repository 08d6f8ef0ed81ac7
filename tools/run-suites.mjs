import { mkdtemp, rm } from 'node:fs/promises';
import { availableParallelism, tmpdir } from 'node:os';
import { join } from 'node:path';
import { run } from './child-process.mjs';
import { CommandFailed, Interrupted } from './plain-failure.mjs';
import { countOf, inStartOrder } from './suites.mjs';

/**
 * Runs suites, two at a time unless one wants the machine to itself, the longest first, and prints their output in
 * their order: that of the first unfinished suite as it comes, that of the others when their turn is there.
 *
 * @param options.envOf  the environment of a suite.
 * @returns the sums of what passed and failed.
 */
export async function runSuites(root, suites, { envOf, signal }) {
  const counts = await mkdtemp(join(tmpdir(), 'kinvale-counts-'));
  const stage = new Stage();
  const results = new Map();
  const places = availableParallelism() > 1 ? 2 : 1;
  const voices = new Map(suites.map((suite) => [suite, stage.voiceFor(suite.title)]));
  const running = new Set();
  try {
    for (const suite of inStartOrder(suites)) {
      while (running.size >= (suite.alone ? 1 : places)) await Promise.race(running);
      if (signal?.aborted) break;
      const file = join(counts, `${suite.name}.json`);
      const voice = voices.get(suite);
      voice.begin();
      const work = runSuite(root, suite, {
        env: { ...(await envOf(suite)), KINVALE_COUNTS: file },
        voice,
        signal,
      })
        .then((hasPassed) => countOf(suite, hasPassed, file))
        .then((count) => {
          results.set(suite.name, count);
          voice.end(count);
        })
        .finally(() => running.delete(work));
      running.add(work);
      if (suite.alone) await work;
    }
    await Promise.all(running);
  } finally {
    await rm(counts, { recursive: true, force: true });
  }
  if (signal?.aborted) throw new Interrupted('test');
  const sum = (key) => [...results.values()].reduce((total, count) => total + count[key], 0);
  return { passed: sum('passed'), failed: sum('failed') };
}

/** Whether every command of the suite ended with 0 within the suite's time. */
async function runSuite(root, { commands, limitMs }, { env, voice, signal }) {
  const limit = AbortSignal.timeout(limitMs);
  const either = signal === undefined ? limit : AbortSignal.any([limit, signal]);
  for (const [command, ...args] of commands) {
    try {
      await run(command, args, {
        cwd: root,
        env,
        signal: either,
        onText: (text) => voice.say(text),
      });
    } catch (error) {
      if (error instanceof Interrupted && limit.aborted) {
        voice.say(`\nended after ${limitMs / 60_000} minutes, which no healthy run needs\n`);
      } else if (!(error instanceof CommandFailed) && !(error instanceof Interrupted)) throw error;
      return false;
    }
  }
  return true;
}

/** Lets one suite speak at a time, in the order in which they were announced. */
class Stage {
  #voices = [];

  voiceFor(title) {
    const voice = { title, kept: '', hasSpoken: false, isOver: false };
    this.#voices.push(voice);
    let began;
    return {
      begin: () => {
        began = Date.now();
      },
      say: (text) => {
        voice.kept += text;
        this.#flush();
      },
      end: ({ passed, failed, remark }) => {
        const why = remark === undefined ? '' : ` (${remark})`;
        const seconds = Math.round((Date.now() - began) / 1000);
        voice.kept += `${voice.kept.endsWith('\n') || voice.kept === '' ? '' : '\n'}— ${passed} passed, ${failed} failed${why}, ${seconds} s\n`;
        voice.isOver = true;
        this.#flush();
      },
    };
  }

  #flush() {
    for (const voice of this.#voices) {
      if (voice.kept !== '') {
        if (!voice.hasSpoken) process.stdout.write(`\n== ${voice.title}\n`);
        voice.hasSpoken = true;
        process.stdout.write(voice.kept);
        voice.kept = '';
      }
      if (!voice.isOver) return;
    }
  }
}
