import type { TestResult, TestSummary } from '../evidence/evidence';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import { holmRejections } from '../standing/holm';
import type { EvidenceTest, TestGround, TestOutcome } from './evidence-test';
import { testTable } from './test-table';

/**
 * Every test of the table on one fit, with Holm's correction at level 1 − confidence over those that have a valid p
 * value. A perfect fit has no test: there is no residual to judge by.
 */
export function testSummary(open: TestGround): TestSummary {
  const isPerfect = isPerfectFit(open.fit);
  const runs = testTable.map((test): TestRun => {
    const outcome: TestOutcome = isPerfect
      ? { statistic: null, reason: perfectFitReason }
      : test.compute(open);
    return { test, outcome };
  });
  const level = 1 - open.specification.confidence;
  const judged = runs.filter(isJudged);
  const rejections = holmRejections(
    judged.map(({ outcome }) => outcome.pValue),
    level,
  );
  const verdicts = new Map(judged.map(({ test }, index) => [test.code, rejections[index]]));
  return {
    lookedAt: runs.length,
    inHolm: judged.length,
    level,
    list: runs.map((run) => resultOf(run, verdicts.get(run.test.code))),
  };
}

interface TestRun {
  readonly test: EvidenceTest;
  readonly outcome: TestOutcome;
}

interface JudgedRun extends TestRun {
  readonly outcome: Extract<TestOutcome, { readonly pValue: number }>;
}

function isJudged(run: TestRun): run is JudgedRun {
  return run.test.inHolm && run.outcome.statistic !== null && run.outcome.pValue !== null;
}

/** @param isRejected  undefined for a test that Holm's correction leaves out. */
function resultOf({ test, outcome }: TestRun, isRejected: boolean | undefined): TestResult {
  const { code, name, definition, source, caution } = test;
  const described = { code, name, definition, source, caution };
  if (outcome.statistic === null) {
    return {
      ...described,
      statistic: null,
      distribution: null,
      degreesOfFreedom: [],
      pValue: null,
      reason: outcome.reason,
      holm: 'none',
      reading: test.readings.none,
    };
  }
  return { ...described, ...outcome, ...verdictOf(test, outcome.pValue, isRejected) };
}

function verdictOf(
  { readings }: EvidenceTest,
  pValue: number | null,
  isRejected: boolean | undefined,
): Pick<TestResult, 'holm' | 'reading'> {
  if (isRejected === true) return { holm: 'rejects', reading: readings.rejects };
  if (isRejected === false) return { holm: 'keeps', reading: readings.keeps };
  return { holm: pValue === null ? 'none' : 'shown-only', reading: readings.none };
}
