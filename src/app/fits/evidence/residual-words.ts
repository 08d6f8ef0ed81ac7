import type { FitResult, ResidualPoint, ResidualSummary } from '@contract';
import { type NumberFormat } from '../../ui/number-format';
import { asDifference, levelKind } from '../../ui/model-form';
import { counted } from '../../ui/phrases';

/** Externally studentised; a row beyond it is far outside what its company's other rows lead to expect. */
const far = 3;

type Residuals = Pick<ResidualSummary, 'largest' | 'points' | 'of'>;

function rowsBeyond({ points }: Residuals): number {
  return points.filter(({ studentised }) => studentised !== null && Math.abs(studentised) > far)
    .length;
}

function missOf(
  { residual }: ResidualPoint,
  { specification }: Pick<FitResult, 'specification'>,
  numbers: NumberFormat,
): string {
  const side = residual < 0 ? 'below' : 'above';
  if (specification.form === 'log')
    return `${numbers.headline(Math.abs(asDifference({ estimate: residual, low: null, high: null }, 'log').estimate), 'percent')} ${side}`;
  return `${numbers.headline(Math.abs(residual))} ${numbers.unitLabel()} ${side}`;
}

/** Which row stands out most by its studentised residual. */
export function residualAnswer(
  { largest }: Pick<Residuals, 'largest'>,
  result: Pick<FitResult, 'specification'>,
  numbers: NumberFormat,
): string {
  const most = largest.at(0);
  return most === undefined
    ? 'Every row lies where the model expects it.'
    : `${most.company} ${most.year} stands out most: ${missOf(most, result, numbers)} what is expected.`;
}

/** Which row stands out most by its studentised residual, and how many lie far off. */
export function residualMeaning(
  residuals: Residuals,
  result: Pick<FitResult, 'specification'>,
  numbers: NumberFormat,
): string {
  const head = residualAnswer(residuals, result, numbers);
  if (residuals.largest.length === 0) return head;
  const beyond = rowsBeyond(residuals);
  const rows = counted(residuals.of, 'row');
  return beyond === 0
    ? `${head} None of ${rows} lies more than ${far} times the usual spread away.`
    : `${head} ${beyond} of ${rows} ${beyond === 1 ? 'lies' : 'lie'} more than ${far} times the usual spread away: check ${beyond === 1 ? 'its' : 'their'} cells.`;
}

export function scatterTitle(residuals: Residuals): string {
  const beyond = rowsBeyond(residuals);
  const rows = counted(residuals.of, 'row');
  return `${beyond === 0 ? 'None' : beyond} of ${rows} ${beyond > 1 ? 'have' : 'has'} a studentised residual beyond ±${far}`;
}

/** Where residuals scatter most: `Residuals scatter most in Tolvane, standard deviation 420`. */
export function widestTitle(
  groups: readonly { readonly label: string; readonly standardDeviation: number }[],
  { specification }: Pick<FitResult, 'specification'>,
  numbers: NumberFormat,
): string {
  let widest = groups.at(0);
  if (widest === undefined) return 'There are no residuals';
  for (const group of groups)
    if (group.standardDeviation > widest.standardDeviation) widest = group;
  const kind = levelKind(specification.form);
  return `Residuals scatter most in ${widest.label}, standard deviation ${numbers.headline(widest.standardDeviation, kind)}`;
}
