import type { FileRecipe, Measure, Unit } from '../../file-recipe';

/** What a numeric column measures and how far its unit is from the panel's. */
export interface MoneyColumn {
  readonly measure: Measure;
  /** Powers of ten from the column's unit to the panel's: 3 from millions to thousands. */
  readonly powerOfTen: number;
}

const powers: Readonly<Record<Unit, number>> = {
  units: 0,
  thousands: 3,
  millions: 6,
  billions: 9,
};

/**
 * One description a numeric column, in the order of `numericColumns`. Market value and book equity are stocks, capex is
 * a flow; a further column is what the recipe says, no money unless it does. What is no money has no unit.
 */
export function moneyColumns(recipe: FileRecipe): readonly MoneyColumn[] {
  const said = new Map(recipe.conversion.columns.map((column) => [column.column, column]));
  const describe = (column: string, measure: Measure): MoneyColumn => ({
    measure,
    powerOfTen:
      measure === 'no-money'
        ? 0
        : powers[said.get(column)?.unit ?? recipe.unit] - powers[recipe.unit],
  });
  return [
    describe(recipe.marketValue, 'stock'),
    describe(recipe.capex, 'flow'),
    describe(recipe.bookEquity, 'stock'),
    ...recipe.others.map((column) => describe(column, said.get(column)?.measure ?? 'no-money')),
  ];
}
