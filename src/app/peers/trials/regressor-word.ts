/** A regressor in the reader's words: the first two of a fit are always capex and book equity. */
export function regressorWord(index: number, name: string): string {
  return index === 0 ? 'capex' : index === 1 ? 'book equity' : name;
}
