import { randomUUID } from 'node:crypto';
import { UniqueViolation } from '../../db/errors';
import type { FlagDismissalRow } from '../../db/repositories/flag-dismissals-repository';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, Invalid, NotFound } from '../errors/app-error';
import type { FlagCode } from '../panel-data';
import type { Actor } from './import-draft';

export interface NewDismissal {
  readonly company: string;
  readonly year: number;
  /** Position among the columns; null where the whole row is meant. */
  readonly column: number | null;
  readonly code: FlagCode;
  /** The cell's value when it was looked at. */
  readonly value: number | null;
  readonly reason: string;
}

export interface PlacedDismissal extends FlagDismissalRow {
  /** Where its column stands in the newest version; null where the whole row is meant. */
  readonly column: number | null;
}

/** Flags that somebody looked at and found to be right as they are. */
export class FlagDismissalService {
  constructor(private readonly repositories: Repositories) {}

  /**
   * The newest first; none of a column that the newest version does not have. A column of the model stays the same
   * under another header. @throws {NotFound}
   */
  async list(workspaceId: string, panelId: string): Promise<readonly PlacedDismissal[]> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const places = columnPlaces(await tx.panels.versionsOfPanel(panelId));
      const found = await tx.flagDismissals.ofPanel(panelId);
      return found.flatMap((dismissal) => {
        const { columnName } = dismissal;
        const column = columnName === null ? null : places.get(columnName);
        return column === undefined ? [] : [{ ...dismissal, column }];
      });
    });
  }

  /**
   * @throws {NotFound}; {Invalid} for a place that the newest version does not have; {Conflict} when the cell holds
   *   another value by now, or the flag is dismissed already.
   */
  async dismiss(
    actor: Actor,
    panelId: string,
    { column, ...dismissal }: NewDismissal,
  ): Promise<PlacedDismissal> {
    const id = randomUUID();
    return this.repositories
      .inWorkspace(actor.workspaceId, async (tx) => {
        const newest = await findNewest(tx, panelId);
        await assertCurrent(tx, newest, { column, ...dismissal });
        const createdBy = actor.personId;
        const columnName = column === null ? null : newest.columns[column].name;
        await tx.flagDismissals.insert({ id, panelId, createdBy, columnName, ...dismissal });
        const { reason: _, ...what } = dismissal;
        await record(tx, actor.personId, 'flag-dismissed', id, { panelId, columnName, ...what });
        return { ...(await findDismissal(tx, panelId, id)), column };
      })
      .catch((error: unknown) => {
        if (error instanceof UniqueViolation)
          throw new Conflict('This flag is dismissed already, with this value.');
        throw error;
      });
  }

  /** @throws {NotFound} */
  async takeBack(actor: Actor, panelId: string, id: string): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const { company, year, columnName, code } = await findDismissal(tx, panelId, id);
      await tx.flagDismissals.remove(panelId, id);
      const what = { panelId, company, year, columnName, code };
      await record(tx, actor.personId, 'flag-dismissal-taken-back', id, what);
    });
  }
}

async function findNewest(tx: WorkspaceRepositories, panelId: string): Promise<PanelVersionRow> {
  const newest = await tx.panels.findLatest(panelId);
  if (newest === undefined) throw noPanel();
  return newest;
}

function noPanel(): NotFound {
  return new NotFound('There is no such panel.');
}

/**
 * Where columns of any version stand in the newest one: by header, and those of the model by what they are to it.
 *
 * @param versions  the first one first. @throws {NotFound} for none.
 */
function columnPlaces(versions: readonly PanelVersionRow[]): ReadonlyMap<string, number> {
  const newest = versions.at(-1);
  if (newest === undefined) throw noPanel();
  const places = new Map<string, number>();
  for (const { columns } of versions)
    for (const { name, role } of columns) {
      const place = newest.columns.findIndex((column) => column.role === role);
      if (role !== 'other' && place !== -1) places.set(name, place);
    }
  newest.columns.forEach(({ name }, column) => places.set(name, column));
  return places;
}

async function findDismissal(
  tx: WorkspaceRepositories,
  panelId: string,
  id: string,
): Promise<FlagDismissalRow> {
  const found = await tx.flagDismissals.find(panelId, id);
  if (found === undefined) throw new NotFound('There is no such dismissal.');
  return found;
}

async function assertCurrent(
  tx: WorkspaceRepositories,
  { id, number, columns }: PanelVersionRow,
  { company, year, column, code, value }: NewDismissal,
): Promise<void> {
  const [row] = await tx.panelCopies.rowsAt(id, [{ company, year }]);
  if (column === null && value !== null)
    throw new Invalid(`Expected no value of a whole row; found ${value}.`);
  if (column === null && code === 'duplicate') {
    if (row === undefined) throw new Invalid(`The panel has no row ${company} ${year}.`);
    return;
  }
  if ((code === 'year-gap') !== (column === null))
    throw new Invalid(
      'A year without a row and a company that stands in twice are of a whole row; every other flag is of one cell.',
    );
  if (column === null) {
    if (row !== undefined)
      throw new Conflict(`The panel has a row ${company} ${year} by now: it is no gap.`);
    const years = await tx.panels.yearsOf(id, company);
    if (years === undefined)
      throw new Invalid(`Expected a company of the panel; found “${company}”.`);
    if (year < years.first || year > years.last)
      throw new Invalid(
        `A gap lies between the years of ${company}, ${years.first} to ${years.last}; found ${year}.`,
      );
    return;
  }
  if (row === undefined) throw new Invalid(`The panel has no row ${company} ${year}.`);
  if (column >= columns.length)
    throw new Invalid(
      `Expected one of ${columns.length} columns, counted from 0; found ${column}.`,
    );
  const held = row.cells[column];
  if (held !== value)
    throw new Conflict(
      `“${columns[column].name}” of ${company} ${year} is ${held ?? 'missing'} in version ${number}; it was ${value ?? 'missing'} when you looked at it.`,
    );
}
