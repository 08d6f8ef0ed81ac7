import type { Alternative, FitResult } from '@contract';
import type { IntervalFigure, IntervalRow } from '@figures';
import { type FigureKind, type NumberFormat, headlineDigits } from '../../ui/number-format';
import { counted, listed } from '../../ui/phrases';
import { placesText } from '../fit-words';
import { type FigureChoice, choiceWord, chosenFigure, kindOf } from './figure-choice';

const names: Readonly<Record<Alternative['code'], string>> = {
  'this-fit': 'As specified',
  pooled: 'One pooled line',
  'fixed-effects': 'Company effects',
  'year-effects': 'With year effects',
  'log-form': 'In log form',
  lag: 'Regressors of the year before',
  'random-effects': 'Random effects',
};

interface Found {
  readonly figure: IntervalFigure | null;
  readonly kind: FigureKind;
  /** Whether it stands on the scale of this fit's own figure. */
  readonly isComparable: boolean;
  readonly reason: string;
}

function found(
  alternative: Alternative,
  { slopes, specification }: FitResult,
  choice: FigureChoice,
): Found {
  const isComparable = alternative.form === specification.form;
  const { standing, standingUnit, standingReason, reason = '' } = alternative;
  if (choice !== 'standing') {
    // This fit's own slope knows which ends a bootstrap interval does not have.
    const slope = alternative.isThisFit
      ? slopes[choice]
      : (alternative.slopes?.find(({ name }) => name === slopes[choice].name) ?? null);
    return { figure: slope, kind: 'plain', isComparable, reason };
  }
  const kind = standingUnit === 'percent' ? 'percent' : 'money';
  if (standing === null)
    return { figure: null, kind, isComparable, reason: standingReason ?? reason };
  return { figure: kind === 'percent' ? asShare(standing) : standing, kind, isComparable, reason };
}

/** The engine gives percent, 34 for 34 %; the screen counts in shares. */
function asShare({ estimate, low, high, intervalReason }: IntervalFigure): IntervalFigure {
  const share = (value: number | null): number | null => (value === null ? null : value / 100);
  return { estimate: estimate / 100, low: share(low), high: share(high), intervalReason };
}

/** The same figure in each model; on another scale in words. */
export function modelRows(
  result: FitResult,
  alternatives: readonly Alternative[],
  { choice, numbers }: { readonly choice: FigureChoice; readonly numbers: NumberFormat },
): readonly IntervalRow[] {
  return alternatives.map((alternative) => {
    const { figure, kind, isComparable, reason } = found(alternative, result, choice);
    const head = {
      name: names[alternative.code],
      note: noteOf(alternative, result, { choice, hasFigure: figure !== null }),
      isMarked: alternative.isThisFit,
    };
    if (figure !== null && isComparable) return { ...head, figure };
    if (figure === null) return { ...head, figure, reason: reason === '' ? 'none' : reason };
    return {
      ...head,
      figure: null,
      reason: onAnotherScale(alternative, { figure, kind }, numbers),
    };
  });
}

function onAnotherScale(
  { form }: Alternative,
  { figure, kind }: { readonly figure: IntervalFigure; readonly kind: FigureKind },
  numbers: NumberFormat,
): string {
  const text = numbers.interval(figure, kind, headlineDigits);
  if (kind === 'plain') return `${text}, of ${form === 'log' ? 'logs' : 'levels'}`;
  return kind === 'money' ? `${text} ${numbers.unitLabel()}` : text;
}

/** What stands behind a model's name; its reason too, where the figure is there and the reason only says more of it. */
function noteOf(
  { isThisFit, rankSet, observations, slopesNote, reason }: Alternative,
  { sample }: FitResult,
  { choice, hasFigure }: { readonly choice: FigureChoice; readonly hasFigure: boolean },
): string {
  const isStanding = choice === 'standing';
  const places = isStanding && rankSet !== null ? [placesText(rankSet, null)] : [];
  const rows =
    observations === null || observations === sample.observations
      ? []
      : [counted(observations, 'row')];
  const remarks = isStanding ? [] : [slopesNote, hasFigure ? reason : undefined];
  const notes = remarks.flatMap((remark) => (remark === undefined ? [] : [asNote(remark)]));
  return [...(isThisFit ? ['this fit'] : []), ...places, ...rows, ...notes].join(', ');
}

/** A sentence as part of a list: no full stop, no capital but that of an abbreviation. */
function asNote(sentence: string): string {
  const words = sentence.replace(/\.$/, '');
  return /^[A-Z][a-z]/.test(words) ? words[0].toLowerCase() + words.slice(1) : words;
}

function figuresOf(
  result: FitResult,
  alternatives: readonly Alternative[],
  choice: FigureChoice,
): readonly (Found & { readonly figure: IntervalFigure; readonly code: Alternative['code'] })[] {
  return alternatives.flatMap((alternative) => {
    const each = found(alternative, result, choice);
    return each.figure === null ? [] : [{ ...each, figure: each.figure, code: alternative.code }];
  });
}

/** How many models say the same, and how far apart they are. */
export function modelsTitle(
  result: FitResult,
  alternatives: readonly Alternative[],
  { choice, numbers }: { readonly choice: FigureChoice; readonly numbers: NumberFormat },
): string {
  const word = choiceWord(result, choice);
  const own = chosenFigure(result, choice);
  const figures = figuresOf(result, alternatives, choice);
  if (own === null || figures.length === 0) return `No model gives a ${word}`;
  const same = figures.filter(
    ({ figure }) => Math.sign(figure.estimate) === Math.sign(own.estimate),
  );
  const head = `${word[0].toUpperCase()}${word.slice(1)} ${own.estimate < 0 ? 'below' : 'above'} zero in ${same.length} of ${counted(figures.length, 'model')} that give one`;
  const values = figures
    .filter(({ isComparable }) => isComparable)
    .map(({ figure }) => figure.estimate);
  if (values.length < 2) return head;
  const kind = kindOf(result, choice);
  const [low, high] = [Math.min(...values), Math.max(...values)].map((value) =>
    numbers.headline(value, kind),
  );
  return `${head}, from ${low} to ${high}`;
}

/** Whether the choice of model decides what can be stated. */
export function modelsMeaning(
  result: FitResult,
  alternatives: readonly Alternative[],
  choice: FigureChoice,
): string {
  const word = choiceWord(result, choice);
  const own = chosenFigure(result, choice);
  const figures = figuresOf(result, alternatives, choice);
  if (own === null || figures.length === 0) return `No model gives a ${word}.`;
  const turned = figures.filter(
    ({ figure }) => Math.sign(figure.estimate) * Math.sign(own.estimate) < 0,
  );
  const judged = figures.filter(({ figure: { low, high } }) => low !== null || high !== null);
  const sure = judged.filter(({ figure: { low, high } }) => (low ?? -1) > 0 || (high ?? 1) < 0);
  const counts =
    judged.length === 0
      ? 'None of them has an interval.'
      : `In ${sure.length === 0 ? 'none' : sure.length} of ${counted(judged.length, 'model')} the interval excludes zero.`;
  return turned.length === 0
    ? `The ${word} lies on the same side of zero in every model that gives one. ${counts}`
    : `The choice of model matters: the ${word} lies on the other side of zero under ${listed(turned.map(({ code }) => `“${names[code].toLowerCase()}”`))}. ${counts}`;
}
