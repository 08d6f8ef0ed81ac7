import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Verdict } from '@contract';
import { Mark, type MarkKind } from '../../ui/mark';

const gradeMarks: Readonly<Record<Verdict['grade'], MarkKind>> = {
  carries: 'fine',
  'carries-with-care': 'caution',
  'does-not-carry': 'error',
};

/** Whether the fit can carry a board statement, and what speaks against it. */
@Component({
  selector: 'kv-verdict-summary',
  imports: [Mark],
  template: `
    <p class="sentence">
      <kv-mark [kind]="mark()" />
      <span>{{ verdict().sentence }}</span>
    </p>
    @if (verdict().against.length > 0) {
      <ul aria-label="What speaks against it">
        @for (objection of verdict().against; track $index) {
          <li>
            <kv-mark [kind]="objection.weight === 'serious' ? 'error' : 'caution'" />
            <span>
              <strong>{{ objection.weight === 'serious' ? 'Serious' : 'Notable' }}:</strong>
              {{ objection.detail }}
            </span>
          </li>
        }
      </ul>
    } @else {
      <p class="kv-caption">Nothing was found that speaks against it.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
      max-inline-size: 720px;
    }
    ul {
      display: grid;
      gap: 8px;
      padding: 0;
      list-style: none;
      font-size: 13px;
    }
    li,
    .sentence {
      display: flex;
      gap: 10px;
      line-height: 20px;
    }
    .sentence {
      font-size: 15px;
      font-weight: 500;
    }
    kv-mark {
      margin-block-start: 2px;
    }
    span {
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    strong {
      font-weight: 500;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictSummary {
  readonly verdict = input.required<Verdict>();

  protected readonly mark = computed(() => gradeMarks[this.verdict().grade]);
}
