import { fixedText, tickDigits } from '@figures';
import type { PlaneMeasure } from '../../charts/company-plane/plane-words';
import { exactFigure } from '../../charts/exact-figure';
import type { FigureKind, NumberFormat } from '../../ui/number-format';
import { type PeerMeasure, readValue } from '../nearness/peer-measures';
import type { PanelCompany } from '../peer-draft';

const kinds: Readonly<Record<PeerMeasure['kind'], FigureKind>> = {
  'log-money': 'money',
  share: 'percent',
  'log-change': 'percent',
  plain: 'plain',
};

/** How the plane shows a measure: money in the shown unit on a logarithmic axis, changes and shares in per cent. */
export function planeAxisOf(measure: PeerMeasure, numbers: NumberFormat): PlaneMeasure {
  const kind = kinds[measure.kind];
  return {
    title: titleOf(measure, numbers),
    isLog: measure.kind === 'log-money',
    text: (value) => numbers.figure(value, kind),
    exact: (value) => exactFigure(value, numbers, kind),
    tick: (value, step) => {
      const digits = tickDigits(numbers.shown(step, kind));
      return fixedText(numbers.shown(value, kind), digits, numbers.locale());
    },
  };
}

/** The company's value as the axis takes it; NaN where there is none. */
export function planeValue(measure: PeerMeasure, company: PanelCompany): number {
  const value = measure.valueOf(company);
  return value === null ? NaN : readValue(measure, value);
}

function titleOf({ label, kind }: PeerMeasure, numbers: NumberFormat): string {
  if (kind === 'log-money') return `${label}, ${numbers.unitLabel()}`;
  if (kind === 'log-change') return `${label}, % a year`;
  return kind === 'share' ? `${label}, %` : label;
}
