import type { StandingRow } from '../../db/repositories/panel-corrections-repository';
import type { FileRecipe, Unit } from '../compute/file-recipe';
import { moneyColumns } from '../compute/parsing/conversion/money-columns';

/** What a figure of the file was converted by. */
export interface CellConversion {
  /** Null where no currency was converted. */
  readonly currency: string | null;
  readonly rate: number | null;
  readonly rateKind: 'average' | 'year-end' | null;
  /** The column's unit in the file; null where it is the panel's. */
  readonly unit: Unit | null;
  readonly priceIndex: {
    readonly year: number;
    readonly baseYear: number;
    readonly base: number;
  } | null;
}

/** How a cell came to be other than the file has it. */
export interface CellOrigin {
  readonly corrected: StandingRow | null;
  readonly conversion: CellConversion | null;
}

/** A cell of a panel version. */
export interface PanelCell {
  readonly company: string;
  readonly year: number;
  /** Position among the version's columns. */
  readonly column: number;
  readonly value: number | null;
  /** Currency of its row in the file. */
  readonly currency: string | null;
  readonly fileRow: number;
}

type OriginOf = (cell: PanelCell) => CellOrigin | null;

/**
 * Tells of each cell how it came to be other than the file has it.
 *
 * @param recipe  how the file became the panel; null where none was kept.
 * @param corrections  the last one of each cell; one that the cell's value no longer shows is passed over.
 */
export function cellOrigins(
  recipe: FileRecipe | null,
  corrections: readonly StandingRow[],
): OriginOf {
  const lastOf = new Map(
    corrections.map((row) => [`${row.columnIndex} ${row.year} ${row.company}`, row]),
  );
  const conversionOf = recipe === null ? () => null : conversions(recipe);
  return (cell) => {
    const last = lastOf.get(`${cell.column} ${cell.year} ${cell.company}`);
    if (last?.value === cell.value) return { corrected: last, conversion: null };
    const conversion = cell.value === null || cell.fileRow === 0 ? null : conversionOf(cell);
    return conversion === null ? null : { corrected: null, conversion };
  };
}

function conversions(recipe: FileRecipe): (cell: PanelCell) => CellConversion | null {
  const { currencies, prices, columns } = recipe.conversion;
  const money = moneyColumns(recipe);
  const headers = [recipe.marketValue, recipe.capex, recipe.bookEquity, ...recipe.others];
  const unitOf = new Map(columns.map(({ column, unit }) => [column, unit]));
  const rates = new Map(currencies?.rates.map((rate) => [`${rate.currency} ${rate.year}`, rate]));
  const indices = new Map(prices?.index.map(({ year, value }) => [year, value]));
  return ({ column, year, currency }) => {
    const { measure, powerOfTen } = money[column];
    if (measure === 'no-money') return null;
    const unit = powerOfTen === 0 ? null : (unitOf.get(headers[column]) ?? null);
    const isForeign = currencies !== null && currency !== null && currency !== recipe.currency;
    const rateKind = measure === 'flow' ? 'average' : 'year-end';
    const rate = isForeign ? rates.get(`${currency} ${year}`) : undefined;
    const ofYear = indices.get(year);
    const base = prices === null ? undefined : indices.get(prices.baseYear);
    const priceIndex =
      prices === null || ofYear === undefined || base === undefined || ofYear === base
        ? null
        : { year: ofYear, baseYear: prices.baseYear, base };
    if (unit === null && !isForeign && priceIndex === null) return null;
    return {
      currency: isForeign ? currency : null,
      rate: (rateKind === 'average' ? rate?.average : rate?.yearEnd) ?? null,
      rateKind: isForeign ? rateKind : null,
      unit,
      priceIndex,
    };
  };
}
