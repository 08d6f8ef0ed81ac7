import type { HeadlineProblem, Sentence } from '../../contract';
import { type MoneyUnit, sentenceText, unitRatio, unitText } from '../../figures';
import type { EditionFacts } from './edition-terms';
import { figureCatalogue, type KnownFigure } from './figure-catalogue';
import { estimateParts, type SentencePart, words } from './sentence';

export interface LinkedHeadline {
  readonly sentence: Sentence;
  readonly problems: readonly HeadlineProblem[];
}

/** A number of the text that was found to be a figure's. */
interface Match {
  readonly known: KnownFigure;
  readonly end: 'estimate' | 'low' | 'high';
  readonly part: SentencePart;
}

interface Piece {
  readonly start: number;
  readonly end: number;
  readonly part: SentencePart;
  readonly match?: Match;
}

const minus = '\u2212';
const numberPattern =
  /(?<![\w.,])(FY)?([\u2212-]?\d{1,3}(?:,\d{3})+(?:\.\d+)?|[\u2212-]?\d+(?:\.\d+)?)(\s?%)?/g;

/**
 * Ties every number of an edited headline to a figure of the edition. A number is a figure's when the figure, in the
 * unit asked for, rounds to it at the digits written, two significant ones at least. Years of the panel and the plan
 * need no figure.
 *
 * @returns the sentence with its figures, and what cannot stay: a number that is no figure's, an estimate without its
 *   interval, an amount in another unit, a direction that the figure contradicts.
 */
export function linkHeadline(text: string, facts: EditionFacts, unit: MoneyUnit): LinkedHeadline {
  const catalogue = figureCatalogue(facts);
  const problems: HeadlineProblem[] = [];
  const pieces: Piece[] = [
    ...namePieces(text, facts.ownCompany),
    ...unitPieces(text, facts, unit, problems),
  ];
  for (const found of text.matchAll(numberPattern)) {
    const [whole, fiscal, digits, percent] = found;
    const start = found.index;
    const end = start + whole.length;
    if (pieces.some((piece) => start < piece.end && end > piece.start)) continue;
    if (isYear(fiscal, digits, facts)) continue;
    const match = matchOf(digits, percent !== undefined, catalogue, facts, unit);
    if (match === undefined)
      problems.push({
        start,
        end,
        found: whole,
        detail: noFigureWords(whole, catalogue, facts, unit),
      });
    else pieces.push({ start, end, part: match.part, match });
  }
  pieces.sort((a, b) => a.start - b.start);
  problems.push(...bareEstimates(text, pieces, facts, unit), ...wrongDirections(text, pieces));
  problems.sort((a, b) => a.start - b.start);
  return { sentence: sentenceOf(text, pieces), problems };
}

function namePieces(text: string, ownCompany: string): readonly Piece[] {
  const pieces: Piece[] = [];
  for (
    let start = text.indexOf(ownCompany);
    start !== -1;
    start = text.indexOf(ownCompany, start + 1)
  )
    pieces.push({ start, end: start + ownCompany.length, part: { own: ownCompany } });
  return pieces;
}

/** The unit where it is the one asked for; a problem where it is another one. */
function unitPieces(
  text: string,
  { panelVersion }: EditionFacts,
  unit: MoneyUnit,
  problems: HeadlineProblem[],
): readonly Piece[] {
  const { currency } = panelVersion;
  const wanted = unitText(currency, unit);
  const pieces: Piece[] = [];
  for (const found of text.matchAll(new RegExp(`\\b${currency}(?: (?:bn|m|k)\\b)?`, 'g'))) {
    const start = found.index;
    const end = start + found[0].length;
    if (found[0] === wanted) pieces.push({ start, end, part: { unit: true } });
    else
      problems.push({
        start,
        end,
        found: found[0],
        detail: `Amounts of this headline are written in ${wanted}; found “${found[0]}”.`,
      });
  }
  return pieces;
}

function isYear(
  fiscal: string | undefined,
  digits: string,
  { fit, scenarios }: EditionFacts,
): boolean {
  if (!/^\d{4}$/.test(digits)) return false;
  const year = Number(digits);
  const lastPlanned = Math.max(
    0,
    ...scenarios.flatMap(({ plan }) => plan.map((each) => each.year)),
  );
  const isKnown =
    year >= fit.sample.firstYear && year <= Math.max(fit.sample.lastYear, lastPlanned);
  return isKnown || fiscal !== undefined;
}

