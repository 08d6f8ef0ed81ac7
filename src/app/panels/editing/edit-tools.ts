import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** What changes the panel by a button: back and forth, and whole rows. */
@Component({
  selector: 'kv-edit-tools',
  imports: [MatButton],
  template: `
    <button
      matButton
      type="button"
      disabledInteractive
      [disabled]="undoWords() === ''"
      (click)="undoWanted.emit()"
    >
      Undo{{ undoWords() && ': ' + undoWords() }}
    </button>
    <button
      matButton
      type="button"
      disabledInteractive
      [disabled]="redoWords() === ''"
      (click)="redoWanted.emit()"
    >
      Redo{{ redoWords() && ': ' + redoWords() }}
    </button>
    <button matButton type="button" (click)="rowWanted.emit()">Add row…</button>
    <button
      matButton
      type="button"
      disabledInteractive
      [disabled]="rows() === 0"
      (click)="removalWanted.emit()"
    >
      Remove {{ rowWords() }}
    </button>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditTools {
  /** What Undo would take back, and Redo would do again; empty for nothing. */
  readonly undoWords = input.required<string>();
  readonly redoWords = input.required<string>();
  /** How many are selected. */
  readonly rows = input.required<number>();
  readonly undoWanted = output();
  readonly redoWanted = output();
  readonly rowWanted = output();
  readonly removalWanted = output();

  protected readonly rowWords = computed(() =>
    this.rows() > 1 ? `${this.rows().toLocaleString('en')} rows` : 'row',
  );
}
