import { type Flag, flagCodes } from '@panel-data';

/** Flags of one kind, told under one head. */
export interface FlagGroup {
  readonly key: string;
  /** `2 figures look 1,000 times too large`. */
  readonly title: string;
  readonly flags: readonly Flag[];
}

/** The flags by kind, unit slips also by factor and direction; in the order in which kinds are told. */
export function flagGroups(flags: readonly Flag[]): readonly FlagGroup[] {
  const byKey = new Map<string, Flag[]>();
  for (const flag of flags) {
    const key = kindOf(flag);
    const list = byKey.get(key);
    if (list === undefined) byKey.set(key, [flag]);
    else list.push(flag);
  }
  return [...byKey]
    .map(([key, list]) => ({ key, title: titleOf(list[0], list.length), flags: list }))
    .sort((left, right) => rank(left) - rank(right) || left.key.localeCompare(right.key, 'en'));
}

/** Flags of the same kind and company, or of its double: what was said of one may hold for them. */
export function alike(flag: Flag, flags: readonly Flag[]): readonly Flag[] {
  return flags.filter(
    (other) =>
      other !== flag &&
      kindOf(other) === kindOf(flag) &&
      (other.company === flag.company || isDouble(flag, other)),
  );
}

/** Whether each of the two repeats the other: of figures in the same year. */
function isDouble(flag: Flag, other: Flag): boolean {
  const [facts, otherFacts] = [flag.facts, other.facts];
  if (facts.code !== 'duplicate' || otherFacts.code !== 'duplicate') return false;
  const areOfEachOther = facts.company === other.company && otherFacts.company === flag.company;
  return areOfEachOther && (facts.of === 'name' || flag.year === other.year);
}

function kindOf({ facts }: Flag): string {
  switch (facts.code) {
    case 'unit-slip':
      return `unit-slip ${facts.factor} ${facts.isTooLarge ? 'large' : 'small'}`;
    case 'duplicate':
      return `duplicate ${facts.of}`;
    default:
      return facts.code;
  }
}

function rank({ flags: [{ facts }] }: FlagGroup): number {
  return flagCodes.indexOf(facts.code);
}

function titleOf({ facts }: Flag, count: number): string {
  const n = count.toLocaleString('en');
  const isOne = count === 1;
  const figures = `${n} ${isOne ? 'figure' : 'figures'}`;
  switch (facts.code) {
    case 'missing':
      return `${n} ${isOne ? 'cell is' : 'cells are'} missing`;
    case 'duplicate':
      return facts.of === 'name'
        ? `${n} ${isOne ? 'company' : 'companies'} may stand in twice`
        : `${figures} ${isOne ? 'repeats' : 'repeat'} another company’s`;
    case 'sign':
      return `${figures} ${isOne ? 'is' : 'are'} zero or negative`;
    case 'unit-slip': {
      const size = facts.isTooLarge ? 'large' : 'small';
      return `${figures} ${isOne ? 'looks' : 'look'} ${facts.factor.toLocaleString('en')} times too ${size}`;
    }
    case 'stale-copy':
      return `${figures} ${isOne ? 'repeats' : 'repeat'} the year before`;
    case 'jump':
      return `${figures} ${isOne ? 'jumps' : 'jump'} as the company’s figures rarely do`;
    case 'peer-outlier':
      return `${figures} ${isOne ? 'stands' : 'stand'} far from the other companies`;
    case 'year-gap':
      return `${n} ${isOne ? 'year' : 'years'} without a row`;
  }
}
