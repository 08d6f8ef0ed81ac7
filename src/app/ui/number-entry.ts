/**
 * Reads a number as people type or paste it: `1,234.5`, `(1,234)`, `−12`, `1 234`. Undefined for anything that is
 * not one number: a comma is a thousands separator and has to stand where one belongs.
 */
export function readNumber(text: string): number | undefined {
  let rest = text.trim().replace(/[\s\u00a0\u202f]/g, '');
  let sign = 1;
  const inParentheses = /^\((.+)\)$/.exec(rest);
  if (inParentheses !== null) {
    sign = -1;
    rest = inParentheses[1];
  } else if (/^[-\u2212+]/.test(rest)) {
    sign = rest.startsWith('+') ? 1 : -1;
    rest = rest.slice(1);
  }
  if (rest.includes(',')) {
    if (!/^\d{1,3}(,\d{3})+(\.\d*)?$/.test(rest)) return undefined;
    rest = rest.replaceAll(',', '');
  }
  if (!/^(\d+\.?\d*|\.\d+)$/.test(rest)) return undefined;
  const value = sign * Number(rest);
  return Number.isFinite(value) ? value + 0 : undefined;
}
