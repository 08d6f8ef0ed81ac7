import type { FitResult } from '@contract';
import type { LeftOut } from '@figures';
import { type NumberFormat, headlineDigits } from '../../ui/number-format';
import { listed } from '../../ui/phrases';
import { placesText } from '../fit-words';
import { rankedCount } from '../standing-words';
import { type FigureChoice, choiceWord, chosenFigure, kindOf } from './figure-choice';
import { leaving, mostMoving, rangeOf, turning } from './left-out';

const mostNamed = 4;

/** `A, B or C`, or how many where they are many. */
function named(left: readonly LeftOut[], many: string): string {
  return left.length > mostNamed
    ? `any one of ${left.length} ${many}`
    : listed(
        left.map(({ name }) => name),
        'or',
      );
}

/** Title of a picture of what is left out: the figure with all, then how far it goes without one. */
export function leftOutTitle(
  result: FitResult,
  { choice, left, one }: { choice: FigureChoice; left: readonly LeftOut[]; one: string },
  numbers: NumberFormat,
): string {
  const full = chosenFigure(result, choice);
  const word = choiceWord(result, choice);
  if (full === null) return `There is no ${word} to compare`;
  const kind = kindOf(result, choice);
  const rankSet = choice === 'standing' ? result.standing?.rankSet : null;
  const places = rankSet == null ? '' : `, ${placesText(rankSet, rankedCount(result))}`;
  const head = `${choice === 'standing' ? 'Standing' : `${word[0].toUpperCase()}${word.slice(1)}`} ${numbers.interval(full, kind, headlineDigits)}${places}`;
  const range = rangeOf(left);
  if (range === null) return head;
  const [low, high] = range.map((value) => numbers.headline(value, kind));
  const known = left.filter(({ estimate }) => estimate !== null).length;
  const share = known === left.length ? '' : ` (${known} of ${left.length} known)`;
  return `${head}; without any one ${one} from ${low} to ${high}${share}`;
}

interface LeftOutFigure {
  readonly choice: FigureChoice;
  readonly left: readonly LeftOut[];
  /** What is left out, many of them: `companies`. */
  readonly many: string;
}

/** Without which one a figure moves most. */
export function leftOutAnswer(
  result: FitResult,
  { choice, left, many }: LeftOutFigure,
  numbers: NumberFormat,
): string {
  const full = chosenFigure(result, choice);
  const word = choiceWord(result, choice);
  const most = full === null ? null : mostMoving(left, full);
  if (full === null || most === null) return noneText(word, many);
  const kind = kindOf(result, choice);
  const [to, from] = [most.estimate, full.estimate].map((value) => numbers.headline(value, kind));
  const unit = kind === 'money' ? ` ${numbers.unitLabel()}` : '';
  return `The ${word} moves most without ${most.name}: to ${to} from ${from}${unit}.`;
}

/** Without which one a figure moves most, and whether any changes what can be stated. */
export function leftOutMeaning(
  result: FitResult,
  picture: LeftOutFigure,
  numbers: NumberFormat,
): string {
  const answer = leftOutAnswer(result, picture, numbers);
  const consequence = leftOutConsequence(result, picture);
  return answer === consequence ? answer : `${answer} ${consequence}`;
}

function noneText(word: string, many: string): string {
  return `With one of the ${many} left out there is no ${word} to compare.`;
}

/** Whether a figure changes its side or leaves its interval when one is left out, in a sentence. */
export function leftOutConsequence(
  result: FitResult,
  { choice, left, many }: LeftOutFigure,
): string {
  const full = chosenFigure(result, choice);
  const word = choiceWord(result, choice);
  if (full === null || rangeOf(left) === null) return noneText(word, many);
  const turned = turning(left, full);
  if (turned.length > 0)
    return `Without ${named(turned, many)} the ${word} lies on the other side of zero.`;
  const gone = leaving(left, full);
  if (gone.length > 0)
    return `Without ${named(gone, many)} the ${word} leaves the interval that it has with all.`;
  const hasInterval = full.low !== null || full.high !== null;
  const stay = hasInterval ? 'inside its interval' : 'on its side of zero';
  const known = left.filter(({ estimate }) => estimate !== null).length;
  return known === left.length
    ? `Whichever of the ${many} is left out, the ${word} stays ${stay}.`
    : `For ${known} of the ${left.length} ${many} a figure without it is known: there the ${word} stays ${stay}.`;
}