function matchOf(
  digits: string,
  isPercent: boolean,
  catalogue: readonly KnownFigure[],
  { panelVersion }: EditionFacts,
  unit: MoneyUnit,
): Match | undefined {
  const plain = digits.replaceAll(',', '').replace(minus, '-');
  const isNegative = plain.startsWith('-');
  const written = Math.abs(Number(plain));
  const ratio = unitRatio(panelVersion.unit, unit);
  for (const known of catalogue) {
    if ((known.kind === 'percent') !== isPercent) continue;
    const factor = known.kind === 'money' ? ratio : known.kind === 'percent' ? 100 : 1;
    for (const end of ['estimate', 'low', 'high'] as const) {
      const value = known.shown[end];
      if (value === null || (isNegative && value >= 0)) continue;
      const places = placesThatRound(
        Math.abs(value) * factor,
        written,
        plain,
        known.kind === 'count',
      );
      if (places === undefined) continue;
      const isSize = value < 0 && !isNegative;
      const inPanelUnit = known.kind === 'money' ? places + Math.round(Math.log10(ratio)) : places;
      const part: SentencePart = {
        figure: known.figure,
        kind: known.kind,
        value,
        digits: inPanelUnit,
        isSize,
      };
      return { known, end, part };
    }
  }
  return undefined;
}

/**
 * Digits after the point at which a value rounds to what was written; undefined where it does not. Trailing zeros of a
 * whole number may be rounded ones: 2,410 is 2,407 at tens. Fewer than two significant digits are a value's only where
 * they are all of it.
 */
function placesThatRound(
  value: number,
  written: number,
  text: string,
  isCount: boolean,
): number | undefined {
  const point = text.indexOf('.');
  const after = point === -1 ? 0 : text.length - point - 1;
  if (isCount) return after === 0 && value === written ? 0 : undefined;
  if (value === written) return after;
  const magnitude = value === 0 ? 0 : Math.floor(Math.log10(value));
  const coarsest = after > 0 ? after : -trailingZeros(written);
  for (let places = after; places >= Math.max(coarsest, 1 - magnitude); places -= 1)
    if (roundTo(value, places) === roundTo(written, places)) return places;
  return undefined;
}

function trailingZeros(value: number): number {
  let count = 0;
  for (let rest = value; rest >= 10 && rest % 10 === 0; rest /= 10) count += 1;
  return count;
}

function roundTo(value: number, places: number): number {
  return places >= 0
    ? Number(value.toFixed(places))
    : Math.round(value / 10 ** -places) * 10 ** -places;
}

/** Estimates whose interval is not written somewhere in the sentence. */
function bareEstimates(
  text: string,
  pieces: readonly Piece[],
  facts: EditionFacts,
  unit: MoneyUnit,
): readonly HeadlineProblem[] {
  const written = (known: KnownFigure, end: Match['end']) =>
    pieces.some(({ match }) => match?.known === known && match.end === end);
  return pieces.flatMap(({ start, end, match }) => {
    if (match === undefined || !match.known.isEstimate || match.end !== 'estimate') return [];
    const { known } = match;
    const { low, high } = known.shown;
    if ((low === null || written(known, 'low')) && (high === null || written(known, 'high')))
      return [];
    if (low === null && high === null) return [];
    const whole = partsText(
      estimateParts(known.figure, known.kind, known.shown, isOneSided(known)),
      facts,
      unit,
    );
    return [
      {
        start,
        end,
        found: text.slice(start, end),
        detail: `${known.label} stands with its interval: ${whole}.`,
      },
    ];
  });
}

function isOneSided({ shown: { low, high } }: KnownFigure): boolean {
  return low !== null && high !== null && low > 0 === high > 0;
}

const upward = /\b(above|higher|more than|over|premium)\b/i;
const downward = /\b(below|lower|less than|under|discount)\b/i;

/** A standing whose sign the words beside it deny: its size is written, and only the other direction is named. */
function wrongDirections(text: string, pieces: readonly Piece[]): readonly HeadlineProblem[] {
  return pieces.flatMap(({ start, end, match }) => {
    if (match?.known.figure !== 'standing' || match.end !== 'estimate') return [];
    const isAbove = match.known.shown.estimate >= 0;
    const [said, denied] = isAbove ? [upward, downward] : [downward, upward];
    if (said.test(text) || !denied.test(text)) return [];
    return [
      {
        start,
        end,
        found: text.slice(start, end),
        detail: `The own company stands ${isAbove ? 'above' : 'below'} its peers; the sentence says the opposite.`,
      },
    ];
  });
}

function noFigureWords(
  found: string,
  catalogue: readonly KnownFigure[],
  facts: EditionFacts,
  unit: MoneyUnit,
): string {
  const standing = catalogue.find(({ figure }) => figure === 'standing');
  const nearest =
    standing === undefined
      ? ''
      : ` The standing is ${partsText(estimateParts('standing', standing.kind, standing.shown, isOneSided(standing)), facts, unit)}.`;
  return `“${found}” is no figure of this edition.${nearest}`;
}

function partsText(
  parts: readonly SentencePart[],
  { panelVersion }: EditionFacts,
  unit: MoneyUnit,
): string {
  const { currency } = panelVersion;
  return sentenceText(parts, { currency, panelUnit: panelVersion.unit, unit });
}

function sentenceOf(text: string, pieces: readonly Piece[]): Sentence {
  const sentence: Sentence = [];
  let from = 0;
  for (const { start, end, part } of pieces) {
    if (start > from) sentence.push(words(text.slice(from, start)));
    sentence.push(part);
    from = end;
  }
  if (from < text.length) sentence.push(words(text.slice(from)));
  return sentence;
}
