import type { EditionLine, FitResult } from '../../contract';
import { capitalised, type EditionFacts, placeText, yearsListed } from './edition-terms';
import {
  countPart,
  estimateParts,
  numberPart,
  type SentencePart,
  unitPart,
  words,
} from './sentence';
import { differenceKind, shownDifference } from './shown-difference';

/** What a CFO has to know of a fit before signing, in five lines. */
export function fiveLines(facts: EditionFacts): readonly EditionLine[] {
  const { fit } = facts;
  return [
    poolabilityLine(fit),
    placeLine(fit),
    driversLine(fit),
    driftLine(fit),
    familiarLine(facts),
  ];
}

function line(
  kind: EditionLine['kind'],
  sentence: readonly SentencePart[],
  figure: string | null = null,
): EditionLine {
  return { kind, sentence: [...sentence], figure };
}

function poolabilityLine(fit: FitResult): EditionLine {
  const { value, df1, df2, pValue, pValueReason } = fit.poolability;
  if (value === null || pValue === null)
    return line('caution', [
      words(`Whether company levels differ cannot be tested: ${pValueReason ?? 'no F statistic'}.`),
    ]);
  const statistic = [
    words('F '),
    numberPart('poolability', 'plain', value, 4),
    words(' on '),
    dfPart(df1),
    words(' and '),
    dfPart(df2),
  ];
  const isKept = pValue < 1 - fit.specification.confidence;
  return isKept
    ? line(
        'fine',
        [
          words('Company levels differ, so company effects are kept ('),
          ...statistic,
          words('). The test assumes errors that do not persist.'),
        ],
        'poolability',
      )
    : line(
        'caution',
        [
          words('One level for all companies is not ruled out ('),
          ...statistic,
          words('); company effects are kept all the same.'),
        ],
        'poolability',
      );
}

/** Degrees of freedom: whole, or as a statistic where they are not. */
function dfPart(value: number): SentencePart {
  return Number.isInteger(value) ? countPart(value) : numberPart(null, 'plain', value, 4);
}

function placeLine({ standing, pairs }: FitResult): EditionLine {
  if (standing?.rankSet == null || pairs === null)
    return line('caution', [words(`There is no place: ${noPlaceReason(standing)}.`)]);
  const lower = pairs.filter(({ shown }) => shown === -1).length;
  const higher = pairs.filter(({ shown }) => shown === 1).length;
  return line(
    'fine',
    [
      words(`${capitalised(placeText(standing.rankSet))}: `),
      countPart(lower),
      words(' of '),
      countPart(pairs.length),
      words(' peers are shown to be lower, '),
      countPart(higher),
      words(' higher, '),
      countPart(pairs.length - lower - higher),
      words(' cannot be told apart.'),
    ],
    'rank-set',
  );
}

function noPlaceReason(standing: FitResult['standing']): string {
  return standing === null ? 'no standing' : (standing.rankReason ?? 'no rank set in this fit');
}

function driversLine(fit: FitResult): EditionLine {
  const dominated = fit.warnings.filter(({ code }) => code === 'dominated');
  if (dominated.length > 0)
    return line('caution', [words(dominated.map(({ detail }) => detail).join(' '))]);
  const { form } = fit.specification;
  const standings = fit.withoutCompany.flatMap(({ standing }) =>
    standing === null
      ? []
      : shownDifference({ estimate: standing, low: null, high: null }, form).estimate,
  );
  const start = words('No single company decides the slopes.');
  if (standings.length === 0) return line('fine', [start]);
  const kind = differenceKind(form);
  return line('fine', [
    start,
    words(' Leaving out one peer at a time, the standing stays between '),
    numberPart('standing', kind, Math.min(...standings)),
    words(' and '),
    numberPart('standing', kind, Math.max(...standings)),
    ...unitAfter(kind),
    words('.'),
  ]);
}

function driftLine({ drift, driftReason, specification }: FitResult): EditionLine {
  if (drift === null)
    return line('caution', [
      words(
        `Whether the gap to the peers drifts cannot be said: ${driftReason ?? 'too few years'}.`,
      ),
    ]);
  const kind = differenceKind(specification.form);
  const amount = [
    ...estimateParts('drift', kind, shownDifference(drift, specification.form)),
    ...unitAfter(kind),
    words(' a year'),
  ];
  if (drift.low === null || drift.high === null)
    return line(
      'caution',
      [words('The gap to the peers moves by '), ...amount, words('.')],
      'drift',
    );
  if (drift.low <= 0 && drift.high >= 0)
    return line(
      'fine',
      [words('No drift of the gap to the peers is shown: '), ...amount, words('.')],
      'drift',
    );
  const course = drift.estimate > 0 ? 'rises' : 'falls';
  return line(
    'caution',
    [
      words(`The gap to the peers ${course} by `),
      ...amount,
      words(', so one standing for all years hides a course.'),
    ],
    'drift',
  );
}

function familiarLine(facts: EditionFacts): EditionLine {
  const { scenarios } = facts;
  const tried = triedWords(facts);
  if (scenarios.length === 0) return line('fine', [words('The edition holds no plan. '), ...tried]);
  const odd = scenarios.flatMap(({ name, years }) =>
    (['edge', 'outside'] as const).flatMap((kind) => {
      const found = years.filter(({ familiar }) => familiar === kind).map(({ year }) => year);
      return found.length === 0 ? [] : [`${name}: ${farWords(found, kind)}`];
    }),
  );
  return odd.length === 0
    ? line('fine', [words('All planned years are inside the familiar range. '), ...tried])
    : line('caution', [words(`${odd.join('; ')}. `), ...tried]);
}

/** How many groups were tried before this one: trying many is a choice that the reader should know. */
function triedWords({
  peerGroupsTried,
  peerGroupsTriedOut = 0,
}: EditionFacts): readonly SentencePart[] {
  const saved =
    peerGroupsTried === 1
      ? [words('No other peer group was saved before this one')]
      : [countPart(peerGroupsTried), words(' peer group versions were saved up to this edition')];
  if (peerGroupsTriedOut === 0) return [...saved, words('.')];
  const groups = peerGroupsTriedOut === 1 ? ' group was' : ' groups were';
  return [
    ...saved,
    words('; the figures of '),
    countPart(peerGroupsTriedOut),
    words(`${groups} looked at without saving ${peerGroupsTriedOut === 1 ? 'it' : 'them'}.`),
  ];
}

/** `FY2027 and FY2028 are outside the familiar range`. */
export function farWords(years: readonly number[], kind: 'edge' | 'outside'): string {
  const place = kind === 'edge' ? 'at the edge of' : 'outside';
  return `${yearsListed(years)} ${years.length === 1 ? 'is' : 'are'} ${place} the familiar range`;
}

function unitAfter(kind: 'money' | 'percent' | 'plain' | 'count'): readonly SentencePart[] {
  return kind === 'money' ? [words(' '), unitPart] : [];
}
