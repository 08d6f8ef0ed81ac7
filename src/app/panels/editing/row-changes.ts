import { Injectable, inject } from '@angular/core';
import { Confirm } from '../../ui/confirm';
import { counted } from '../../ui/phrases';
import type { PanelRow } from '../panel-rows';
import { EditsStore } from './edits-store';
import { PanelDialogs } from './panel-dialogs';
import type { RowPlace } from './panel-edits';

/** Adds whole rows and takes them out, asking first. */
@Injectable()
export class RowChanges {
  readonly #confirm = inject(Confirm);
  readonly #dialogs = inject(PanelDialogs);
  readonly #store = inject(EditsStore);

  /** @param company  the likely one. @returns the row that was added; undefined where none was. */
  async add(company: string): Promise<RowPlace | undefined> {
    const row = await this.#dialogs.askForRow({
      companies: [...new Set(this.#store.rows().map((each) => each.company))],
      company,
      hasRow: (asked) => this.#store.hasRow(asked),
    });
    if (row !== undefined) this.#store.addRow(row);
    return row;
  }

  /** Asks where figures would go with the rows. @returns whether they are out. */
  async remove(rows: readonly PanelRow[]): Promise<boolean> {
    if (rows.length === 0) return false;
    const full = rows.filter(({ values }) => values.some((value) => value !== null)).length;
    const isSure =
      full === 0 ||
      (await this.#confirm.ask({
        title: `Remove ${counted(rows.length, 'row')}?`,
        detail: `${counted(full, 'row')} of the panel ${full === 1 ? 'has' : 'have'} figures. Undo brings them back; saved versions keep them.`,
        action: rows.length === 1 ? 'Remove row' : 'Remove rows',
      }));
    if (isSure) this.#store.removeRows(rows);
    return isSure;
  }
}
