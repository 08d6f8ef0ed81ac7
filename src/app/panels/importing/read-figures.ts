/** Texts as numbers, one for each; undefined where a text is none or could be two. */
export type Figures = readonly (number | undefined)[];

/**
 * Reads positive figures that belong together, as a table of rates: they share one decimal sign, and a text that could
 * be two numbers, as 1,085, is read only where another text tells which sign is meant.
 */
export function readFigures(texts: readonly string[]): Figures {
  const plain = texts.map((text) => text.trim().replace(/[\s\u00a0\u202f'’]/gu, ''));
  const hasPoint = plain.some(pointOnly);
  const hasComma = plain.some(commaOnly);
  const sign = hasPoint === hasComma ? undefined : hasPoint ? '.' : ',';
  return plain.map((text) => readFigure(text, sign));
}

function readFigure(text: string, sign: '.' | ',' | undefined): number | undefined {
  if (/^\d+$/.test(text)) return Number(text);
  const isEither = /^[1-9]\d{0,2}[.,]\d{3}$/.test(text);
  // A lone point is a decimal one, as in all of this program; a lone comma could be either.
  const used = sign ?? (pointOnly(text) || (isEither && text.includes('.')) ? '.' : undefined);
  if (used === undefined) return commaOnly(text) ? asNumber(text, ',') : undefined;
  return asNumber(text, used);
}

function asNumber(text: string, decimalSign: '.' | ','): number | undefined {
  const [whole, part, ...rest] = text.split(decimalSign);
  const groups = whole.split(decimalSign === '.' ? ',' : '.');
  const isGrouped = groups.every((group, place) =>
    place === 0 ? /^\d{0,3}$/.test(group) : /^\d{3}$/.test(group),
  );
  const isPlain = groups.length === 1 && /^\d*$/.test(whole);
  if (rest.length > 0 || !(isPlain || isGrouped) || !/^\d*$/.test(part ?? '')) return undefined;
  if (groups.join('') + (part ?? '') === '') return undefined;
  return Number(`${groups.join('')}.${part ?? ''}`);
}

/** Whether its point can only be a decimal sign. */
function pointOnly(text: string): boolean {
  return /^\d*\.\d+$/.test(text) ? !/^[1-9]\d{0,2}\.\d{3}$/.test(text) : /^[\d,]+\.\d+$/.test(text);
}

/** Whether its comma can only be a decimal sign. */
function commaOnly(text: string): boolean {
  return /^\d*,\d+$/.test(text) ? !/^[1-9]\d{0,2},\d{3}$/.test(text) : /^[\d.]+,\d+$/.test(text);
}
