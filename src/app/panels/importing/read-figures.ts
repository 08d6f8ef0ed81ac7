import { decimalSignIn, parseNumber } from '@panel-data';

/** Texts as numbers, one for each; undefined where a text is none or could be two. */
export type Figures = readonly (number | undefined)[];

/**
 * Reads positive figures that belong together, as a table of rates: they share one decimal sign, and a text that could
 * be two numbers, as 1,085, is read only where another text tells which sign is meant. A lone point is a decimal one,
 * as in all of this program.
 */
export function readFigures(texts: readonly string[]): Figures {
  const signs = texts.map(decimalSignIn);
  const [hasPoint, hasComma] = [signs.includes('.'), signs.includes(',')];
  const shared = hasPoint === hasComma ? undefined : hasPoint ? '.' : ',';
  return texts.map((text, place) => {
    const own = signs[place];
    const isLonePoint = own === 'either' && text.includes('.');
    const sign = shared ?? (own === 'either' ? (isLonePoint ? '.' : undefined) : (own ?? '.'));
    const value = sign === undefined ? undefined : parseNumber(text, sign);
    return value !== undefined && value >= 0 ? value : undefined;
  });
}
