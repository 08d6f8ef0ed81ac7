import { type Scatter, peerDistances } from '@panel-data';
import { counted, listed } from '../../ui/phrases';
import type { PanelCompany } from '../peer-draft';
import type { PeerMeasure } from './peer-measures';

/** How far a company lies from the own one, and which measure makes how much of it. */
export interface Nearness {
  /** In standard deviations. */
  readonly distance: number;
  /** Each measure's part of the squared distance, in the order of the measures used; they add up to it. */
  readonly parts: readonly number[];
}

/** How near all companies are to the own one. */
export interface PeerNearness {
  /** The measures that count in the end. */
  readonly measures: readonly PeerMeasure[];
  readonly byCompany: ReadonlyMap<string, Nearness>;
  /** Of each other company without a distance, why it has none: `no growth: one year only`. */
  readonly without: ReadonlyMap<string, string>;
  /** Why fewer measures count than were chosen, or why there is no distance at all. */
  readonly remarks: readonly string[];
}

export interface NearnessQuestion {
  readonly companies: readonly PanelCompany[];
  /** Empty until one is chosen. */
  readonly ownCompany: string;
  /** The measures that are to count. */
  readonly measures: readonly PeerMeasure[];
  readonly scatter: Scatter;
}

/**
 * Distances by the measures asked for; where they cannot be had, by fewer of them, and each that falls away is named:
 * those that the own company lacks, one of several that say the same, and the least known where companies are too few.
 */
export function peerNearnessOf(question: NearnessQuestion): PeerNearness {
  const { companies, ownCompany, scatter } = question;
  const own = companies.find(({ name }) => name === ownCompany);
  if (own === undefined)
    return noDistances('Choose the own company to see how near the others are.');
  if (question.measures.length === 0)
    return noDistances('No measure counts: choose one to see how near the companies are.');
  const remarks = question.measures
    .filter((measure) => measure.valueOf(own) === null)
    .map(
      (measure) =>
        `${capital(measure.label)} does not count: ${ownCompany} has no value (${measure.whyNone(own)}).`,
    );
  let measures = question.measures.filter((measure) => measure.valueOf(own) !== null);
  while (measures.length > 0) {
    const found = peerDistances(valuesOf(companies, measures), ownCompany, scatter);
    if (found.kind === 'own-unknown') break;
    if (found.kind === 'found') {
      const byCompany = new Map(
        found.distances.map(({ company, distance, parts }) => [company, { distance, parts }]),
      );
      return { measures, byCompany, without: whyWithout(companies, own, measures), remarks };
    }
    const { fallen, why } =
      found.kind === 'dependent'
        ? oneThatSaysTheSame(
            found.measures.map((place) => measures[place]),
            scatter,
          )
        : leastKnown(measures, companies, found);
    remarks.push(why);
    measures = measures.filter((measure) => measure !== fallen);
  }
  return noDistances(...remarks, 'No distance can be computed.');
}

function noDistances(...remarks: string[]): PeerNearness {
  return { measures: [], byCompany: new Map(), without: new Map(), remarks };
}

function valuesOf(companies: readonly PanelCompany[], measures: readonly PeerMeasure[]) {
  return companies.map((company) => ({
    company: company.name,
    values: measures.map((measure) => measure.valueOf(company)),
  }));
}

interface Fallen {
  readonly fallen: PeerMeasure;
  readonly why: string;
}

function oneThatSaysTheSame(measures: readonly PeerMeasure[], scatter: Scatter): Fallen {
  const fallen = measures[measures.length - 1];
  const why =
    measures.length === 1
      ? `${capital(fallen.label)} does not count: it is the same for ${scatter === 'robust' ? 'half of the companies' : 'all companies'}.`
      : `${capital(listed(measures.map(({ label }) => label)))} say the same${scatter === 'robust' ? ' of half of the companies' : ''}: ${fallen.label} does not count.`;
  return { fallen, why };
}

/** The measure that the fewest companies have; the last of them where several do. */
function leastKnown(
  measures: readonly PeerMeasure[],
  companies: readonly PanelCompany[],
  { needed, found }: { readonly needed: number; readonly found: number },
): Fallen {
  const known = (measure: PeerMeasure): number =>
    companies.filter((company) => measure.valueOf(company) !== null).length;
  const fewest = Math.min(...measures.map(known));
  const fallen = measures.filter((measure) => known(measure) === fewest).at(-1) ?? measures[0];
  return {
    fallen,
    why: `${capital(fallen.label)} does not count: ${counted(measures.length, 'measure')} need ${needed} companies that have them all, and ${found === 1 ? '1 has' : `${found} have`}.`,
  };
}

function whyWithout(
  companies: readonly PanelCompany[],
  own: PanelCompany,
  measures: readonly PeerMeasure[],
): ReadonlyMap<string, string> {
  return new Map(
    companies
      .filter((company) => company !== own)
      .flatMap((company) => {
        const byReason = new Map<string, string[]>();
        for (const measure of measures) {
          if (measure.valueOf(company) !== null) continue;
          const why = measure.whyNone(company);
          byReason.set(why, [...(byReason.get(why) ?? []), measure.label]);
        }
        const words = [...byReason].map(([why, labels]) => `no ${listed(labels, 'or')}: ${why}`);
        return words.length === 0 ? [] : [[company.name, words.join('; ')] as const];
      }),
  );
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** Nearest first; those without a distance after them, by name. */
export function nearestFirst(
  companies: readonly PanelCompany[],
  { byCompany }: Pick<PeerNearness, 'byCompany'>,
): readonly PanelCompany[] {
  const far = ({ name }: PanelCompany): number => byCompany.get(name)?.distance ?? Infinity;
  return [...companies].sort((a, b) =>
    far(a) === far(b) ? a.name.localeCompare(b.name, 'en') : far(a) - far(b),
  );
}
