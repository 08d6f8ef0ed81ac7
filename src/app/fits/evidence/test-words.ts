import type { FitResult, TestResult, TestSummary } from '@contract';
import type { NumberFormat } from '../../ui/number-format';
import { confidenceText, counted } from '../../ui/phrases';
import { degreesText, pCell } from './statistic-words';

const letters: Readonly<Record<NonNullable<TestResult['distribution']>, string>> = {
  F: 'F',
  'chi-squared': 'χ²',
  normal: 'z',
  t: 't',
};

const holmWords: Readonly<Record<TestResult['holm'], string>> = {
  rejects: 'rejects',
  keeps: 'does not reject',
  'shown-only': 'not judged',
  none: '–',
};

export interface TestLine extends Pick<
  TestResult,
  'code' | 'name' | 'definition' | 'source' | 'reading' | 'caution' | 'reason'
> {
  readonly statistic: string;
  readonly degreesOfFreedom: string;
  readonly pValue: string;
  readonly holm: string;
}

export function testLines(
  { list }: Pick<TestSummary, 'list'>,
  numbers: NumberFormat,
): readonly TestLine[] {
  return list.map((test) => {
    const { statistic, distribution, degreesOfFreedom } = test;
    const letter = distribution === null ? '' : `${letters[distribution]} `;
    return {
      ...test,
      statistic: statistic === null ? 'n/a' : `${letter}${numbers.figure(statistic, 'plain')}`,
      degreesOfFreedom:
        degreesOfFreedom.length === 0
          ? '–'
          : degreesOfFreedom.map((value) => degreesText(value, numbers)).join(' and '),
      pValue: test.pValue === null ? '–' : pCell(test.pValue),
      holm: holmWords[test.holm],
    };
  });
}

/** How many tests were looked at, and how many of those that count reject when all are allowed for. */
export function testsAnswer({ lookedAt, inHolm, level, list }: TestSummary): string {
  const rejecting = list.filter(({ holm }) => holm === 'rejects').length;
  return `${counted(lookedAt, 'test')} looked at, ${inHolm} of them judged together by Holm’s correction at ${confidenceText(level)}: ${rejectingText(rejecting)}.`;
}

/** What the tests come to, and whether those that reject may do so too often. */
export function testsMeaning(
  tests: TestSummary,
  { warnings }: Pick<FitResult, 'warnings'>,
): string {
  const head = testsAnswer(tests);
  return warnings.some(({ code }) => code === 'persistent-errors')
    ? `${head} Errors persist here, so tests that assume independent errors reject too often.`
    : head;
}

function rejectingText(rejecting: number): string {
  if (rejecting === 0) return 'none rejects what it assumes';
  return rejecting === 1 ? '1 rejects what it assumes' : `${rejecting} reject what they assume`;
}
