import type { EditionRow } from '../../../db/repositories/editions-repository';
import type { EditionChanges, EditionContent, FitResult } from '../../contract';
import type { PanelDifferences } from '../../panel-data';
import { type EditionFacts, labelsOf, placeText } from './edition-terms';
import { differenceKind } from './shown-difference';

export interface EditionBefore {
  readonly content: EditionContent;
  readonly row: EditionRow;
  readonly panelDifferences: PanelDifferences | null;
}

type FigureChange = EditionChanges['figures'][number];
type Estimate = NonNullable<FigureChange['before']>;

const mostCells = 20;

/** What changed since the edition signed last: figures, peers, panel cells and specification. */
export function editionChanges(now: EditionFacts, before: EditionBefore): EditionChanges {
  const { content, row, panelDifferences } = before;
  const peersNow = membersOf(now);
  const peersBefore = membersOf(content);
  return {
    since: {
      id: row.id,
      number: row.number,
      signedAt: (row.decidedAt ?? row.publishedAt).toISOString(),
    },
    figures: isComparable(now, content) ? figureChanges(now, content) : [],
    peersAdded: peersNow.filter((company) => !peersBefore.includes(company)),
    peersRemoved: peersBefore.filter((company) => !peersNow.includes(company)),
    panelCells: panelDifferences && cellsOf(panelDifferences, [now.ownCompany, ...peersNow]),
    specification: specificationChanges(now, content),
  };
}

/** Figures in another currency, unit or form are not the same figures. */
function isComparable(now: EditionFacts, before: EditionFacts): boolean {
  return (
    now.panelVersion.currency === before.panelVersion.currency &&
    now.panelVersion.unit === before.panelVersion.unit &&
    now.fit.specification.form === before.fit.specification.form
  );
}

function membersOf({ peerGroup }: EditionFacts): readonly string[] {
  return peerGroup.peers.filter(({ isIncluded }) => isIncluded).map(({ company }) => company);
}

function figureChanges(now: EditionFacts, before: EditionFacts): FigureChange[] {
  const form = now.fit.specification.form;
  const labels = labelsOf(now);
  const slopes = now.fit.slopes.map((slope, index): FigureChange => ({
    label: `slope of ${labels[index]}`,
    figure: `slope.${index}`,
    kind: 'plain',
    before: estimateOf(before.fit.slopes.find(({ name }) => name === slope.name)),
    after: estimateOf(slope),
    beforeText: null,
    afterText: null,
  }));
  const [places, placesBefore] = [placesOf(now.fit), placesOf(before.fit)];
  return [
    {
      label: 'standing',
      figure: 'standing',
      // Of logs the difference itself is frozen; whoever shows it makes a share of it.
      kind: differenceKind(form),
      before: estimateOf(before.fit.standing),
      after: estimateOf(now.fit.standing),
      beforeText: null,
      afterText: null,
    },
    {
      label: 'rank set',
      figure: 'rank-set',
      kind: 'text',
      before: null,
      after: null,
      beforeText: placesBefore,
      afterText: places,
    },
    ...slopes,
  ];
}

function estimateOf(found: Estimate | null | undefined): Estimate | null {
  if (found === null || found === undefined) return null;
  const { estimate, standardError, low, high } = found;
  return { estimate, standardError, low, high };
}

function placesOf({ standing, intercepts }: FitResult): string | null {
  if (standing?.rankSet == null) return null;
  const ranked = intercepts.filter(({ deviation }) => deviation !== null).length;
  return `${placeText(standing.rankSet)} of ${ranked}`;
}

function cellsOf(
  differences: PanelDifferences,
  companies: readonly string[],
): NonNullable<EditionChanges['panelCells']> {
  const { addedRows, removedRows, changedCells, listed } = differences;
  return {
    addedRows,
    removedRows,
    changedCells,
    listed: listed.filter(({ company }) => companies.includes(company)).slice(0, mostCells),
  };
}

function specificationChanges(
  now: EditionFacts,
  before: EditionFacts,
): EditionChanges['specification'] {
  const facts: readonly (readonly [string, (edition: EditionFacts) => string])[] = [
    ['own company', ({ ownCompany }) => ownCompany],
    ['regressors', (edition) => labelsOf(edition).join(', ')],
    [
      'effects',
      ({ fit }) => (fit.specification.effects === 'company' ? 'company' : 'company and year'),
    ],
    ['form', ({ fit }) => (fit.specification.form === 'log' ? 'logs' : 'levels')],
    ['lag', ({ fit }) => (fit.specification.lag === 1 ? 'one year' : 'none')],
    ['covariance of the slopes', ({ fit }) => fit.specification.slopes],
    ['confidence', ({ fit }) => `${Math.round(fit.specification.confidence * 1000) / 10} %`],
    ['years', ({ fit }) => `FY${fit.sample.firstYear}–FY${fit.sample.lastYear}`],
    ['currency and unit', ({ panelVersion }) => `${panelVersion.currency}, ${panelVersion.unit}`],
    ['engine', ({ fit }) => fit.engine],
  ];
  return facts.flatMap(([what, of]) =>
    of(now) === of(before) ? [] : [{ what, before: of(before), after: of(now) }],
  );
}
