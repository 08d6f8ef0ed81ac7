import type { FitResult } from '@contract';
import type { IntervalFigure } from '@figures';
import type { FigureKind } from '../../ui/number-format';
import { asDifference, differenceKind } from '../../ui/model-form';
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
