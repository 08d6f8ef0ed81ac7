import type { FigureKind, NumberFormat } from '../ui/number-format';
import { shifted } from '../ui/shifted';

/**
 * A figure as a file takes it: in the unit that is shown, a share in per cent, with every digit. Null where there is
 * none. Reads signals of `numbers`.
 */
export function exactFigure(
  value: number | null | undefined,
  numbers: NumberFormat,
  kind: FigureKind,
): number | null {
  if (value === null || value === undefined || !Number.isFinite(value)) return null;
  if (kind === 'percent') return shifted(value, 2);
  return kind === 'money' ? shifted(value, Math.round(Math.log10(numbers.factor()))) : value;
}

/** The header of such figures, each with its unit: `low, EUR m`, `share, %`. */
export function exactHeader(label: string, numbers: NumberFormat, kind: FigureKind): string {
  const unit = kind === 'percent' ? '%' : kind === 'money' ? numbers.unitLabel() : '';
  return unit === '' ? label : `${label}, ${unit}`;
}
