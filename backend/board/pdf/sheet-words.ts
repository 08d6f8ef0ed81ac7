import type { EditionChanges, EditionContent } from '../../contract';
import type { NumberWriter } from '../../figures';
import { placeText, rankedCount } from '../content/edition-terms';
import { differenceKind, shownDifference } from '../content/shown-difference';

export const confidentialityWords: Readonly<Record<EditionContent['confidentiality'], string>> = {
  confidential: 'Confidential: for those it was given to.',
  'inside-information':
    'May be inside information: share it only with those allowed to have it, and ask counsel before any outside use.',
};

/** Standing, places, sample: what stands under the headline. */
export function factsLine(content: EditionContent, numbers: NumberWriter): string {
  const { standing, specification, sample } = content.fit;
  const { form, confidence } = specification;
  const years = `FY${sample.firstYear}–FY${sample.lastYear}, ${sample.observations} rows of ${sample.companies} companies`;
  if (standing === null) return years;
  const kind = differenceKind(form);
  const unit = kind === 'money' ? ` ${numbers.unitLabel}` : '';
  const written = numbers.interval({ ...shownDifference(standing, form) }, kind, 3);
  const places =
    standing.rankSet === null
      ? (standing.rankReason ?? 'no rank set')
      : `${placeText(standing.rankSet)} of ${rankedCount(content)}`;
  const level = `${Math.round(confidence * 1000) / 10} % interval`;
  return `Standing ${written}${unit} (${level}) · ${places} · ${years}`;
}

export function lineageLine({
  panelVersion,
  peerGroup,
  fit,
  fitCreatedAt,
  fitCreatedBy,
}: EditionContent): string {
  return `Panel ${panelVersion.panelName} v${panelVersion.number}, FY${panelVersion.firstYear}–FY${panelVersion.lastYear}, file ${panelVersion.file.name} (SHA-256 ${panelVersion.file.sha256.slice(0, 16)}…) › peers v${peerGroup.number}, ${peerGroup.peerCount} peers › fit ${fit.hash.slice(0, 12)} of ${fitCreatedAt.slice(0, 10)} by ${fitCreatedBy}, engine ${fit.engine}`;
}

export function specificationWords({ fit }: EditionContent): string {
  const { effects, form, lag, slopes } = fit.specification;
  return [
    effects === 'company' ? 'Company effects' : 'Company and year effects',
    form === 'log' ? 'natural logs' : 'levels',
    lag === 1 ? 'regressors of the year before' : 'regressors of the same year',
    `covariance of the slopes ${slopes}`,
  ].join(', ');
}

/** What changed since the edition signed last, a line each. */
export function changeLines(
  content: EditionContent,
  changes: EditionChanges,
  numbers: NumberWriter,
): readonly string[] {
  const { form } = content.fit.specification;
  const figures = changes.figures.map(({ label, kind, before, after, beforeText, afterText }) => {
    if (kind === 'text') return `${label}: ${beforeText ?? 'none'} → ${afterText ?? 'none'}`;
    const written = (value: typeof before) => {
      if (value === null) return 'none';
      return label === 'standing'
        ? numbers.interval(shownDifference(value, form), differenceKind(form), 3)
        : numbers.interval(value, kind, 3);
    };
    return `${label}: ${written(before)} → ${written(after)}`;
  });
  const named = (companies: readonly string[], verb: string) =>
    companies.length === 0 ? [] : [`Peers ${verb}: ${companies.join(', ')}`];
  const cells = changes.panelCells;
  const panel =
    cells === null
      ? ['The panel is another one.']
      : cells.changedCells + cells.addedRows + cells.removedRows === 0
        ? ['No cell of the panel changed.']
        : [
            `Panel: ${cells.changedCells} cells changed, ${cells.addedRows} rows added, ${cells.removedRows} removed.`,
          ];
  const specification = changes.specification.map(
    ({ what, before, after }) => `${what}: ${before} → ${after}`,
  );
  return [
    ...figures,
    ...named(changes.peersAdded, 'added'),
    ...named(changes.peersRemoved, 'removed'),
    ...panel,
    ...specification,
  ];
}
