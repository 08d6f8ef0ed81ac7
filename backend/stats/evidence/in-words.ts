const words = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** A count as a word up to twelve, in digits beyond. */
export function countInWords(count: number): string {
  return words[count] ?? String(count);
}

/** Four significant digits, with true minus signs. */
export function shortNumber(value: number): string {
  return String(Number(value.toPrecision(4))).replace(/-/gu, '−');
}

/** 'p = 0.012', 'p < 0.001'. */
export function pInWords(pValue: number): string {
  return pValue < 0.001 ? 'p < 0.001' : `p = ${pValue.toPrecision(2)}`;
}

/** 'A', 'A and B', 'A, B and C'; beyond the first `most` the number of the rest. */
export function listInWords(names: readonly string[], most = 4): string {
  const shown = names.length > most ? names.slice(0, most) : names;
  if (names.length > most) return `${shown.join(', ')} and ${names.length - most} more`;
  if (shown.length < 2) return shown.join('');
  return `${shown.slice(0, -1).join(', ')} and ${shown[shown.length - 1]}`;
}
