import type { Delimiter } from './table';

const candidates: readonly Delimiter[] = [',', ';', '\t'];
const linesLookedAt = 20;

/**
 * The delimiter of a text table: the one that the most lines hold exactly as often as the header does; of equals the
 * one the header holds most often. A table of one column has a comma.
 *
 * @param text  the beginning of the file; delimiters and line ends inside quotes do not count.
 */
export function sniffDelimiter(text: string): Delimiter {
  const lines = countByLine(text);
  const scored = candidates.map((delimiter, index) => {
    const inHeader = lines[0][index];
    const agreeing = lines.filter((counts) => counts[index] === inHeader).length;
    return { delimiter, inHeader, agreeing };
  });
  const best = scored
    .filter(({ inHeader }) => inHeader > 0)
    .sort((left, right) => right.agreeing - left.agreeing || right.inHeader - left.inHeader);
  return best.length === 0 ? ',' : best[0].delimiter;
}

/** Occurrences of each candidate in each of the first lines that are not blank. */
function countByLine(text: string): number[][] {
  const lines: number[][] = [];
  let counts = candidates.map(() => 0);
  let isQuoted = false;
  let isBlank = true;
  for (const character of text) {
    if (character === '"') isQuoted = !isQuoted;
    if (!isQuoted && (character === '\n' || character === '\r')) {
      if (!isBlank) lines.push(counts);
      if (lines.length === linesLookedAt) return lines;
      counts = candidates.map(() => 0);
      isBlank = true;
      continue;
    }
    isBlank = false;
    const index = isQuoted ? -1 : candidates.indexOf(character as Delimiter);
    if (index !== -1) counts[index] += 1;
  }
  if (!isBlank || lines.length === 0) lines.push(counts);
  return lines;
}
