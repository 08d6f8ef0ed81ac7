import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { type PanelVersionReply, insideInformationCaution, mostTableCells } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { type TableFormat, TablesApi } from '../../api/tables-api';
import { fileNameOf, saveFile } from '../../charts/chart-frame/picture-files';
import { NumberFormat } from '../../ui/number-format';
import { counted } from '../../ui/phrases';
import type { ShownProblem } from '../../ui/problem';
import { type SelectedBlock, fileCells, selectedTable } from './selected-table';

/** The selected cells as a file: beside copying, with company and year in each row and the unit in the headers. */
@Component({
  selector: 'kv-take-out',
  imports: [MatButton, MatMenuModule],
  template: `
    <button
      matButton
      type="button"
      disabledInteractive
      [disabled]="isEmpty()"
      [matMenuTriggerFor]="isEmpty() ? null : formats"
    >
      Take out the selection
    </button>
    <mat-menu #formats="matMenu">
      <button mat-menu-item type="button" (click)="takeOut('csv')">As CSV</button>
      <button mat-menu-item type="button" (click)="takeOut('xlsx')">As XLSX</button>
    </mat-menu>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TakeOut {
  readonly #tables = inject(TablesApi);
  readonly #numbers = inject(NumberFormat);

  readonly panel = input.required<PanelVersionReply>();
  /** What is changed in it and not saved, in words; empty for nothing. */
  readonly changes = input('');
  /** Whether no cell is selected. */
  readonly isEmpty = input.required<boolean>();
  /** Asked when a file is wanted: the cells, as they stand then. */
  readonly block = input.required<() => SelectedBlock | null>();
  readonly said = output<string>();
  readonly refused = output<ShownProblem>();

  protected async takeOut(format: TableFormat): Promise<void> {
    const block = this.block()();
    if (block === null) return;
    const cells = fileCells(block);
    if (cells > mostTableCells) {
      this.refused.emit({
        title: `A selection of at most ${mostTableCells.toLocaleString('en')} cells can be taken out`,
        detail: `This one has ${cells.toLocaleString('en')}, company and year among them.`,
        whatToDo: 'Select fewer rows, or download the version below.',
      });
      return;
    }
    const table = selectedTable(block, this.#numbers);
    const { panelName, number } = this.panel().version;
    const name = `Selection of ${panelName}, version ${number}`;
    const notes = [
      { label: 'Panel', text: `${panelName}, version ${number}` },
      ...(this.changes() === '' ? [] : [{ label: 'Not saved', text: this.changes() }]),
      { label: 'Amounts in', text: this.#numbers.unitLabel() },
      { label: 'Caution', text: insideInformationCaution },
    ];
    try {
      const file = await firstValueFrom(this.#tables.fileOf({ name, notes, ...table }, format));
      saveFile(file, fileNameOf(name, format));
      this.said.emit(`${counted(table.rows.length, 'row')} taken out as ${format.toUpperCase()}`);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.refused.emit(error.shown);
    }
  }
}
