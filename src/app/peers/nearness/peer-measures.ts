import type { NumberFormat } from '../../ui/number-format';
import type { PanelCompany } from '../peer-draft';

/** How the values of a measure are read: a logarithm of money, a share, a logarithmic change a year, or as they stand. */
export type MeasureKind = 'log-money' | 'share' | 'log-change' | 'plain';

/** One thing that companies are compared by. */
export interface PeerMeasure {
  readonly key: string;
  /** As it stands in a sentence: `market value`. */
  readonly label: string;
  readonly kind: MeasureKind;
  readonly isOfModel: boolean;
  /** As it enters the distance; null where the company's cells do not say. */
  readonly valueOf: (company: PanelCompany) => number | null;
  /** Why the company has no value. */
  readonly whyNone: (company: PanelCompany) => string;
}

function whyNoGrowth({ firstYear, lastYear }: PanelCompany): string {
  return firstYear === lastYear ? 'one year only' : 'fewer than two years with a market value';
}

/** The five measures of the model, in their order. */
export const modelMeasures: readonly PeerMeasure[] = [
  {
    key: 'logMarketValue',
    label: 'market value',
    kind: 'log-money',
    isOfModel: true,
    valueOf: ({ measures }) => measures.logMarketValue,
    whyNone: () => 'none above zero',
  },
  {
    key: 'logBookEquity',
    label: 'book equity',
    kind: 'log-money',
    isOfModel: true,
    valueOf: ({ measures }) => measures.logBookEquity,
    whyNone: () => 'none above zero',
  },
  {
    key: 'capexToBookEquity',
    label: 'capex ÷ book equity',
    kind: 'share',
    isOfModel: true,
    valueOf: ({ measures }) => measures.capexToBookEquity,
    whyNone: () => 'no year with both',
  },
  {
    key: 'growth',
    label: 'growth',
    kind: 'log-change',
    isOfModel: true,
    valueOf: ({ measures }) => measures.growth,
    whyNone: whyNoGrowth,
  },
  {
    key: 'volatility',
    label: 'volatility',
    kind: 'share',
    isOfModel: true,
    valueOf: ({ measures }) => measures.volatility,
    whyNone: ({ firstYear, lastYear }) =>
      firstYear === lastYear ? 'one year only' : 'fewer than three yearly changes',
  },
];

/** The five of the model, then each further numeric column of the panel, in the order of first appearance. */
export function peerMeasures(companies: readonly PanelCompany[]): readonly PeerMeasure[] {
  const headers = new Set(companies.flatMap(({ measures }) => Object.keys(measures.others)));
  return [...modelMeasures, ...[...headers].map(columnMeasure)];
}

function columnMeasure(header: string): PeerMeasure {
  return {
    key: `column ${header}`,
    label: header,
    kind: 'plain',
    isOfModel: false,
    valueOf: ({ measures }) => measures.others[header] ?? null,
    whyNone: () => 'no value in any year',
  };
}

/** The value as people read it: money in the panel's unit, a share or a change a year as a fraction of 1. */
export function readValue({ kind }: PeerMeasure, value: number): number {
  if (kind === 'log-money') return Math.exp(value);
  return kind === 'log-change' ? Math.expm1(value) : value;
}

/** `1,234`, `6.2 %`, `4.1 % a year`; the unit of money stands once elsewhere. */
export function measureText(
  measure: PeerMeasure,
  value: number | null,
  numbers: NumberFormat,
): string {
  if (value === null) return numbers.figure(null);
  const read = readValue(measure, value);
  switch (measure.kind) {
    case 'log-money':
      return numbers.figure(read, 'money');
    case 'share':
      return numbers.figure(read, 'percent');
    case 'log-change':
      return `${numbers.figure(read, 'percent')} a year`;
    case 'plain':
      return numbers.figure(read, 'plain');
  }
}
