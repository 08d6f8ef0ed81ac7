import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  input,
  output,
  viewChild,
} from '@angular/core';

/** Looks for a company, year or value among the rows that are shown; Enter goes on, Shift and Enter back. */
@Component({
  selector: 'kv-find-field',
  template: `
    <label>
      Find
      <input
        #box
        type="search"
        autocomplete="off"
        placeholder="Company, year or value"
        [value]="text()"
        (input)="textChanged.emit(box.value)"
        (keydown.enter)="moved.emit('next'); $event.preventDefault()"
        (keydown.shift.enter)="moved.emit('previous'); $event.preventDefault()"
        (keydown.escape)="left.emit()"
      />
    </label>
    @if (text().trim() !== '') {
      <span role="status">{{ words() }}</span>
      <button
        type="button"
        class="kv-link"
        [disabled]="count() === 0"
        (click)="moved.emit('previous')"
      >
        Previous
      </button>
      <button type="button" class="kv-link" [disabled]="count() === 0" (click)="moved.emit('next')">
        Next
      </button>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 4px 12px;
    }
    label {
      display: flex;
      align-items: center;
      gap: 8px;
    }
    input {
      inline-size: 200px;
      min-block-size: 32px;
      padding-inline: 8px;
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      background: var(--kv-paper);
      color: inherit;
      font: inherit;
    }
    input::placeholder {
      color: var(--kv-soft-ink);
      opacity: 1;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindField {
  readonly text = input.required<string>();
  readonly count = input.required<number>();
  /** Which of the finds has the focus, counted from 1; 0 for none. */
  readonly at = input.required<number>();
  readonly textChanged = output<string>();
  readonly moved = output<'next' | 'previous'>();
  /** Back to the cells. */
  readonly left = output();

  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');

  focus(): void {
    this.box().nativeElement.select();
  }

  protected words(): string {
    if (this.count() === 0) return 'Not found';
    const count = this.count().toLocaleString('en');
    return this.at() === 0 ? `${count} found` : `${this.at().toLocaleString('en')} of ${count}`;
  }
}
