import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { type ImportReply, type TableLayout, type TableReading, TextEncoding } from '@contract';
import { counted } from '../../ui/phrases';
import { encodingWords, isSameReading, layoutWords, readingWords } from './reading-words';

/** Columns of a line that the choice of the header shows. */
const shownColumns = 12;

/** How the file becomes a table: which sheet, which line names the columns, which way the years run. */
@Component({
  selector: 'kv-how-read',
  templateUrl: './how-read.html',
  styleUrls: ['./entries.css', './how-read.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HowRead {
  readonly draft = input.required<ImportReply>();
  readonly isBusy = input(false);
  /** What the file is to be read as; the columns are recognised anew. */
  readonly readingChanged = output<TableReading>();

  protected readonly layoutWords = layoutWords;
  protected readonly encodingWords = encodingWords;
  protected readonly encodings = TextEncoding.options;
  protected readonly words = computed(() => readingWords(this.draft()));
  protected readonly reading = computed(() => this.draft().reading);
  protected readonly sheets = computed(() =>
    this.draft().sheets.map(({ name, rows, columns }) => ({
      name,
      words: `${name} (${rows.toLocaleString('en')} × ${columns.toLocaleString('en')})`,
    })),
  );
  protected readonly layouts = computed<readonly TableLayout['kind'][]>(() =>
    this.draft().sheets.length > 1
      ? ['long', 'years-in-columns', 'sheet-a-variable']
      : ['long', 'years-in-columns'],
  );
  protected readonly item = computed(() => {
    const { layout } = this.reading();
    return layout.kind === 'years-in-columns' ? (layout.item ?? '') : '';
  });
  protected readonly chosenSheets = computed(() => {
    const { layout } = this.reading();
    return layout.kind === 'sheet-a-variable' ? layout.sheets : [];
  });
  protected readonly topLines = computed(() =>
    this.draft().topLines.map(({ row, cells }) => ({
      row,
      cells: cells.slice(0, shownColumns),
      more: Math.max(0, cells.length - shownColumns),
    })),
  );
  /** The columns of the file itself, which a wide sheet's long table does not show. */
  protected readonly fileHeaders = computed(() => {
    const { headerRow } = this.reading();
    const line = this.draft().topLines.find(({ row }) => row === headerRow);
    return [...new Set(line?.cells.filter((cell) => cell.trim() !== '') ?? [])];
  });
  protected readonly lineCount = computed(() => counted(this.draft().rowCount, 'row'));

  protected choose(change: Partial<TableReading>): void {
    const reading = { ...this.reading(), ...change };
    if (!isSameReading(reading, this.reading())) this.readingChanged.emit(reading);
  }

  /** Another sheet begins with its first line until another is chosen. */
  protected chooseSheet(sheet: string): void {
    this.choose({ sheet, headerRow: 1 });
  }

  protected chooseLayout(kind: TableLayout['kind']): void {
    if (kind === 'long') this.choose({ layout: { kind } });
    else if (kind === 'years-in-columns') this.choose({ layout: { kind, item: null } });
    else {
      const sheets = this.draft().sheets.map(({ name }) => name);
      this.choose({ layout: { kind, sheets: sheets.slice(0, 20) } });
    }
  }

  protected chooseItem(item: string): void {
    this.choose({ layout: { kind: 'years-in-columns', item: item === '' ? null : item } });
  }

  protected takeSheet(name: string, isTaken: boolean): void {
    const sheets = this.draft()
      .sheets.map((sheet) => sheet.name)
      .filter((one) => (one === name ? isTaken : this.chosenSheets().includes(one)));
    if (sheets.length > 0) this.choose({ layout: { kind: 'sheet-a-variable', sheets } });
  }
}
