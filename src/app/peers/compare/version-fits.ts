import { unitRatio, unitText } from '@figures';
import { covarianceShort } from '../../ui/covariance-words';
import { asDifference, differenceKind, modelNotes } from '../../ui/model-form';
import type { NumberFormat } from '../../ui/number-format';
import { confidenceText, lagText, listed, shortHash } from '../../ui/phrases';
import type { SideVersion } from './compare-store';

/** What a fit of a version came to. */
export interface FitLine {
  readonly id: string;
  readonly name: string;
  readonly version: number;
  readonly model: string;
  /** With its interval; money with its unit, since panels may differ in theirs. */
  readonly standing: string;
  readonly places: string;
}

/** The fits of both versions, those of the first one first. Money is shown in the unit of the screen. */
export function versionFits(
  a: SideVersion,
  b: SideVersion,
  numbers: NumberFormat,
): readonly FitLine[] {
  const sides = a.group.id === b.group.id ? [a] : [a, b];
  return sides.flatMap((side) =>
    side.fits.map((fit) => ({
      id: fit.id,
      name: shortHash(fit.hash),
      version: side.group.number,
      model: [
        `capex and book equity${lagText(fit.lag)}`,
        ...(fit.regressors.length > 2 ? [`with ${listed(fit.regressors.slice(2))}`] : []),
        ...modelNotes(fit),
        `${covarianceShort(fit.slopes)} at ${confidenceText(fit.confidence)}`,
      ].join(', '),
      standing: standingText(side, fit, { firstUnit: a.panel.unit, numbers }),
      places:
        fit.rankSet === null
          ? 'n/a'
          : `${fit.rankSet[0] === fit.rankSet[1] ? fit.rankSet[0] : fit.rankSet.join(' to ')} of ${fit.companies ?? 'n/a'}`,
    })),
  );
}

function standingText(
  { panel }: SideVersion,
  { standing, form }: SideVersion['fits'][number],
  {
    firstUnit,
    numbers,
  }: { readonly firstUnit: SideVersion['panel']['unit']; readonly numbers: NumberFormat },
): string {
  if (standing === null) return 'n/a';
  const shown = asDifference(standing, form);
  if (form === 'log') return numbers.interval(shown, differenceKind(form));
  const ratio = unitRatio(panel.unit, firstUnit);
  const scaled = {
    estimate: shown.estimate * ratio,
    low: shown.low === null ? null : shown.low * ratio,
    high: shown.high === null ? null : shown.high * ratio,
  };
  return `${numbers.interval(scaled, 'money')} ${unitText(panel.currency, numbers.unit())}`;
}
