import { shortNumber } from '../evidence/in-words';
import type { FitResult, FitWarning, SlopeEstimate } from '../fit-result';

const manyStandardErrors = 2;

/** One warning a company without which a slope changes its sign or moves by more than two standard errors. */
export function dominatedWarnings(
  slopes: readonly SlopeEstimate[],
  withoutCompany: FitResult['withoutCompany'],
): FitWarning[] {
  return withoutCompany.flatMap(({ company, slopes: without, reason }): FitWarning[] => {
    if (without === null) {
      return [{ code: 'dominated', detail: `${company}: ${reason ?? ''}`, subjects: [company] }];
    }
    const moved = slopes.filter((slope, k) => isMoved(slope, without[k]));
    if (moved.length === 0) return [];
    const changes = moved.map((slope) => {
      const value = without[slopes.indexOf(slope)];
      return `${slope.name} goes from ${shortNumber(slope.estimate)} to ${shortNumber(value)}`;
    });
    const detail = `Without ${company}, ${changes.join(' and ')}: this one company decides the result.`;
    return [{ code: 'dominated', detail, subjects: [company, ...moved.map(({ name }) => name)] }];
  });
}

function isMoved(slope: SlopeEstimate, without: number): boolean {
  if (Math.sign(slope.estimate) * Math.sign(without) < 0) return true;
  return (
    slope.standardError !== null &&
    Math.abs(without - slope.estimate) > manyStandardErrors * slope.standardError
  );
}
