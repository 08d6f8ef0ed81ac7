type DecimalSign = '.' | ',';

const missing = new Set(['', 'NA', 'N/A', 'n/a', '#N/A', '-', '–', '—', '−', '.', '..']);
const blanks = /[\s\u00a0\u2007\u2009\u202f’']/gu;

/**
 * Reads a block of figures as people write them: `1,234.5`, `1.234,5`, `1 234`, `(1,234)`, `−12`, `1e3`. Which of
 * point and comma is the decimal sign, the block decides as a whole by what only one reading explains; where nothing
 * tells, it is the point.
 *
 * @returns null for a cell that says there is no value, undefined for any other text.
 */
export function readFigures(
  block: readonly (readonly string[])[],
): (number | null | undefined)[][] {
  const decimal = decimalSignOf(block.flat());
  return block.map((cells) => cells.map((text) => readFigure(text, decimal)));
}

function readFigure(text: string, decimal: DecimalSign): number | null | undefined {
  if (missing.has(text.trim())) return null;
  const { digits, isNegative } = unsigned(text);
  const pattern = decimal === '.' ? byPoint : byComma;
  if (!pattern.test(digits)) return undefined;
  const plain =
    decimal === '.' ? digits.replaceAll(',', '') : digits.replaceAll('.', '').replace(',', '.');
  const value = Number(plain);
  if (!Number.isFinite(value)) return undefined;
  return isNegative && value !== 0 ? -value : value;
}

const byPoint = /^(?:\d{1,3}(?:,\d{3})+(?:\.\d*)?|\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i;
const byComma = /^(?:\d{1,3}(?:\.\d{3})+(?:,\d*)?|\d+,?\d*|,\d+)(?:e[+-]?\d+)?$/i;

function unsigned(text: string): { readonly digits: string; readonly isNegative: boolean } {
  const plain = text.replace(blanks, '').replaceAll('\u2212', '-');
  const inParentheses = /^\((.+)\)$/.exec(plain);
  if (inParentheses !== null) return { digits: inParentheses[1], isNegative: true };
  if (/^.+-$/.test(plain)) return { digits: plain.slice(0, -1), isNegative: true };
  if (plain.startsWith('-')) return { digits: plain.slice(1), isNegative: true };
  return { digits: plain.startsWith('+') ? plain.slice(1) : plain, isNegative: false };
}

function decimalSignOf(cells: readonly string[]): DecimalSign {
  let points = 0;
  let commas = 0;
  for (const cell of cells) {
    const sign = provenSign(unsigned(cell).digits);
    if (sign === '.') points += 1;
    else if (sign === ',') commas += 1;
  }
  return commas > points ? ',' : '.';
}

/** The decimal sign that one cell proves; undefined where both readings, or neither, make a number. */
function provenSign(digits: string): DecimalSign | undefined {
  const [isByPoint, isByComma] = [byPoint.test(digits), byComma.test(digits)];
  if (isByPoint === isByComma) return undefined;
  return isByPoint ? '.' : ',';
}
