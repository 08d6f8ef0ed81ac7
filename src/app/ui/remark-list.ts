import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { Mark } from './mark';

/** One line of evidence or a warning. */
export interface Remark {
  readonly kind: 'caution' | 'error' | 'fine';
  readonly text: string;
  /** Words of a link under it; selecting it emits the remark. */
  readonly actionLabel?: string;
}

const spoken: Readonly<Record<Remark['kind'], string>> = {
  caution: 'Caution:',
  error: 'Error:',
  fine: 'In order:',
};

/** Warnings and evidence: a mark, and beside it words in ink. */
@Component({
  selector: 'kv-remark-list',
  imports: [Mark],
  template: `
    <ul>
      @for (remark of remarks(); track remark.text) {
        <li>
          <kv-mark [kind]="remark.kind" />
          <span>
            <span class="kv-visually-hidden">{{ spoken[remark.kind] }}</span>
            {{ remark.text }}
            @if (remark.actionLabel; as label) {
              <button type="button" class="kv-link kv-no-print" (click)="selected.emit(remark)">
                {{ label }}
              </button>
            }
          </span>
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      display: grid;
      gap: 8px;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: 10px;
      font-size: 13px;
      line-height: 20px;
    }
    kv-mark {
      margin-block-start: 2px;
    }
    span {
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    .kv-link {
      padding-block: 2px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RemarkList {
  readonly remarks = input.required<readonly Remark[]>();
  readonly selected = output<Remark>();

  protected readonly spoken = spoken;
}
