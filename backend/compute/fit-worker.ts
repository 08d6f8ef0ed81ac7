import { createHash } from 'node:crypto';
import { fitPanel, StatsError } from '../stats';
import type { FitAnswer, FitTask } from './messages';

/** Runs one fit in a worker thread. */
export default function runFit(task: FitTask): FitAnswer {
  try {
    const result = fitPanel(task.columns, task.specification, task.own, task.members, {
      sha256: (text) => createHash('sha256').update(text).digest('hex'),
      onProgress: (share) => {
        Atomics.store(task.progress, 0, Math.round(share * 1000));
      },
    });
    return { kind: 'done', result };
  } catch (error) {
    if (error instanceof StatsError)
      return { kind: 'refused', code: error.code, detail: error.message, data: error.data };
    throw error;
  }
}
