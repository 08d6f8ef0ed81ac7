import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { mostMegabytes } from './refusal-words';

/** Where a file is dropped, or chosen: both do the same. */
@Component({
  selector: 'kv-file-drop',
  imports: [MatButtonModule],
  template: `
    <p class="words">
      <strong>Drag a CSV file or a workbook here</strong>, or choose one. What is missing or wrong
      in it is shown before anything is kept.
    </p>
    <button mat-flat-button type="button" [disabled]="isBusy()" (click)="picker.click()">
      {{ action() }}
    </button>
    <input
      #picker
      hidden
      type="file"
      accept=".csv,.tsv,.txt,.xlsx,text/csv,application/vnd.openxmlformats-officedocument.spreadsheetml.sheet"
      aria-label="CSV file or workbook"
      (change)="take(picker.files); picker.value = ''"
    />
    <p class="kv-caption">
      CSV up to {{ most.csv }} MB, Excel workbook (.xlsx) up to {{ most.xlsx }} MB. The file is kept
      as it is and can be downloaded again.
    </p>
  `,
  styles: `
    :host {
      display: grid;
      justify-items: start;
      gap: 12px;
      padding: 24px;
      border: 1px dashed var(--kv-edge);
      border-radius: var(--kv-corner);
      background: var(--kv-raised);
    }
    :host(.over) {
      border: 1px solid var(--kv-spruce);
      background: var(--kv-spruce-wash);
    }
    strong {
      font-weight: 500;
    }
  `,
  host: {
    '[class.over]': 'isOver()',
    '(dragenter)': 'isOver.set(true)',
    '(dragover)': 'hover($event)',
    '(dragleave)': 'isOver.set(false)',
    '(drop)': 'drop($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileDrop {
  readonly action = input('Choose a file');
  readonly isBusy = input(false);
  readonly fileTaken = output<File>();

  protected readonly most = mostMegabytes;
  protected readonly isOver = signal(false);

  protected hover(event: DragEvent): void {
    event.preventDefault();
    this.isOver.set(true);
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.isOver.set(false);
    this.take(event.dataTransfer?.files ?? null);
  }

  protected take(files: FileList | null): void {
    const file = files?.item(0);
    if (file && !this.isBusy()) this.fileTaken.emit(file);
  }
}
