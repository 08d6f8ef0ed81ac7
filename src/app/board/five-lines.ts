import type { EditionContent, FitResult } from '@contract';
import { asDifference, differenceKind } from '../ui/model-form';
import type { NumberFormat } from '../ui/number-format';
import { familiarFinding } from '../ui/plan/plan-words';
import type { Remark } from '../ui/remark-list';
import { placeText, placesText } from './edition-words';

/** A line of evidence; with a key it leads to the lineage of that figure. */
export interface EvidenceLine extends Remark {
  readonly figure?: string;
}

const farPlaces = ['edge', 'outside'] as const;

/** What a CFO has to know of a fit before signing, in five lines. */
export function fiveLines(content: EditionContent, numbers: NumberFormat): readonly EvidenceLine[] {
  return [
    poolabilityLine(content.fit, numbers),
    placeLine(content.fit),
    driversLine(content.fit, numbers),
    driftLine(content.fit, numbers),
    familiarLine(content),
  ].map((line) => ('figure' in line ? { ...line, actionLabel: 'See how' } : line));
}

function poolabilityLine(fit: FitResult, numbers: NumberFormat): EvidenceLine {
  const { value, df1, df2, pValue, pValueReason } = fit.poolability;
  if (value === null || pValue === null)
    return {
      kind: 'caution',
      text: `Whether company levels differ cannot be tested: ${pValueReason ?? 'no F statistic'}.`,
    };
  const statistic = `F ${numbers.headline(value, 'plain', 4)} on ${df1} and ${df2}`;
  const isKept = pValue < 1 - fit.specification.confidence;
  return {
    kind: isKept ? 'fine' : 'caution',
    text: isKept
      ? `Company levels differ, so company effects are kept (${statistic}). The test assumes errors that do not persist.`
      : `One level for all companies is not ruled out (${statistic}); company effects are kept all the same.`,
    figure: 'poolability',
  };
}

function placeLine(fit: FitResult): EvidenceLine {
  const { standing, pairs } = fit;
  if (standing?.rankSet == null || pairs === null)
    return { kind: 'caution', text: `There is ${placesText(fit)}.` };
  const lower = pairs.filter(({ shown }) => shown === -1).length;
  const higher = pairs.filter(({ shown }) => shown === 1).length;
  const apart = pairs.length - lower - higher;
  const words = placeText(standing.rankSet);
  return {
    kind: 'fine',
    text: `${words.charAt(0).toUpperCase()}${words.slice(1)}: ${lower} of ${pairs.length} peers are shown to be lower, ${higher} higher, ${apart} cannot be told apart.`,
    figure: 'rank-set',
  };
}

function driversLine(fit: FitResult, numbers: NumberFormat): EvidenceLine {
  const dominated = fit.warnings.filter(({ code }) => code === 'dominated');
  if (dominated.length > 0)
    return { kind: 'caution', text: dominated.map(({ detail }) => detail).join(' ') };
  const { form } = fit.specification;
  const shown = (estimate: number) => asDifference({ estimate, low: null, high: null }, form);
  const standings = fit.withoutCompany.flatMap(({ standing }) =>
    standing === null ? [] : shown(standing).estimate,
  );
  const written = (standing: number) => numbers.headline(standing, differenceKind(form));
  const [low, high] = [Math.min(...standings), Math.max(...standings)];
  const range =
    standings.length === 0
      ? ''
      : ` Leaving out one peer at a time, the standing stays between ${written(low)} and ${written(high)}.`;
  return { kind: 'fine', text: `No single company decides the slopes.${range}` };
}

function driftLine(fit: FitResult, numbers: NumberFormat): EvidenceLine {
  const { drift, driftReason } = fit;
  const { form } = fit.specification;
  if (drift === null)
    return {
      kind: 'caution',
      text: `Whether the gap to the peers drifts cannot be said: ${driftReason ?? 'too few years'}.`,
    };
  const amount = `${numbers.interval(asDifference(drift, form), differenceKind(form), 3)} a year`;
  if (drift.low === null || drift.high === null)
    return { kind: 'caution', text: `The gap to the peers moves by ${amount}.`, figure: 'drift' };
  if (drift.low <= 0 && drift.high >= 0)
    return {
      kind: 'fine',
      text: `No drift of the gap to the peers is shown: ${amount}.`,
      figure: 'drift',
    };
  const course = drift.estimate > 0 ? 'rises' : 'falls';
  return {
    kind: 'caution',
    text: `The gap to the peers ${course} by ${amount}, so one standing for all years hides a course.`,
    figure: 'drift',
  };
}

function familiarLine({ scenarios, peerGroupsTried }: EditionContent): EvidenceLine {
  const tried =
    peerGroupsTried === 1
      ? 'No other peer group was saved before this one.'
      : `${peerGroupsTried} peer group versions were saved up to this edition.`;
  if (scenarios.length === 0) return { kind: 'fine', text: `The edition holds no plan. ${tried}` };
  const odd = scenarios.flatMap(({ name, years }) =>
    farPlaces.flatMap((kind) => {
      const found = years.filter(({ familiar }) => familiar === kind).map(({ year }) => year);
      return found.length === 0 ? [] : [`${name}: ${familiarFinding(found, kind)}`];
    }),
  );
  return odd.length === 0
    ? { kind: 'fine', text: `All planned years are inside the familiar range. ${tried}` }
    : { kind: 'caution', text: `${odd.join('; ')}. ${tried}` };
}
