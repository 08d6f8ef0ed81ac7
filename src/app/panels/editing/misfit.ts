import type { PanelColumn } from '@contract';
import { isPercent } from '@panel-data';
import { kindOf } from '../panel-rows';

/** Why a text that reads as a number is none of the column: `12%` is no amount of money. Undefined where it is one. */
export function misfitOf(text: string, column: PanelColumn): string | undefined {
  if (kindOf(column) !== 'money' || !isPercent(text)) return undefined;
  return 'a share in per cent is no amount of money';
}
