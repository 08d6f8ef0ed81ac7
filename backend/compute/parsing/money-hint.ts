import type { Unit } from '../file-recipe';
import { isCurrencyCode } from '../../panel-data/numbers/currency-code';

/** What a header or title says of its money. */
export interface MoneyHint {
  readonly currency?: string;
  readonly unit?: Unit;
}

const scales: readonly (readonly [RegExp, Unit])[] = [
  [/^(bn|b|bln|bil|billions?|mrd|milliarden?)$/u, 'billions'],
  [/^(m|mm|mn|mln|mio|mil|millions?|millionen)$/u, 'millions'],
  [/^(k|t|th|ths|tsd|thousands?|tausend|000s?)$/u, 'thousands'],
  [/^(units?|einheiten)$/u, 'units'],
];

const symbols: Readonly<Record<string, string>> = { '€': 'EUR', '£': 'GBP', $: 'USD', '¥': 'JPY' };

/**
 * Reads currency and unit from a header or title, as in `Capex (USD m)`, `Umsatz in Mio. €`, `capex_eur_k`, `TEUR`.
 * A scale counts in brackets, behind `in`, and next to a currency; elsewhere `m` may mean anything.
 */
export function moneyHint(text: string): MoneyHint {
  const words = wordsOf(text);
  const found: { currency?: string; unit?: Unit } = {};
  words.forEach(({ word, isInBrackets }, index) => {
    const joined = joinedHint(word);
    const isWord = englishWords.has(word) && !isInBrackets;
    const currency = isWord ? undefined : (currencyOf(word) ?? joined.currency);
    if (currency !== undefined) found.currency ??= currency;
    if (joined.unit !== undefined) found.unit ??= joined.unit;
    const before = words[index - 1]?.word ?? '';
    const after = words[index + 1]?.word ?? '';
    const isNextToMoney = [before, after].some((near) => currencyOf(near) !== undefined);
    if (!isInBrackets && !isNextToMoney && before.toLowerCase() !== 'in') return;
    const unit = scaleOf(word);
    if (unit !== undefined) found.unit ??= unit;
  });
  return found;
}

/** The text without what it says of its money: `Capex (USD m)` and `Capex in Mio. €` are `Capex`. */
export function withoutMoney(text: string): string {
  return wordsOf(text)
    .filter(({ word, isInBrackets }) => !isInBrackets && !isOfMoney(word))
    .map(({ word }) => word)
    .join(' ');
}

function isOfMoney(word: string): boolean {
  const isScale = scaleOf(word) !== undefined || joinedHint(word).unit !== undefined;
  return word.toLowerCase() === 'in' || currencyOf(word) !== undefined || isScale;
}

interface Word {
  readonly word: string;
  readonly isInBrackets: boolean;
}

function wordsOf(text: string): readonly Word[] {
  let depth = 0;
  return [...text.matchAll(/[([]|[)\]]|[€$£¥]|[\p{L}\p{N}]+/gu)].flatMap(([token]) => {
    if (token === '(' || token === '[') depth += 1;
    else if (token === ')' || token === ']') depth = Math.max(0, depth - 1);
    else return [{ word: token, isInBrackets: depth > 0 }];
    return [];
  });
}

/** A code in capitals anywhere, or in small letters as the words of a name in snake case. */
function currencyOf(word: string): string | undefined {
  if (Object.hasOwn(symbols, word)) return symbols[word];
  if (isCurrencyCode(word)) return word;
  return usualInSmallLetters.has(word) ? word.toUpperCase() : undefined;
}

const usualInSmallLetters = new Set([
  'eur',
  'usd',
  'gbp',
  'chf',
  'jpy',
  'sek',
  'nok',
  'dkk',
  'pln',
]);

/** Codes that titles in capitals hold as words; they count in brackets only. */
const englishWords = new Set(['ALL', 'TOP', 'TRY', 'CUP', 'MAD', 'COP', 'GEL']);

/** `TEUR`, `kEUR`, `mUSD`, `EURm`, `USDbn`. */
function joinedHint(word: string): MoneyHint {
  const front = /^(T|k|m|M|Mio|Mrd|bn)([A-Z]{3})$/u.exec(word);
  const back = /^([A-Z]{3})(k|m|mm|mn|bn)$/u.exec(word);
  const [currency, scale] = front !== null ? [front[2], front[1]] : [back?.[1], back?.[2]];
  if (currency === undefined || scale === undefined || !isCurrencyCode(currency)) return {};
  return { currency, unit: scaleOf(scale) };
}

function scaleOf(word: string): Unit | undefined {
  const lower = word.toLowerCase();
  return scales.find(([pattern]) => pattern.test(lower))?.[1];
}
