import type { PanelColumn } from '@contract';
import { fullText } from '@figures';
import { shifted } from '../../ui/shifted';
import { kindOf } from '../panel-rows';

/** What converts figures of a column to the unit that is shown and back: 10 to this power, 0 for what is no money. */
export function shiftOf(column: PanelColumn, factor: number): number {
  return kindOf(column) === 'money' ? Math.round(Math.log10(factor)) : 0;
}

/** With every digit and a decimal point, as spreadsheets and editors take it; empty where there is no value. */
export function figureText(value: number | null, shift: number): string {
  return value === null ? '' : String(shifted(value, shift));
}

/** For the eye, with every digit, in the unit that is shown: `1,100.5`, or `no value`. */
export function figureWords(value: number | null, shift: number, locale: string): string {
  return value === null ? 'no value' : fullText(shifted(value, shift), locale);
}
