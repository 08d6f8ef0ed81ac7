import type { Standing } from '../fit-result';
import type { Objection, Verdict, VerdictGrade } from './evidence';
import { countInWords } from './in-words';
import { excludesZero, type VerdictInput } from './verdict-rule';
import { verdictRules } from './verdict-rules';

/** One serious objection can be lived with, said beside the statement; this many cannot. */
const tooManySerious = 2;

/**
 * Whether a fit can carry a board statement about the own company's standing: without any objection it carries it, with
 * care where there are some, and not where one leaves nothing to state or two are serious.
 */
export function verdictOf(input: VerdictInput): Verdict {
  const found = verdictRules.flatMap((rule) => {
    const detail = rule.when(input);
    return detail === null ? [] : [{ rule, detail }];
  });
  const serious = found.filter(({ rule }) => rule.weight === 'serious');
  const isBarred =
    serious.length >= tooManySerious || found.some(({ rule }) => rule.leavesNothing === true);
  const grade = gradeOf(isBarred, found.length);
  const { standing } = input.result;
  const against = [...serious, ...found.filter(({ rule }) => rule.weight === 'notable')].map(
    ({ rule: { code, weight }, detail }): Objection => ({ code, weight, detail }),
  );
  if (standing === null || isBarred) {
    return { grade: 'does-not-carry', sentence: refusal(standing, serious.length), against };
  }
  const claim = `This fit can carry the statement that ${statement(standing)}`;
  const sentence =
    against.length === 0
      ? `${claim}.`
      : `${claim}, with care: ${points(against.length)} against it.`;
  return { grade, sentence, against };
}

function gradeOf(isBarred: boolean, objections: number): VerdictGrade {
  if (isBarred) return 'does-not-carry';
  return objections > 0 ? 'carries-with-care' : 'carries';
}

function statement(standing: Standing): string {
  const { company, estimate } = standing;
  if (!excludesZero(standing)) {
    return `the data do not show whether ${company} lies above or below its peers’ mean`;
  }
  return `${company} lies ${estimate > 0 ? 'above' : 'below'} its peers’ mean`;
}

function refusal(standing: Standing | null, serious: number): string {
  const about =
    standing === null ? 'a board statement' : `a statement on ${standing.company}’s standing`;
  const count = countInWords(serious);
  return `This fit cannot carry ${about}: ${count} serious ${serious === 1 ? 'point speaks' : 'points speak'} against it.`;
}

function points(count: number): string {
  return `${countInWords(count)} ${count === 1 ? 'point speaks' : 'points speak'}`;
}
