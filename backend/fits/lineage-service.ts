import type { PanelRows } from '../../db/repositories/panels-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { NotFound } from '../errors/app-error';
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
      const rows = await tx.panels.rows(found.panelVersion.id, members);
      return { ...found, figure, account, ...cellsUsed(found, rows, account.cells?.year) };
    });
  }
}

/**
 * The rows of the sample and, of each, the columns of the specification; with a lag also the rows of the year before,
 * which the regressors come from.
 */
function cellsUsed(
  { fit, panelVersion }: FinishedFit,
  rows: PanelRows,
  year: number | undefined,
): Pick<Lineage, 'columns' | 'rows'> {
  const { outcome, regressors } = fit.specification;
  const indices = [outcome, ...regressors].map((name) =>
    panelVersion.columns.findIndex((column) => column.name === name),
  );
  const { lag } = fit.specification;
  // Lines of the file do not tell rows apart: one line can hold several years, and typed rows have none. Rows come by
  // company and year: a lagged row of the sample has its year before on the line above.
  const isComplete = (row: number): boolean => {
    const source = row - lag;
    if (rows.company[source] !== rows.company[row] || rows.year[source] !== rows.year[row] - lag)
      return false;
    const [ofOutcome, ...ofRegressors] = indices;
    const has = (at: number, index: number): boolean => rows.cells[at][index] !== null;
    return has(row, ofOutcome) && ofRegressors.every((index) => has(source, index));
  };
  const sample = rows.year.flatMap((ofRow, row) =>
    isComplete(row) && (year === undefined || ofRow === year) ? [row] : [],
  );
  const kept = [...new Set(sample.flatMap((row) => (lag === 0 ? [row] : [row - 1, row])))];
  return {
    columns: indices.map((index) => panelVersion.columns[index]),
    rows: {
      company: kept.map((row) => rows.company[row]),
      year: kept.map((row) => rows.year[row]),
      fileRow: kept.map((row) => rows.fileRow[row]),
      cells: kept.map((row) => indices.map((index) => rows.cells[row][index])),
    },
  };
}
