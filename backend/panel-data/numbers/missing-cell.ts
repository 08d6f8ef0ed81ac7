const tokens = new Set(['', 'NA', 'N/A', 'n/a', '#N/A', '-', '–', '—', '−', '.', '..']);

/** Whether a cell stands for a missing value. */
export function isMissing(text: string): boolean {
  return tokens.has(text.trim());
}
