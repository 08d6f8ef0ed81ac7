import { bootstrapSummary, evidenceOf } from '../stats';
import type { BootstrapAnswer, BootstrapTask, EvidenceAnswer, FitTask } from './messages';
import { openSubject, refusalOf, storeShare } from './open-subject';

/** Runs one fit in a worker thread: tells its result, then computes its evidence. */
export function runFit(task: FitTask): EvidenceAnswer {
  const { answerTo, progress } = task;
  let open;
  try {
    open = openSubject(task, storeShare(progress));
  } catch (error) {
    const refusal = refusalOf(error);
    answerTo.postMessage(refusal);
    return refusal;
  }
  answerTo.postMessage({ kind: 'done', result: open.result });
  try {
    return { kind: 'done', evidence: evidenceOf(open) };
  } catch (error) {
    return refusalOf(error);
  }
}

/** Bootstraps the slopes of one fit in a worker thread. */
export function runBootstrap(task: BootstrapTask): BootstrapAnswer {
  try {
    const { ground, specification } = openSubject(task);
    const summary = bootstrapSummary(ground, {
      confidence: specification.confidence,
      seed: task.seed,
      onProgress: storeShare(task.progress),
    });
    return { kind: 'done', summary };
  } catch (error) {
    return refusalOf(error);
  }
}
