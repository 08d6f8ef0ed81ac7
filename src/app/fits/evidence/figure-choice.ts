import type { FitResult } from '@contract';
import { type IntervalFigure, type MoneyUnit, unitText } from '@figures';
import type { FigureKind, NumberFormat } from '../../ui/number-format';
import { asDifference, differenceKind, differenceUnit } from '../../ui/model-form';
import { regressorWord } from '../fit-words';

/** Which figure a picture is of: the standing, or a slope by its place. */
export type FigureChoice = 'standing' | number;

export interface NamedChoice {
  readonly choice: FigureChoice;
  readonly label: string;
}

type Figures = Pick<FitResult, 'slopes' | 'standing' | 'specification'>;

export function slopeChoices({ slopes }: Pick<FitResult, 'slopes'>): readonly NamedChoice[] {
  return slopes.map(({ name }, index) => ({
    choice: index,
    label: `Slope on ${regressorWord(name, index)}`,
  }));
}

/** The standing first, where there is one. */
export function figureChoices(result: Figures): readonly NamedChoice[] {
  const slopes = slopeChoices(result);
  return result.standing === null ? slopes : [{ choice: 'standing', label: 'Standing' }, ...slopes];
}

/** The fit's own figure, a standing of logs as the share that it is shown as. */
export function chosenFigure(result: Figures, choice: FigureChoice): IntervalFigure | null {
  if (choice !== 'standing') return result.slopes.at(choice) ?? null;
  return result.standing === null ? null : asDifference(result.standing, result.specification.form);
}

export function kindOf(result: Figures, choice: FigureChoice): FigureKind {
  return choice === 'standing' ? differenceKind(result.specification.form) : 'plain';
}

/** `standing`, or `slope on capex`: inside a sentence. */
export function choiceWord({ slopes }: Pick<FitResult, 'slopes'>, choice: FigureChoice): string {
  return choice === 'standing'
    ? 'standing'
    : `slope on ${regressorWord(slopes[choice].name, choice)}`;
}

/** What the figure is in, for the line under a title: `EUR m`, or what a slope is for. */
export function choiceUnit(
  { specification }: Pick<FitResult, 'specification'>,
  choice: FigureChoice,
  {
    panel,
    numbers,
  }: {
    readonly panel: { readonly currency: string; readonly unit: MoneyUnit };
    readonly numbers: NumberFormat;
  },
): string {
  if (choice === 'standing') return differenceUnit(specification.form, numbers);
  if (specification.form === 'log') return 'percent of market value for 1 % more';
  return choice < 2
    ? 'market value for 1 more'
    : `${unitText(panel.currency, panel.unit)} of market value for 1 more`;
}
