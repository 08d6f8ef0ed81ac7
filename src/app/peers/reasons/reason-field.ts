import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  effect,
  input,
  output,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatMenuModule } from '@angular/material/menu';

export const longestReason = 2000;

/** One company's reason, written in place; while it is empty, reasons written elsewhere can be taken over. */
@Component({
  selector: 'kv-reason-field',
  imports: [MatMenuModule, ReactiveFormsModule],
  template: `
    <textarea
      #box
      rows="1"
      autocomplete="off"
      [attr.aria-label]="'Why ' + company() + ' is ' + side()"
      [attr.maxlength]="longest"
      placeholder="Reason missing"
      [formControl]="control"
      (keydown.enter)="$event.preventDefault()"
    ></textarea>
    @if (mayReuse()) {
      <button
        type="button"
        class="kv-link"
        [matMenuTriggerFor]="list"
        [attr.aria-label]="'Use a reason already written for ' + company()"
      >
        Use a reason already written
      </button>
    }
    <mat-menu #list="matMenu" class="kv-reasons">
      <ng-template matMenuContent>
        @for (reason of reasons(); track reason) {
          <button mat-menu-item class="reason" type="button" (click)="take(reason)">
            <span class="words">{{ reason }}</span>
          </button>
        }
      </ng-template>
    </mat-menu>
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 180px;
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
    .reason {
      min-block-size: 48px;
      border-block-end: var(--kv-rule);
    }
    .reason:last-child {
      border-block-end: 0;
    }
    .words {
      display: -webkit-box;
      overflow: hidden;
      -webkit-box-orient: vertical;
      -webkit-line-clamp: 2;
      line-clamp: 2;
      font-size: 13px;
      font-weight: 400;
      line-height: 16px;
    }
    textarea::placeholder {
      color: var(--kv-soft-ink);
      opacity: 1;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReasonField {
  readonly value = input.required<string>();
  readonly company = input.required<string>();
  readonly side = input.required<'in' | 'out'>();
  /** Reasons that are written already. */
  readonly reasons = input<readonly string[]>([]);
  readonly written = output<string>();

  private readonly box = viewChild.required<ElementRef<HTMLTextAreaElement>>('box');

  protected readonly longest = longestReason;
  protected readonly control = new FormControl('', { nonNullable: true });
  protected readonly mayReuse = computed(
    () => this.value().trim() === '' && this.reasons().length > 0,
  );

  constructor() {
    effect(() => {
      const value = this.value();
      if (value !== this.control.value) this.control.setValue(value, { emitEvent: false });
    });
    this.control.valueChanges.pipe(takeUntilDestroyed()).subscribe((value) => {
      this.written.emit(value);
    });
  }

  focus(): void {
    this.box().nativeElement.focus();
  }

  protected take(reason: string): void {
    this.control.setValue(reason);
    this.focus();
  }
}
