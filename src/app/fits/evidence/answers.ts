import type { Evidence, FitResult } from '@contract';
import type { NumberFormat } from '../../ui/number-format';
import { chosenFigure, figureChoices } from './figure-choice';
import { intervalsAnswer } from './interval-choice-words';
import { withoutEachCompany } from './left-out';
import { leftOutAnswer } from './left-out-words';
import { modelsAnswer } from './model-words';
import { oneLineAnswer } from './one-line-words';
import { type EvidenceQuestion, questions } from './questions';
import { residualAnswer } from './residual-words';
import { driftMeaning } from './steady-words';
import { testsAnswer } from './test-words';
import { trendAnswer } from './trend-words';

export interface AnsweredQuestion extends EvidenceQuestion {
  /** One sentence, of the figure that is drawn first. */
  readonly answer: string;
}

/** The questions that have an answer, in their order: without evidence those that the result itself answers. */
export function answersOf(
  result: FitResult,
  evidence: Evidence | null,
  numbers: NumberFormat,
): readonly AnsweredQuestion[] {
  const [{ choice }] = figureChoices(result);
  const full = chosenFigure(result, choice);
  const left = full === null ? [] : withoutEachCompany(result, choice, full);
  const drivers = { choice, left, many: 'companies' };
  const ofResult = [
    { ...questions.oneLine, answer: oneLineAnswer(result) },
    { ...questions.drivers, answer: leftOutAnswer(result, drivers, numbers) },
  ];
  if (evidence === null) return ofResult;
  return [
    ...ofResult,
    { ...questions.steady, answer: driftMeaning(result, numbers) },
    { ...questions.trends, answer: trendAnswer(evidence, result) },
    { ...questions.intervals, answer: intervalsAnswer(evidence, 0) },
    { ...questions.models, answer: modelsAnswer(result, evidence.alternatives, choice) },
    { ...questions.tests, answer: testsAnswer(evidence.tests) },
    { ...questions.residuals, answer: residualAnswer(evidence.residuals, result, numbers) },
  ];
}
