import { bootstrapSummary, evidenceOf } from '../stats';
import type { BackgroundAnswer, BackgroundTask, FitAnswer, FitTask } from './messages';
import { openSubject, refusalOf, storeShare } from './open-subject';

/** Runs one fit in a worker thread. */
export function runFit(task: FitTask): FitAnswer {
  try {
    return { kind: 'done', result: openSubject(task, storeShare(task.progress)).result };
  } catch (error) {
    return refusalOf(error);
  }
}

/** Computes what may take its time after a fit: its evidence, or a bootstrap of its slopes. */
export function runInBackground(task: BackgroundTask): BackgroundAnswer {
  try {
    const open = openSubject(task);
    if (task.wanted === 'evidence') return { kind: 'done', evidence: evidenceOf(open) };
    const summary = bootstrapSummary(open.ground, {
      confidence: open.specification.confidence,
      seed: task.seed,
      onProgress: storeShare(task.progress),
    });
    return { kind: 'done', summary };
  } catch (error) {
    return refusalOf(error);
  }
}
