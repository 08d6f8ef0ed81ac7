import { Piscina } from 'piscina';
import type { FitAnswer, FitTask } from './messages';

export type FitJob = Omit<FitTask, 'progress'>;

export interface FitRun {
  readonly answer: Promise<FitAnswer>;
  /** Share done, 0 to 1. */
  progress(): number;
}

/** Worker threads for fits: the thread that answers requests never estimates anything. */
export class FitPool {
  readonly #pool: Piscina<FitTask, FitAnswer>;

  /** @param workerFile  path of the worker's entry, TypeScript under tsx or the built file. */
  constructor(workerFile: string, maxThreads: number) {
    this.#pool = new Piscina<FitTask, FitAnswer>({
      filename: workerFile,
      minThreads: 1,
      maxThreads,
      idleTimeout: 60_000,
      ...(workerFile.endsWith('.ts') ? { execArgv: ['--import', 'tsx'] } : {}),
    });
  }

  /** Starts a fit; aborting ends its thread. The columns' buffers move to the worker and are empty here afterwards. */
  run(job: FitJob, signal: AbortSignal): FitRun {
    const progress = new Int32Array(new SharedArrayBuffer(4));
    const { columns } = job;
    const transferList = [
      columns.company.buffer,
      columns.year.buffer,
      columns.fileRow.buffer,
      columns.outcome.values.buffer,
      ...columns.regressors.map((regressor) => regressor.values.buffer),
    ].filter((buffer) => buffer instanceof ArrayBuffer);
    return {
      answer: this.#pool.run({ ...job, progress }, { transferList, signal }),
      progress: () => Atomics.load(progress, 0) / 1000,
    };
  }

  async close(): Promise<void> {
    await this.#pool.destroy();
  }
}
