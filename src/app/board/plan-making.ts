import type { EditionContent } from '@contract';
import type { NumberFormat } from '../ui/number-format';
import { regressorKind } from '../ui/plan/regressor-labels';
import { shareText } from './edition-words';

type Scenario = EditionContent['scenarios'][number];

const spreads = { even: 'evenly', rising: 'rising', falling: 'falling' } as const;

/** How a scenario is looked at and how its amounts were made, a sentence each; none where the edition did not freeze it. */
export function planMaking(
  scenario: Scenario,
  labels: readonly string[],
  hasYearEffects: boolean,
  numbers: NumberFormat,
): readonly string[] {
  return [
    ...outlookWords(scenario, hasYearEffects),
    ...ruleWords(scenario, labels, numbers),
    ...uncertaintyWords(scenario),
  ];
}

function outlookWords({ outlook }: Scenario, hasYearEffects: boolean): readonly string[] {
  if (outlook === undefined) return [];
  const start =
    outlook.start === 'model-level'
      ? 'Starts at the model’s level.'
      : 'Starts at the last actual value; the gap to the model fades.';
  const { yearEffect } = outlook;
  const effect =
    yearEffect === 'last'
      ? 'that of the last observed year'
      : yearEffect === 'mean-of-last-three'
        ? 'the mean of the last three observed'
        : `given as ${yearEffect.given}`;
  return [
    start,
    ...(hasYearEffects ? [`Year effect of planned years: ${effect}.`] : []),
    `${shareText(outlook.confidence)} intervals of the expected value, ${shareText(outlook.bandConfidence)} band of the market value.`,
  ];
}

function ruleWords(
  { rules }: Scenario,
  labels: readonly string[],
  numbers: NumberFormat,
): readonly string[] {
  return (rules ?? []).map(({ rule, moves }, index) => {
    const moved = moves.map(
      ({ year, amount }) =>
        `, ${amount < 0 ? 'less' : 'plus'} ${numbers.headline(Math.abs(amount), regressorKind(index))} from FY${year} on`,
    );
    return `${capitalised(labels[index])} ${madeBy(rule, index, labels, numbers)}${moved.join('')}.`;
  });
}

function madeBy(
  rule: NonNullable<Scenario['rules']>[number]['rule'],
  index: number,
  labels: readonly string[],
  numbers: NumberFormat,
): string {
  switch (rule?.kind) {
    case undefined:
      return 'was typed';
    case 'hold':
      return 'is held at the last observed amount';
    case 'grow':
      return rule.percent < 0
        ? `falls by ${-rule.percent} % a year`
        : `grows by ${rule.percent} % a year`;
    case 'total':
      return `comes to ${numbers.headline(rule.total, regressorKind(index))} in all, spread ${spreads[rule.spread]}`;
    case 'share':
      return `is ${rule.percent} % of ${labels[rule.of]} of the same year`;
  }
}

function uncertaintyWords({ uncertainty }: Scenario): readonly string[] {
  if (uncertainty === null || uncertainty === undefined) return [];
  const ranges = uncertainty.ranges.flat().filter((range) => range !== null).length;
  return [
    `${ranges} planned ${ranges === 1 ? 'amount has' : 'amounts have'} a low and a high; seed of the draws ${uncertainty.seed}.`,
  ];
}

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
