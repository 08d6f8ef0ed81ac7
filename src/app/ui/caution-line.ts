import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { cautions, shortCaution } from '@contract';

let instances = 0;

/** The line that stands beside every standing, scenario and edition, with the cautions in full behind it. */
@Component({
  selector: 'kv-caution-line',
  template: `
    <p>
      {{ short }}
      <button
        type="button"
        class="kv-link kv-no-print"
        [attr.aria-expanded]="isOpen()"
        [attr.aria-controls]="id"
        (click)="toggle()"
      >
        {{ isOpen() ? 'Fewer words' : 'All cautions' }}
      </button>
    </p>
    <ul [id]="id" [hidden]="!isOpen()">
      @for (caution of all; track caution) {
        <li>{{ caution }}</li>
      }
    </ul>
  `,
  styles: `
    :host {
      display: block;
      font-size: 12px;
      line-height: 16px;
      color: var(--kv-soft-ink);
    }
    ul {
      margin-block-start: 4px;
      padding-inline-start: 16px;
      max-inline-size: 720px;
    }
    li + li {
      margin-block-start: 4px;
    }
    @media print {
      ul[hidden] {
        display: block;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CautionLine {
  protected readonly short = shortCaution;
  protected readonly all = cautions;
  protected readonly id = `kv-cautions-${++instances}`;
  protected readonly isOpen = signal(false);

  protected toggle(): void {
    this.isOpen.update((isOpen) => !isOpen);
  }
}
