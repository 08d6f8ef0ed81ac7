import { ChangeDetectionStrategy, Component, input } from '@angular/core';

export type MarkKind = 'caution' | 'error' | 'fine' | 'own' | 'peer';

/** The small sign beside words. Decorative: the words say it too, so it is hidden from screen readers. */
@Component({
  selector: 'kv-mark',
  template: `
    <svg viewBox="0 0 16 16" width="16" height="16" aria-hidden="true" focusable="false">
      @switch (kind()) {
        @case ('caution') {
          <path class="line" d="M8 2.2 14.6 13.6H1.4Z M8 6.4v3.4 M8 11.3v0.9" />
        }
        @case ('error') {
          <path
            class="line"
            d="M5.2 1.8h5.6l3.4 3.4v5.6l-3.4 3.4H5.2l-3.4-3.4V5.2Z M8 4.8v4 M8 10.6v0.9"
          />
        }
        @case ('fine') {
          <path class="line" d="M2.6 8.6 6.2 12.2 13.4 4.4" />
        }
        @case ('own') {
          <path class="area" d="M8 2.5 13.5 8 8 13.5 2.5 8Z" />
        }
        @case ('peer') {
          <circle class="line" cx="8" cy="8" r="4.5" />
        }
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
      inline-size: 16px;
      block-size: 16px;
      vertical-align: -3px;
    }
    .line {
      fill: none;
      stroke: currentColor;
      stroke-width: 1.5;
      stroke-linejoin: round;
      stroke-linecap: round;
    }
    .area {
      fill: currentColor;
    }
    :host(.caution) {
      color: var(--kv-ochre);
    }
    :host(.error) {
      color: var(--kv-brick);
    }
    :host(.fine) {
      color: var(--kv-spruce);
    }
    :host(.own) {
      color: var(--kv-copper);
    }
    :host(.peer) {
      color: var(--kv-slate);
    }
  `,
  host: { '[class]': 'kind()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Mark {
  readonly kind = input.required<MarkKind>();
}
