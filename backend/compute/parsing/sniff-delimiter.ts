import type { Delimiter } from './table';

const candidates: readonly Delimiter[] = [',', ';', '\t'];
const linesLookedAt = 20;

/**
 * The delimiter of a text table: the one that the most lines hold equally often, whatever titles stand above the table;
 * of equals the one that they hold most often. A table of one column has a comma.
 *
 * @param text  the beginning of the file; delimiters and line ends inside quotes do not count.
 */
export function sniffDelimiter(text: string): Delimiter {
  const lines = countByLine(text);
  const scored = candidates.map((delimiter, index) => {
    const { count, agreeing } = usualCount(lines.map((counts) => counts[index]));
    return { delimiter, count, agreeing };
  });
  const best = scored
    .filter(({ count }) => count > 0)
    .sort((left, right) => right.agreeing - left.agreeing || right.count - left.count);
  return best.length === 0 ? ',' : best[0].delimiter;
}

/** The count, 0 apart, that most lines have, and how many have it; of equals the largest. */
function usualCount(counts: readonly number[]): { count: number; agreeing: number } {
  const lines = new Map<number, number>();
  for (const count of counts) if (count > 0) lines.set(count, (lines.get(count) ?? 0) + 1);
  let usual = { count: 0, agreeing: 0 };
  for (const [count, agreeing] of lines) {
    const isMore = agreeing > usual.agreeing;
    if (isMore || (agreeing === usual.agreeing && count > usual.count)) usual = { count, agreeing };
  }
  return usual;
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
