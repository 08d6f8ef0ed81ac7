import { Injectable, inject } from '@angular/core';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import type { PanelVersionReply } from '@contract';
import { firstValueFrom } from 'rxjs';
import { NumberFormat } from '../../ui/number-format';
import { AddRowDialog, type AddRowQuestion } from './add-row-dialog';
import { CarryDialog, type CarryQuestion } from './carry-dialog';
import { CellHistoryDialog, type CellHistoryQuestion } from './cell-history-dialog';
import { editsWords } from './edit-words';
import { EditsStore } from './edits-store';
import type { CellPlace, RowPlace } from './panel-edits';
import { SaveDialog, type SaveQuestion, type SaveResult } from './save-dialog';
import { draftCorrections, saveLines } from './save-lines';
import { figureWords, shiftOf } from './shown-figure';

/** What is asked and shown beside the grid. */
@Injectable()
export class PanelDialogs {
  readonly #dialog = inject(MatDialog);
  readonly #numbers = inject(NumberFormat);
  readonly #store = inject(EditsStore);

  async askForRow(data: AddRowQuestion): Promise<RowPlace | undefined> {
    const config = Object.assign(new MatDialogConfig<AddRowQuestion>(), { data, maxWidth: 480 });
    const opened = this.#dialog.open<AddRowDialog, AddRowQuestion, RowPlace>(AddRowDialog, config);
    return firstValueFrom(opened.afterClosed());
  }

  /** @returns undefined where the person goes on changing. */
  async save({ version, columns }: PanelVersionReply): Promise<SaveResult | undefined> {
    const edits = this.#store.edits();
    const places = new Map([...edits.cells.keys()].map((key, place) => [key, place]));
    const data: SaveQuestion = {
      number: version.number + 1,
      lines: saveLines(edits, this.#store.saved(), columns),
      rowLines: [
        ...[...edits.added.values()].map(({ company, year }) => `Row added: ${company} ${year}`),
        ...[...edits.removed.values()].map(
          ({ company, year }) => `Row removed: ${company} ${year}`,
        ),
      ],
      unit: this.#numbers.unitLabel(),
      words: (value, column) =>
        figureWords(
          value,
          shiftOf(columns[column], this.#numbers.factor()),
          this.#numbers.locale(),
        ),
      changes: editsWords(edits),
      draft: this.#store.draft(),
      keep: (written) => {
        this.#store.write(written);
      },
      save: (written) => this.#store.save(draftCorrections(edits, written)),
      sentAt: (key) => places.get(key) ?? -1,
    };
    const config = Object.assign(new MatDialogConfig<SaveQuestion>(), {
      data,
      width: '960px',
      maxWidth: '96vw',
    });
    const opened = this.#dialog.open<SaveDialog, SaveQuestion, SaveResult>(SaveDialog, config);
    return firstValueFrom(opened.afterClosed());
  }

  /** @returns whether the edits are with the newer version now. */
  async carry({ version }: PanelVersionReply, newerId: string): Promise<boolean> {
    const data: CarryQuestion = {
      ...{ version, newerId },
      from: this.#store.edited(),
      editedAt: (newer) => this.#store.editedAt(newer),
      carry: (onto, carrying, mine) => {
        this.#store.carry(newerId, onto, carrying, mine);
      },
    };
    const config = Object.assign(new MatDialogConfig<CarryQuestion>(), {
      data,
      width: '800px',
      maxWidth: '96vw',
    });
    const opened = this.#dialog.open<CarryDialog, CarryQuestion, boolean>(CarryDialog, config);
    return (await firstValueFrom(opened.afterClosed())) ?? false;
  }

  showHistory({ version, columns }: PanelVersionReply, place: CellPlace): void {
    const data: CellHistoryQuestion = {
      panelVersionId: version.id,
      place,
      column: columns[place.column],
    };
    const config = Object.assign(new MatDialogConfig<CellHistoryQuestion>(), {
      data,
      width: '800px',
      maxWidth: '96vw',
    });
    this.#dialog.open(CellHistoryDialog, config);
  }
}
