import type { CovarianceSummary, Evidence, FitResult } from '@contract';
import type { IntervalRow } from '@figures';
import { covarianceShort } from '../../ui/covariance-words';
import { type NumberFormat, headlineDigits } from '../../ui/number-format';
import { counted, listed } from '../../ui/phrases';
import { regressorWord } from '../fit-words';
import { degreesText, pCell } from './statistic-words';

type Covariances = Pick<Evidence, 'covariances'>;
type Slope = NonNullable<CovarianceSummary['slopes']>[number];

/** What the notes of a covariance say, in few words; the bootstrap's are of single slopes and stand in the table. */
const noteWords: Partial<Readonly<Record<CovarianceSummary['code'], string>>> = {
  'two-way': 'negative variance set to 0',
};

/** `default, of this fit`: what stands behind a name. */
export function covarianceNote({ code, isDefault, isChosen, notes }: CovarianceSummary): string {
  const noted = notes.length === 0 ? '' : (noteWords[code] ?? 'with a remark below');
  return [isDefault ? 'default' : '', isChosen ? 'of this fit' : '', noted]
    .filter((part) => part !== '')
    .join(', ');
}

/** The same slope with each way's interval. */
export function covarianceRows(
  { covariances }: Covariances,
  { slopes }: Pick<FitResult, 'slopes'>,
  index: number,
): readonly IntervalRow[] {
  const { estimate } = slopes[index];
  return covariances.map((covariance) => {
    const head = {
      name: covarianceShort(covariance.code),
      note: covarianceNote(covariance),
      isMarked: covariance.isChosen,
    };
    const slope = covariance.slopes?.at(index);
    if (slope === undefined)
      return { ...head, figure: null, reason: covariance.reason ?? 'not run' };
    const { low, high, unbounded, reason } = slope;
    return { ...head, figure: { estimate, low, high, unbounded, intervalReason: reason } };
  });
}

/** Whether zero lies outside; null where a way has no interval. */
function excludesZero({ low, high, unbounded }: Slope): boolean | null {
  if (unbounded === 'both') return false;
  if (low === null && high === null) return null;
  return (low !== null && low > 0) || (high !== null && high < 0);
}

interface Ways {
  readonly outside: readonly string[];
  readonly inside: readonly string[];
}

function waysOf({ covariances }: Covariances, index: number): Ways {
  const ways = covariances.flatMap(({ code, slopes }) => {
    const slope = slopes?.at(index);
    const excludes = slope === undefined ? null : excludesZero(slope);
    return excludes === null ? [] : [{ name: covarianceShort(code), excludes }];
  });
  const names = (excludes: boolean): string[] =>
    ways.filter((way) => way.excludes === excludes).map(({ name }) => name);
  return { outside: names(true), inside: names(false) };
}

export function intervalsTitle(
  evidence: Covariances,
  { slopes }: Pick<FitResult, 'slopes'>,
  { index, numbers }: { readonly index: number; readonly numbers: NumberFormat },
): string {
  const slope = slopes[index];
  const { outside, inside } = waysOf(evidence, index);
  const head = `Slope on ${regressorWord(slope.name, index)} ${numbers.interval(slope, 'plain', headlineDigits)}`;
  const all = outside.length + inside.length;
  if (all === 0) return `${head}: no way gives an interval`;
  return `${head}: the interval excludes zero in ${outside.length} of ${counted(all, 'way')}`;
}

/** Why the default is the default on this panel, and whether the choice decides anything. */
export function intervalsMeaning(
  evidence: Covariances,
  { sample, standing }: Pick<FitResult, 'sample' | 'standing'>,
  { index, numbers }: { readonly index: number; readonly numbers: NumberFormat },
): string {
  const errors = errorsText(standing?.persistence ?? null, numbers);
  const companies = counted(sample.companies, 'company', 'companies');
  const why = `CR2 is the default here: ${errors}, which row-by-row intervals overlook, and CR2 corrects for having ${companies}.`;
  const { outside, inside } = waysOf(evidence, index);
  return outside.length + inside.length < 2 ? why : `${why} ${intervalsAnswer(evidence, index)}`;
}

/** Whether the choice of intervals decides anything about one slope. */
export function intervalsAnswer(evidence: Covariances, index: number): string {
  const { outside, inside } = waysOf(evidence, index);
  if (outside.length + inside.length < 2) return 'Fewer than two ways give an interval here.';
  if (outside.length === 0 || inside.length === 0)
    return `Every way says the same of zero: it lies ${inside.length === 0 ? 'outside' : 'inside'} the interval.`;
  const fewer = outside.length <= inside.length ? outside : inside;
  const side = fewer === outside ? 'outside' : 'inside';
  return `The choice matters: zero lies ${side} the interval under ${listed(fewer)}, not under the others.`;
}

function errorsText(persistence: number | null, numbers: NumberFormat): string {
  if (persistence === null) return 'errors of one company may persist over the years';
  const estimate = `estimated persistence ${numbers.headline(persistence, 'plain')}, where 0 is none and 1 never fades`;
  return persistence > 0
    ? `errors of one company persist over the years (${estimate})`
    : `errors of one company may persist over the years, though these are not seen to (${estimate})`;
}

export interface CovarianceLine {
  readonly code: string;
  readonly name: string;
  readonly note: string;
  readonly standardError: string;
  readonly degreesOfFreedom: string;
  readonly pValue: string;
  readonly remarks: readonly string[];
  readonly definition: string;
  readonly source: string;
}

/** What stands behind each way's interval of one slope. */
export function covarianceLines(
  { covariances }: Covariances,
  index: number,
  numbers: NumberFormat,
): readonly CovarianceLine[] {
  return covariances.map((covariance) => {
    const slope = covariance.slopes?.at(index);
    const remarks = [covariance.reason, slope?.reason, ...covariance.notes];
    return {
      code: covariance.code,
      name: covarianceShort(covariance.code),
      note: covarianceNote(covariance),
      standardError: numbers.figure(slope?.standardError, 'plain'),
      degreesOfFreedom: degreesText(slope?.degreesOfFreedom ?? null, numbers),
      pValue: pCell(slope?.pValue ?? null),
      remarks: remarks.filter((remark) => remark !== undefined),
      definition: covariance.definition,
      source: covariance.source,
    };
  });
}
