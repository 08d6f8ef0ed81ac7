import { distance } from 'fastest-levenshtein';

/** Names this short differ by little and mean different companies. */
const shortestName = 5;
const mostDistance = 0.15;
/** Beyond so many names all pairs take too long to look at. */
const mostNames = 8000;

/**
 * Pairs of names that are near: at most 15% of the longer one's letters apart (Levenshtein's distance), five letters or
 * more, the same digits in both, as `Fund 1` and `Fund 2` are not one.
 *
 * Cost: of names with the same digits, all pairs of much the same length are compared by which letters they hold, which
 * sorts out all but a few; a change of one letter changes at most two of those.
 *
 * @param names  different from each other, as reduced by `nameKey`; more than 8,000 are not compared.
 * @returns positions in `names`.
 */
export function nearNames(names: readonly string[]): readonly (readonly [number, number])[] {
  if (names.length > mostNames) return [];
  const ofDigits = new Map<string, number[]>();
  names.forEach((name, index) => {
    if (name.length < shortestName) return;
    const digits = name.replace(/\D+/gu, ' ');
    const indices = ofDigits.get(digits);
    if (indices === undefined) ofDigits.set(digits, [index]);
    else indices.push(index);
  });
  return [...ofDigits.values()].flatMap((indices) => nearAmong(names, indices));
}

/** @param indices  of the names to compare. */
function nearAmong(names: readonly string[], indices: readonly number[]): [number, number][] {
  const order = indices.toSorted((left, right) => names[left].length - names[right].length);
  const sorted = order.map((index) => names[index]);
  const letters = Int32Array.from(sorted, lettersOf);
  const pairs: [number, number][] = [];
  for (let longer = 0; longer < sorted.length; longer++) {
    const { length } = sorted[longer];
    const most = Math.floor(mostDistance * length);
    for (let shorter = longer - 1; shorter >= 0; shorter--) {
      if (length - sorted[shorter].length > most) break;
      if (bitCount(letters[longer] ^ letters[shorter]) > 2 * most) continue;
      if (distance(sorted[longer], sorted[shorter]) > most) continue;
      pairs.push([order[shorter], order[longer]]);
    }
  }
  return pairs;
}

/** A bit for each letter that a name holds; letters share bits where there are more than 32. */
function lettersOf(name: string): number {
  let bits = 0;
  for (let at = 0; at < name.length; at++) bits |= 1 << (name.charCodeAt(at) & 31);
  return bits;
}

function bitCount(bits: number): number {
  let rest = bits - ((bits >>> 1) & 0x55555555);
  rest = (rest & 0x33333333) + ((rest >>> 2) & 0x33333333);
  return (((rest + (rest >>> 4)) & 0x0f0f0f0f) * 0x01010101) >>> 24;
}
