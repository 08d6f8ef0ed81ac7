import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { FitResult } from '@contract';
import { type FigureKind, NumberFormat } from '../ui/number-format';
import { Figure } from '../ui/figure';
import { levelKind, levelUnit } from '../ui/model-form';
import { testText, withinName } from './fit-words';

interface Measure {
  readonly label: string;
  readonly value: number | null;
  readonly kind: FigureKind;
  readonly figure: string;
  readonly detail: string;
}

/** How well the model describes the panel. */
@Component({
  selector: 'kv-goodness-list',
  imports: [Figure],
  template: `
    <dl>
      @for (measure of measures(); track measure.figure) {
        <div>
          <dt>{{ measure.label }}</dt>
          <dd>
            <kv-figure
              [value]="measure.value"
              [kind]="measure.kind"
              [figure]="measure.value === null ? undefined : measure.figure"
              (opened)="opened.emit($event)"
            />
            @if (measure.detail) {
              <span class="kv-caption">{{ measure.detail }}</span>
            }
          </dd>
        </div>
      }
    </dl>
  `,
  styles: `
    dl {
      display: grid;
    }
    dl > div {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto;
      align-items: baseline;
      gap: 0 16px;
      padding-block: 4px;
      font-size: 13px;
    }
    dd {
      display: grid;
      justify-items: end;
      margin: 0;
      text-align: end;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GoodnessList {
  readonly #numbers = inject(NumberFormat);

  readonly result = input.required<FitResult>();
  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();

  protected readonly measures = computed((): readonly Measure[] => {
    const { goodness, specification } = this.result();
    const isLog = specification.form === 'log';
    const { f, fSlopes } = goodness;
    const plain = { kind: 'plain', detail: '' } as const;
    const test = (each: typeof f): string => testText(each, this.#numbers);
    return [
      {
        ...plain,
        label: 'R²',
        value: goodness.rSquared,
        figure: 'r-squared',
        detail: isLog ? 'of the log of market value' : '',
      },
      {
        ...plain,
        label: 'R² adjusted',
        value: goodness.adjustedRSquared,
        figure: 'adjusted-r-squared',
      },
      {
        kind: 'plain',
        label: withinName(specification.effects),
        value: goodness.withinRSquared,
        figure: 'within-r-squared',
        detail: goodness.withinRSquaredReason ?? '',
      },
      {
        label: `Residual standard error, ${levelUnit(specification.form, this.#numbers)}`,
        value: goodness.residualStandardError,
        kind: levelKind(specification.form),
        figure: 'residual-standard-error',
        detail: '',
      },
      { ...plain, label: 'F, whole model', value: f.value, figure: 'f', detail: test(f) },
      {
        ...plain,
        label: 'F, slopes',
        value: fSlopes.value,
        figure: 'f-slopes',
        detail: test(fSlopes),
      },
    ];
  });
}
