import type { PanelRows } from '../../db/repositories/panels-repository';
import type { Repositories } from '../../db/repositories/repositories';
import type { FileRecipe } from '../compute/file-recipe';
import { NotFound } from '../errors/app-error';
import { type CellOrigin, cellOrigins } from './cell-origins';
import { accountFor } from './figure-accounts';
import type { FigureAccount } from './figure-text';
import { memberNames } from './fit-subject';
import { findFinishedFit, type FinishedFit } from './fit-service';

/** A figure with its fit and the cells that went into it. */
export interface Lineage extends FinishedFit {
  readonly figure: string;
  readonly account: FigureAccount;
  /** Columns of the panel that the fit uses, in the order of `cells`. */
  readonly columns: FinishedFit['panelVersion']['columns'];
  readonly rows: PanelRows;
  /** origins[row][column]; null where a cell is as the file has it. */
  readonly origins: readonly (readonly (CellOrigin | null)[])[];
}

/** How a figure came about, down to the cells of the imported file. */
export class LineageService {
  constructor(private readonly repositories: Repositories) {}

  /** @throws {NotFound} when there is no such fit or the fit has no such figure. */
  async trace(workspaceId: string, fitId: string, figure: string): Promise<Lineage> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const found = await findFinishedFit(tx, fitId);
      const account = accountFor(found.result, figure);
      if (account === undefined) throw new NotFound('The fit has no such figure.');
      const company = account.cells?.company;
      const members = company === undefined ? memberNames(found) : [company];
      const { id } = found.panelVersion;
      const rows = await tx.panels.rows(id, members);
      const currencies = await tx.panels.rowCurrencies(id, members);
      const recipe = (await tx.panels.recipe(id)) as FileRecipe | null;
      const originOf = cellOrigins(recipe, await tx.panelCorrections.standing(id, members));
      const used = sampleRows(found, rows, account.cells?.year);
      const columns = columnsUsed(found);
      return {
        ...{ ...found, figure, account },
        columns: columns.map((column) => found.panelVersion.columns[column]),
        rows: {
          company: used.map((row) => rows.company[row]),
          year: used.map((row) => rows.year[row]),
          fileRow: used.map((row) => rows.fileRow[row]),
          cells: used.map((row) => columns.map((column) => rows.cells[row][column])),
        },
        origins: used.map((row) => {
          const [company, year, fileRow] = [rows.company[row], rows.year[row], rows.fileRow[row]];
          const place = { company, year, fileRow, currency: currencies[row] };
          return columns.map((column) =>
            originOf({ ...place, column, value: rows.cells[row][column] }),
          );
        }),
      };
    });
  }
}

/** Positions of the fit's columns among the panel's: outcome, then regressors. */
function columnsUsed({ fit, panelVersion }: FinishedFit): readonly number[] {
  const { outcome, regressors } = fit.specification;
  return [outcome, ...regressors].map((name) =>
    panelVersion.columns.findIndex((column) => column.name === name),
  );
}

/** The rows of the sample; with a lag also those of the year before, which the regressors come from. */
function sampleRows(
  found: FinishedFit,
  rows: PanelRows,
  year: number | undefined,
): readonly number[] {
  const { lag } = found.fit.specification;
  const [ofOutcome, ...ofRegressors] = columnsUsed(found);
  const has = (row: number, column: number): boolean => rows.cells[row][column] !== null;
  // Lines of the file do not tell rows apart: one line can hold several years, and typed rows have none. Rows come by
  // company and year: a lagged row of the sample has its year before on the line above.
  const isComplete = (row: number): boolean => {
    const source = row - lag;
    if (rows.company[source] !== rows.company[row] || rows.year[source] !== rows.year[row] - lag)
      return false;
    return has(row, ofOutcome) && ofRegressors.every((column) => has(source, column));
  };
  const sample = rows.year.flatMap((ofRow, row) =>
    isComplete(row) && (year === undefined || ofRow === year) ? [row] : [],
  );
  return [...new Set(sample.flatMap((row) => (lag === 0 ? [row] : [row - 1, row])))];
}
