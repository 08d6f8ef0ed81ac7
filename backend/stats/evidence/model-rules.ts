import type { TestResult } from './evidence';
import { pInWords } from './in-words';
import type { VerdictInput, VerdictRule } from './verdict-rule';

/** Above this persistence a test that assumes errors that do not persist rejects too often to count. */
const mostPersistence = 0.3;

/** What speaks against the model's form. */
export const modelRules: readonly VerdictRule[] = [
  { code: 'poolability-kept', weight: 'notable', when: poolabilityKept },
  { code: 'slopes-differ', weight: 'notable', when: slopesDiffer },
  { code: 'line-bends', weight: 'notable', when: lineBends },
];

function poolabilityKept({ result }: VerdictInput): string | null {
  const { pValue } = result.poolability;
  if (pValue === null || pValue < 1 - result.specification.confidence) return null;
  return `Equal intercepts are not rejected (${pInWords(pValue)}): one line for all companies may do, and then no company lies above or below another.`;
}

function slopesDiffer(input: VerdictInput): string | null {
  const persistence = input.result.standing?.persistence ?? null;
  if (persistence === null || persistence > mostPersistence) return null;
  const test = rejected(input, 'slope-homogeneity');
  if (test === null) return null;
  return `Slopes differ between companies (${pInWords(test.pValue)}): the common slope is an average that may not be the own company’s.`;
}

function lineBends(input: VerdictInput): string | null {
  const test = rejected(input, 'reset');
  if (test === null) return null;
  return `A straight line misses a bend (RESET, ${pInWords(test.pValue)}).`;
}

/** A test that Holm's correction rejects. */
function rejected(
  { tests }: VerdictInput,
  code: string,
): (TestResult & { readonly pValue: number }) | null {
  const test = tests.list.find((one) => one.code === code);
  if (test?.holm !== 'rejects' || test.pValue === null) return null;
  return { ...test, pValue: test.pValue };
}
