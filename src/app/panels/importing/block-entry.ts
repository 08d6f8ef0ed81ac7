import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { tableOfText } from './table-text';

/** Where a table is pasted from a spreadsheet, or read from a CSV file. */
@Component({
  selector: 'kv-block-entry',
  template: `
    <div class="fields">
      <label class="field">
        {{ label() }}
        <textarea
          #pasted
          rows="2"
          spellcheck="false"
          [placeholder]="example()"
          (paste)="pasteFrom($event)"
          (change)="take(pasted.value); pasted.value = ''"
        ></textarea>
      </label>
      <button type="button" class="kv-link" (click)="picker.click()">Read from a CSV file</button>
      <input
        #picker
        hidden
        type="file"
        accept=".csv,.tsv,.txt,text/csv"
        [attr.aria-label]="label() + ', from a CSV file'"
        (change)="takeFile(picker.files); picker.value = ''"
      />
    </div>
    <p class="kv-caption" role="status">{{ said() }}</p>
  `,
  styleUrl: './entries.css',
  styles: `
    textarea {
      inline-size: min(360px, 100%);
      resize: vertical;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BlockEntry {
  readonly label = input.required<string>();
  readonly example = input('');
  readonly tableTaken = output<readonly (readonly string[])[]>();

  protected readonly said = signal('');

  protected pasteFrom(event: ClipboardEvent): void {
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (text === '') return;
    event.preventDefault();
    this.take(text);
  }

  protected async takeFile(files: FileList | null): Promise<void> {
    const file = files?.item(0);
    if (file) this.take(await file.text());
  }

  protected take(text: string): void {
    if (text.trim() === '') return;
    const table = tableOfText(text);
    if (table.length > 0) this.tableTaken.emit(table);
    this.said.set(`${table.length} lines read; the table shows them.`);
  }
}
