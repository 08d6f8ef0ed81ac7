import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { DestroyRef } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatAutocompleteModule } from '@angular/material/autocomplete';

const mostOffered = 8;
const longestReason = 2000;

/** One company's reason, written in place; reasons written elsewhere are offered for use again. */
@Component({
  selector: 'kv-reason-field',
  imports: [MatAutocompleteModule, ReactiveFormsModule],
  template: `
    <textarea
      #box
      rows="1"
      [attr.aria-label]="label()"
      [attr.maxlength]="longest"
      [placeholder]="placeholder()"
      [formControl]="control"
      [matAutocomplete]="list"
      (keydown.enter)="$event.preventDefault()"
    ></textarea>
    <mat-autocomplete #list="matAutocomplete" [class]="'kv-reasons'">
      @for (reason of matching(); track reason) {
        <mat-option [value]="reason">{{ reason }}</mat-option>
      }
    </mat-autocomplete>
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 220px;
    }
    textarea {
      display: block;
      inline-size: 100%;
      min-block-size: 32px;
      padding: 7px 8px;
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      background: var(--kv-raised);
      color: inherit;
      font: inherit;
      line-height: 16px;
      resize: vertical;
      field-sizing: content;
    }
    textarea::placeholder {
      color: var(--kv-soft-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReasonField {
  readonly #destroyed = inject(DestroyRef);

  readonly value = input.required<string>();
  readonly label = input.required<string>();
  readonly placeholder = input('');
  /** Reasons that are written already. */
  readonly reasons = input<readonly string[]>([]);
  readonly written = output<string>();

  private readonly box = viewChild.required<ElementRef<HTMLTextAreaElement>>('box');

  protected readonly longest = longestReason;
  protected readonly control = new FormControl('', { nonNullable: true });
  readonly #typed = signal('');
  protected readonly matching = computed(() => {
    const typed = this.#typed().trim().toLowerCase();
    return this.reasons()
      .filter((reason) => {
        const lower = reason.toLowerCase();
        return lower !== typed && lower.includes(typed);
      })
      .slice(0, mostOffered);
  });

  constructor() {
    effect(() => {
      const value = this.value();
      if (value !== this.control.value) this.control.setValue(value, { emitEvent: false });
      this.#typed.set(value);
    });
    this.control.valueChanges.pipe(takeUntilDestroyed(this.#destroyed)).subscribe((value) => {
      this.#typed.set(value);
      this.written.emit(value);
    });
  }

  focus(): void {
    this.box().nativeElement.focus();
  }
}
