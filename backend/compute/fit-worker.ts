import { bootstrapSummary, evidenceOf } from '../stats';
import type { BackgroundAnswer, BackgroundTask, FitAnswer, FitTask } from './messages';
import { hashOfSubject, openSubject, refusalOf, storeShare } from './open-subject';

/** Runs one fit in a worker thread. */
export function runFit(task: FitTask): FitAnswer {
  try {
    return { kind: 'done', result: openSubject(task, storeShare(task.progress)).result };
  } catch (error) {
    return refusalOf(error);
  }
}

/**
 * Computes what may take its time: the evidence of a fit, a bootstrap of its slopes, or the fit of a group that is being
 * tried out.
 */
export function runInBackground(task: BackgroundTask): BackgroundAnswer {
  try {
    if (task.wanted === 'hash') return { kind: 'done', hash: hashOfSubject(task) };
    const open = openSubject(task);
    if (task.wanted === 'trial') return { kind: 'done', result: open.result };
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
