const narrow = /[ilj.,:;'|!()[\]tfrI\s]/;
const wide = /[mwMW@%…]/;
const capital = /[A-Z0-9ÄÖÜ&]/;

/** About how wide a text in the face for words is, CSS pixels: layouts run where nothing can be measured. */
export function wordsWidth(text: string, size = 12): number {
  let ems = 0;
  for (const letter of text)
    ems += narrow.test(letter)
      ? 0.31
      : wide.test(letter)
        ? 0.87
        : capital.test(letter)
          ? 0.63
          : 0.54;
  return ems * size;
}

/** How wide a text in the monospaced face for figures is: every letter takes 0.6 em. */
export function figuresWidth(text: string, size = 12): number {
  return text.length * 0.6002 * size;
}

/** The text, or as much of it as fits with an ellipsis. */
export function clippedWords(text: string, width: number, size = 12): string {
  if (wordsWidth(text, size) <= width) return text;
  const letters = Array.from(text);
  while (letters.length > 1 && wordsWidth(letters.join('') + '…', size) > width) letters.pop();
  return letters.join('').trimEnd() + '…';
}

/** The text in lines of at most `width`; a word longer than that stands alone. */
export function wrappedWords(text: string, width: number, size = 12): string[] {
  const lines: string[] = [];
  for (const word of text.split(/\s+/).filter((part) => part !== '')) {
    const longer = lines.length === 0 ? word : `${lines[lines.length - 1]} ${word}`;
    if (lines.length > 0 && wordsWidth(longer, size) <= width) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
}
