import type excel from 'exceljs';
import type { PredictionBasis } from '../../stats/prediction';
import { address, bold, columnName, quiet, widths } from './workbook-cells';

export const modelSheetName = 'Model';

/** Names under which formulas find the model's numbers. */
export const modelNames = {
  level: 'own_level',
  slopes: 'slopes',
  means: 'own_means',
  held: 'held_values',
  last: 'last_read',
  lastError: 'last_error',
  years: 'years_in_sample',
  cosines: 'cosines',
  lambdaSquare: 'lambda_square',
  a: 'a_matrix',
  d: 'd_matrix',
  slopeCovariance: 'slope_covariance',
  satterthwaite: 'satterthwaite_s',
  quartic: 'satterthwaite_quartic',
  smear: 'smearing_factor',
  persistence: 'own_persistence',
} as const;

/**
 * Writes every number of the fit that a scenario is read by, each under a name, so that the scenario sheet computes with
 * them. λ'λ/B stands in place of the λ's: mean_j(w'λ_j)² = w'(λ'λ/B)w.
 */
export function writeModelSheet(workbook: excel.Workbook, basis: PredictionBasis): void {
  const sheet = workbook.addWorksheet(modelSheetName);
  widths(sheet, [34, 18, 18, 18, 18, 18]);
  let row = 1;
  const title = (text: string, caption: string) => {
    sheet.getCell(row, 1).value = text;
    sheet.getCell(row, 1).font = bold;
    sheet.getCell(row, 2).value = caption;
    sheet.getCell(row, 2).font = quiet;
    row += 1;
  };
  const named = (name: string, label: string, values: readonly (readonly number[])[]) => {
    sheet.getCell(row, 1).value = label;
    values.forEach((line, offset) => {
      line.forEach((value, column) => {
        sheet.getCell(row + offset, column + 2).value = value;
      });
    });
    const first = address(2, row, true);
    const last = address(values[0].length + 1, row + values.length - 1, true);
    workbook.definedNames.add(
      `${modelSheetName}!${first === last ? first : `${first}:${last}`}`,
      name,
    );
    row += values.length;
  };
  const one = (name: string, label: string, value: number) => {
    named(name, label, [[value]]);
  };

  title('The fit', 'Do not change these: they are what was estimated.');
  basis.regressors.forEach((regressor, k) => {
    sheet.getCell(row, k + 2).value = regressor;
    sheet.getCell(row, k + 2).font = bold;
  });
  row += 1;
  named(modelNames.slopes, 'slopes', [basis.coefficients.slice(1)]);
  named(modelNames.means, 'own means (logs where the form is log)', [basis.ownMeans]);
  const inScale = (values: readonly number[]) =>
    basis.form === 'log' ? values.map(Math.log) : values;
  named(modelNames.held, 'last observed values, held by the base', [
    inScale(basis.held ?? basis.last.regressors),
  ]);
  named(modelNames.last, 'values the model last read', [inScale(basis.last.regressors)]);
  one(modelNames.level, 'own level at its own means', basis.ownLevel);
  one(modelNames.lastError, 'error of the last observed year', basis.last.residual);
  one(modelNames.smear, 'smearing factor', basis.smear ?? 1);
  one(modelNames.persistence, 'persistence of the own errors', basis.ownErrors?.persistence ?? 0);
  title(
    'Intervals',
    'Of expected values: calibrated. Of differences: the covariance of the slopes.',
  );
  one(modelNames.years, 'years in the sample', basis.years);
  one(modelNames.cosines, 'cosines', basis.lambdas.length);
  if (basis.intervalReason === undefined) {
    named(modelNames.lambdaSquare, 'mean of λλ′', lambdaSquare(basis));
    named(modelNames.a, 'A', basis.a);
    named(modelNames.d, 'D', basis.d);
  }
  if (basis.slopeCovariance !== null)
    named(modelNames.slopeCovariance, 'covariance of the slopes', basis.slopeCovariance);
  if (basis.slopeDegreesOfFreedom?.kind === 'satterthwaite') {
    const { s, quartic } = basis.slopeDegreesOfFreedom;
    named(modelNames.satterthwaite, 'Satterthwaite, s', s);
    const size = Math.round(Math.sqrt(quartic.length));
    const lines = Array.from({ length: size }, (_, line) =>
      quartic.slice(line * size, (line + 1) * size),
    );
    named(modelNames.quartic, 'Satterthwaite, products of pairs', lines);
  }
  sheet.views = [{ state: 'frozen', xSplit: 1 }];
  sheet.getColumn(columnName(1)).alignment = { vertical: 'top' };
}

function lambdaSquare({ lambdas }: PredictionBasis): number[][] {
  const size = lambdas[0]?.length ?? 0;
  return Array.from({ length: size }, (_, row) =>
    Array.from(
      { length: size },
      (__, column) =>
        lambdas.reduce((sum, lambda) => sum + lambda[row] * lambda[column], 0) / lambdas.length,
    ),
  );
}
