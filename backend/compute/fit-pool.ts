import { Piscina } from 'piscina';
import type {
  BackgroundAnswer,
  BackgroundTask,
  BootstrapAnswer,
  EvidenceAnswer,
  FitAnswer,
  FitSubject,
  FitTask,
  HashAnswer,
} from './messages';

/** A run in a worker thread. */
export interface Run<Answer> {
  readonly answer: Promise<Answer>;
  /** Share done, 0 to 1. */
  progress(): number;
}

/** Worker threads for fits: the thread that answers requests never estimates anything. */
export class FitPool {
  readonly #fits: Piscina<FitTask, FitAnswer>;
  /** Apart, so that neither evidence nor a long bootstrap nor a trial keeps a fit waiting. */
  readonly #background: Piscina<BackgroundTask, BackgroundAnswer>;

  /** @param workerFile  path of the worker's entry, TypeScript under tsx or the built file. */
  constructor(workerFile: string, maxThreads: number) {
    const worker = {
      filename: workerFile,
      idleTimeout: 60_000,
      ...(workerFile.endsWith('.ts') ? { execArgv: ['--import', 'tsx'] } : {}),
    };
    this.#fits = new Piscina({ ...worker, name: 'runFit', minThreads: 1, maxThreads });
    this.#background = new Piscina({
      ...worker,
      name: 'runInBackground',
      minThreads: 0,
      maxThreads: 1,
    });
  }

  /** Starts a fit; aborting ends its thread. The columns' buffers move to the worker and are empty here afterwards. */
  run(subject: FitSubject, signal: AbortSignal): Run<FitAnswer> {
    const progress = sharedProgress();
    const transferList = buffersOf(subject);
    const answer = this.#fits.run({ ...subject, progress }, { transferList, signal });
    return { answer, progress: shareOf(progress) };
  }

  /** Computes the evidence of a fit in the background; the buffers move likewise. */
  async evidence(subject: FitSubject): Promise<EvidenceAnswer> {
    const task = { ...subject, wanted: 'evidence' } as const;
    const answer = await this.#background.run(task, { transferList: buffersOf(subject) });
    return answer as EvidenceAnswer;
  }

  /** Starts a bootstrap in the background, likewise; aborting ends its thread. */
  bootstrap(subject: FitSubject, seed: number, signal: AbortSignal): Run<BootstrapAnswer> {
    const progress = sharedProgress();
    const task = { ...subject, wanted: 'bootstrap', seed, progress } as const;
    const options = { transferList: buffersOf(subject), signal };
    const answer = this.#background.run(task, options) as Promise<BootstrapAnswer>;
    return { answer, progress: shareOf(progress) };
  }

  /** The digest of the fit, in the background and without fitting; the columns stay. */
  async hash(subject: FitSubject, signal: AbortSignal): Promise<HashAnswer> {
    const answer = await this.#background.run({ ...subject, wanted: 'hash' }, { signal });
    return answer as HashAnswer;
  }

  /** Fits in the background, so that nobody's fit waits behind it; aborting ends its thread, the buffers move. */
  async trial(subject: FitSubject, signal: AbortSignal): Promise<FitAnswer> {
    const options = { transferList: buffersOf(subject), signal };
    const answer = await this.#background.run({ ...subject, wanted: 'trial' }, options);
    return answer as FitAnswer;
  }

  async close(): Promise<void> {
    await Promise.all([this.#fits.destroy(), this.#background.destroy()]);
  }
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
