import type { PanelDifferencesReply, PanelVersionSummary } from '@contract';
import { unitText } from '@figures';
import { columnTitle } from '../panel-rows';

type Money = PanelDifferencesReply['money'];
type Version = Pick<PanelVersionSummary, 'number' | 'currency' | 'unit'>;

/** What changed between two versions that is no figure: headers of the model's columns, currency and unit. A line each. */
export function versionChanges(
  older: Version,
  newer: Version,
  { renamed, money }: Pick<PanelDifferencesReply, 'renamed' | 'money'>,
): readonly string[] {
  const headers = renamed.map(({ role, before, after }) => {
    const title = columnTitle({ name: after, role });
    return `${title}: the column “${before}” is called “${after}” in v${newer.number}.`;
  });
  return [...unitChange(older, newer, money), ...headers];
}

function unitChange(older: Version, newer: Version, money: Money): readonly string[] {
  const [before, after] = [unitOf(older), unitOf(newer)];
  if (before === after) return [];
  return money === null
    ? [`The currency changed: v${older.number} is in ${before}, v${newer.number} in ${after}.`]
    : [
        `The unit changed from ${before} to ${after}: figures of v${older.number} are counted in ${after} here.`,
      ];
}

/** What the figures of a comparison are in, where the page shows another unit. */
export function moneyWords(older: Version, newer: Version, money: Money): string {
  return money === null
    ? `As saved: v${older.number} in ${unitOf(older)}, v${newer.number} in ${unitOf(newer)}`
    : `Money in ${unitText(money.currency, money.unit)}, every digit`;
}

function unitOf({ currency, unit }: Pick<Version, 'currency' | 'unit'>): string {
  return unitText(currency, unit);
}
