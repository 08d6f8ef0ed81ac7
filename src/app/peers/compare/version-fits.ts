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
  /** With its interval; money with its unit where that does not stand in the header. */
  readonly standing: string;
  readonly places: string;
}

/** The fits of both versions with what all their standings are in; empty where they differ. */
export interface VersionFits {
  readonly unit: string;
  readonly lines: readonly FitLine[];
}

/** Those of the first version first. Money is shown in the unit of the screen. */
export function versionFits(a: SideVersion, b: SideVersion, numbers: NumberFormat): VersionFits {
  const sides = a.group.id === b.group.id ? [a] : [a, b];
  const isOneUnit =
    a.panel.currency === b.panel.currency &&
    sides.every(({ fits }) => fits.every(({ form }) => form === 'levels'));
  const lines = sides.flatMap((side) =>
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
      standing: standingText(side, fit, { firstUnit: a.panel.unit, hasUnit: !isOneUnit, numbers }),
      places:
        fit.rankSet === null
          ? 'n/a'
          : `${fit.rankSet[0] === fit.rankSet[1] ? fit.rankSet[0] : fit.rankSet.join(' to ')} of ${fit.companies ?? 'n/a'}`,
    })),
  );
  return { unit: isOneUnit ? numbers.unitLabel() : '', lines };
}

function standingText(
  { panel }: SideVersion,
  { standing, form }: SideVersion['fits'][number],
  {
    firstUnit,
    hasUnit,
    numbers,
  }: {
    readonly firstUnit: SideVersion['panel']['unit'];
    readonly hasUnit: boolean;
    readonly numbers: NumberFormat;
  },
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
  const text = numbers.interval(scaled, 'money');
  return hasUnit ? `${text} ${unitText(panel.currency, numbers.unit())}` : text;
}
