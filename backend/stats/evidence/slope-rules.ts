import type { SlopeEstimate } from '../fit-result';
import type { EstimatorSlope } from './evidence';
import { listInWords, shortNumber } from './in-words';
import {
  areDisjoint,
  areOpposite,
  excludesZero,
  isInside,
  type VerdictInput,
  type VerdictRule,
  warningRule,
  warningsOfCode,
} from './verdict-rule';

/** What speaks against the slopes that the standing is net of. */
export const slopeRules: readonly VerdictRule[] = [
  { code: 'dominated-sign', weight: 'serious', when: dominatedSign },
  { code: 'dominated', weight: 'notable', when: dominated },
  { code: 'first-differences-opposite', weight: 'serious', when: differencesOpposite },
  { code: 'first-differences-apart', weight: 'notable', when: differencesApart },
  warningRule('small-degrees-of-freedom', 'notable'),
  warningRule('ill-conditioned', 'notable'),
  warningRule('negative-eigenvalues', 'notable'),
  warningRule('wild-set-disconnected', 'notable'),
  { code: 'covariance-choice', weight: 'notable', when: covarianceChoice },
];

/** Slopes whose sign the interval shows, and which one company turns round. */
function dominatedSign({ result }: VerdictInput): string | null {
  const turned = result.withoutCompany.flatMap(({ company, slopes }) =>
    result.slopes.flatMap((slope, k) =>
      slopes !== null && excludesZero(slope) && areOpposite(slope.estimate, slopes[k])
        ? [
            `without ${company} ${slope.name} goes from ${shortNumber(slope.estimate)} to ${shortNumber(slopes[k])}`,
          ]
        : [],
    ),
  );
  if (turned.length === 0) return null;
  return `A slope whose interval excludes zero changes its sign: ${listInWords(turned)}.`;
}

function dominated(input: VerdictInput): string | null {
  if (dominatedSign(input) !== null) return null;
  const details = warningsOfCode(input, 'dominated').map(({ detail }) => detail);
  return details.length === 0 ? null : details.join(' ');
}

interface Pair {
  readonly within: SlopeEstimate;
  readonly differences: EstimatorSlope;
}

function pairs({ result, estimators }: VerdictInput): Pair[] {
  const summary = estimators.find(({ code }) => code === 'first-differences');
  return (summary?.slopes ?? []).flatMap((differences): Pair[] => {
    const within = result.slopes.find(({ name }) => name === differences.name);
    return within === undefined ? [] : [{ within, differences }];
  });
}

const isContradiction = ({ within, differences }: Pair): boolean =>
  areOpposite(within.estimate, differences.estimate) && areDisjoint(within, differences);

/** First differences rule this slope out, and it them; a different sign needs the first alone. */
const isApart = ({ within, differences }: Pair): boolean =>
  differences.low !== null &&
  !isInside(within.estimate, differences) &&
  (areOpposite(within.estimate, differences.estimate) ||
    (within.low !== null && !isInside(differences.estimate, within)));

function differencesOpposite(input: VerdictInput): string | null {
  const found = pairs(input).filter(isContradiction);
  if (found.length === 0) return null;
  return `In first differences ${compared(found)}, with intervals that exclude each other: the levels can share trends that have nothing to do with one another.`;
}

function differencesApart(input: VerdictInput): string | null {
  const found = pairs(input).filter((pair) => isApart(pair) && !isContradiction(pair));
  if (found.length === 0) return null;
  return `In first differences ${compared(found)}: part of what the levels share can be trends.`;
}

function compared(found: readonly Pair[]): string {
  return listInWords(
    found.map(
      ({ within, differences }) =>
        `${within.name} has ${shortNumber(differences.estimate)} against ${shortNumber(within.estimate)}`,
    ),
  );
}

/** Slopes that the chosen covariance shows to differ from zero and the default does not. */
function covarianceChoice({ result, covariances }: VerdictInput): string | null {
  const standard = covariances.find(({ isDefault }) => isDefault);
  if (standard === undefined || standard.isChosen || standard.slopes === null) return null;
  const names = result.slopes.flatMap((slope) => {
    const same = standard.slopes?.find(({ name }) => name === slope.name);
    const isShown = same !== undefined && (same.low === null || !excludesZero(same));
    return excludesZero(slope) && isShown ? [slope.name] : [];
  });
  if (names.length === 0) return null;
  return `${listInWords(names)}: the chosen covariance shows a sign, the default one (${standard.code}) does not.`;
}
