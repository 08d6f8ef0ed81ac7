import type { EditionHistoryReply } from '@contract';
import { type IntervalRow, type MoneyUnit, unitRatio } from '@figures';
import { asDifference } from '../ui/model-form';

export type SignedEdition = EditionHistoryReply['editions'][number];

/** Standings that can stand on one scale. */
export interface HistoryScale {
  readonly kind: 'money' | 'percent';
  readonly currency: string;
  /** Oldest first; money in the unit asked for. */
  readonly rows: readonly IntervalRow[];
}

/**
 * The standings of the signed editions by the scales that they can be drawn on: shares of the editions in logs on one,
 * amounts of one currency on another, in one unit. The scale of the newest edition comes first.
 */
export function historyScales(
  editions: readonly SignedEdition[],
  unit: MoneyUnit,
  dayOf: (at: string) => string,
): readonly HistoryScale[] {
  const scales = new Map<string, SignedEdition[]>();
  for (const edition of editions) {
    const key = scaleOf(edition);
    scales.set(key, [...(scales.get(key) ?? []), edition]);
  }
  const newestFirst = [...scales.values()].sort(
    (left, right) => (right.at(-1)?.number ?? 0) - (left.at(-1)?.number ?? 0),
  );
  return newestFirst.map((drawn) => ({
    kind: drawn[0].form === 'log' ? 'percent' : 'money',
    currency: drawn[0].currency,
    rows: drawn.map((edition) => historyRow(edition, unit, dayOf)),
  }));
}

function scaleOf({ form, currency }: SignedEdition): string {
  return form === 'log' ? 'logs' : currency;
}

function historyRow(
  edition: SignedEdition,
  unit: MoneyUnit,
  dayOf: (at: string) => string,
): IntervalRow {
  const { number, signedAt, standing, state } = edition;
  const row = {
    name: `Edition ${number}`,
    note: `signed ${dayOf(signedAt)}`,
    isMarked: state === 'signed',
  };
  if (standing === null) return { ...row, figure: null, reason: 'no standing' };
  const { estimate, low, high, intervalReason } = asDifference(standing, edition.form);
  const ratio = edition.form === 'log' ? 1 : unitRatio(edition.unit, unit);
  const scaled = (value: number | null) => (value === null ? null : value * ratio);
  return {
    ...row,
    figure: {
      estimate: estimate * ratio,
      low: scaled(low),
      high: scaled(high),
      ...(intervalReason === undefined ? {} : { intervalReason }),
    },
  };
}

/** What keeps an edition from being set beside the one signed before it, a sentence each. */
export function scaleChanges(editions: readonly SignedEdition[]): readonly string[] {
  return editions.flatMap((edition, index) => {
    const before = editions.at(index - 1);
    if (index === 0 || before === undefined) return [];
    const since = `Edition ${edition.number}`;
    const then = `edition ${before.number}`;
    return [
      ...(edition.ownCompany === before.ownCompany
        ? []
        : [
            `${since} is of ${edition.ownCompany}, ${then} of ${before.ownCompany}: two companies, not a course.`,
          ]),
      ...(edition.form === before.form
        ? []
        : [
            `${since} is in ${formWords[edition.form]}, ${then} in ${formWords[before.form]}: they are not drawn on one scale.`,
          ]),
      ...(edition.currency === before.currency
        ? []
        : [
            `${since} is in ${edition.currency}, ${then} in ${before.currency}: amounts are not converted between currencies.`,
          ]),
      ...(edition.currency === before.currency && edition.unit !== before.unit
        ? [
            `${since} has its panel in ${edition.unit}, ${then} in ${before.unit}: shown in one unit.`,
          ]
        : []),
      ...(edition.confidence === before.confidence
        ? []
        : [
            `The intervals of ${since.toLowerCase()} are at ${percent(edition.confidence)}, those of ${then} at ${percent(before.confidence)}.`,
          ]),
    ];
  });
}

const formWords = { levels: 'levels', log: 'logs' } as const;

function percent(share: number): string {
  return `${Math.round(share * 1000) / 10} %`;
}
