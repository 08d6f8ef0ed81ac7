import { MessageChannel, type MessagePort, receiveMessageOnPort } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type {
  BootstrapAnswer,
  BootstrapTask,
  EvidenceAnswer,
  FitAnswer,
  FitSubject,
  FitTask,
} from './messages';

/** A run in a worker thread. */
export interface Run<Answer> {
  readonly answer: Promise<Answer>;
  /** Share done, 0 to 1. */
  progress(): number;
}

/** Its answer comes before its evidence. */
export interface FitRun extends Run<FitAnswer> {
  readonly evidence: Promise<EvidenceAnswer>;
}

/** Worker threads for fits: the thread that answers requests never estimates anything. */
export class FitPool {
  readonly #fits: Piscina<FitTask, EvidenceAnswer>;
  /** Apart, so that a long bootstrap keeps no fit waiting. */
  readonly #bootstraps: Piscina<BootstrapTask, BootstrapAnswer>;

  /** @param workerFile  path of the worker's entry, TypeScript under tsx or the built file. */
  constructor(workerFile: string, maxThreads: number) {
    const worker = {
      filename: workerFile,
      idleTimeout: 60_000,
      ...(workerFile.endsWith('.ts') ? { execArgv: ['--import', 'tsx'] } : {}),
    };
    this.#fits = new Piscina({ ...worker, name: 'runFit', minThreads: 1, maxThreads });
    this.#bootstraps = new Piscina({
      ...worker,
      name: 'runBootstrap',
      minThreads: 0,
      maxThreads: 1,
    });
  }

  /** Starts a fit; aborting ends its thread. The columns' buffers move to the worker and are empty here afterwards. */
  run(subject: FitSubject, signal: AbortSignal): FitRun {
    const progress = sharedProgress();
    const { port1, port2 } = new MessageChannel();
    const transferList = [...buffersOf(subject), port2];
    const task = { ...subject, progress, answerTo: port2 };
    const evidence = this.#fits.run(task, { transferList, signal });
    return { answer: answerBefore(evidence, port1), evidence, progress: shareOf(progress) };
  }

  /** Starts a bootstrap, likewise. */
  bootstrap(subject: FitSubject, seed: number, signal: AbortSignal): Run<BootstrapAnswer> {
    const progress = sharedProgress();
    const transferList = buffersOf(subject);
    const answer = this.#bootstraps.run({ ...subject, seed, progress }, { transferList, signal });
    return { answer, progress: shareOf(progress) };
  }

  async close(): Promise<void> {
    await Promise.all([this.#fits.destroy(), this.#bootstraps.destroy()]);
  }
}

/** The message that comes before the run's end; a run that ends without one rejects both. */
function answerBefore(evidence: Promise<EvidenceAnswer>, port: MessagePort): Promise<FitAnswer> {
  return new Promise<FitAnswer>((resolve, reject) => {
    port.once('message', resolve);
    const ended = (): void => {
      // What the worker sent before its end lies on this side already, told or not.
      const waiting: { readonly message: FitAnswer } | undefined = receiveMessageOnPort(port);
      if (waiting === undefined) reject(new Error('a worker ended without its answer'));
      else resolve(waiting.message);
    };
    void evidence.then(ended, reject).finally(() => {
      port.close();
    });
  });
}

function buffersOf({ columns }: FitSubject): ArrayBuffer[] {
  return [
    columns.company.buffer,
    columns.year.buffer,
    columns.fileRow.buffer,
    columns.outcome.values.buffer,
    ...columns.regressors.map((regressor) => regressor.values.buffer),
  ].filter((buffer) => buffer instanceof ArrayBuffer);
}

function sharedProgress(): Int32Array {
  return new Int32Array(new SharedArrayBuffer(4));
}

function shareOf(progress: Int32Array): () => number {
  return () => Atomics.load(progress, 0) / 1000;
}
