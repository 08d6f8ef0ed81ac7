import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';

/** Where a CSV file is dropped, or chosen: both do the same. */
@Component({
  selector: 'kv-file-drop',
  imports: [MatButtonModule],
  template: `
    <p class="words">
      <strong>Drag a CSV file here</strong>, or choose one. Market value, capex and book equity
      stand in columns; what is missing or wrong is shown before anything is kept.
    </p>
    <button mat-flat-button type="button" [disabled]="isBusy()" (click)="picker.click()">
      {{ action() }}
    </button>
    <input
      #picker
      hidden
      type="file"
      accept=".csv,.tsv,.txt,text/csv"
      aria-label="CSV file"
      (change)="take(picker.files); picker.value = ''"
    />
    <p class="kv-caption">
      Comma, semicolon or tab; up to 40 MB. The file is kept as it is and can be downloaded again.
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
