import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { fixedText } from '@figures';
import { NumberFormat } from '../../ui/number-format';
import { addingUp } from '../nearness/adding-up';
import { type PeerMeasure, measureText } from '../nearness/peer-measures';
import type { Nearness } from '../nearness/peer-nearness-of';
import type { PanelCompany } from '../peer-draft';

/** What a company's distance is made of: each measure of both companies, and its part of the squared distance. */
@Component({
  selector: 'kv-distance-parts',
  template: `
    <table>
      <thead>
        <tr>
          <th scope="col">Measure</th>
          <th scope="col" class="kv-number">{{ company().name }}</th>
          @if (own(); as ours) {
            <th scope="col" class="kv-number own">{{ ours.name }}</th>
          }
          <th scope="col" class="kv-number part" [attr.colspan]="2">Part of distance²</th>
        </tr>
      </thead>
      <tbody>
        @for (line of lines(); track line.label) {
          <tr>
            <th scope="row">{{ line.label }}</th>
            <td class="kv-number">{{ line.value }}</td>
            @if (own()) {
              <td class="kv-number own">{{ line.ownValue }}</td>
            }
            <td class="bar" aria-hidden="true">
              @if (line.bar; as bar) {
                <span
                  [class.less]="bar.isLess"
                  [style.inset-inline-start.%]="bar.from"
                  [style.inline-size.%]="bar.width"
                ></span>
              }
            </td>
            <td class="kv-number" [title]="line.full">{{ line.part }}</td>
          </tr>
        }
        @if (total(); as sum) {
          <tr class="total">
            <th scope="row" [attr.colspan]="own() ? 4 : 3">
              Distance {{ sum.distance }}, its square
            </th>
            <td class="kv-number">{{ sum.squared }}</td>
          </tr>
        }
      </tbody>
    </table>
  `,
  styleUrl: './distance-parts.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DistanceParts {
  readonly #numbers = inject(NumberFormat);

  readonly company = input.required<PanelCompany>();
  readonly own = input<PanelCompany>();
  /** The measures that count. */
  readonly measures = input.required<readonly PeerMeasure[]>();
  /** Measures whose values are shown although they do not count. */
  readonly others = input<readonly PeerMeasure[]>([]);
  /** Null where the company has no distance. */
  readonly nearness = input.required<Nearness | null>();

  readonly #parts = computed(() => this.nearness()?.parts ?? []);
  readonly #rounded = computed(() => addingUp(this.#parts(), 2));

  protected readonly lines = computed(() => [
    ...this.measures().map((measure, place) => ({
      ...this.#values(measure),
      ...this.#partAt(place),
    })),
    ...this.others().map((measure) => ({
      ...this.#values(measure),
      part: 'not counted',
      full: '',
      bar: null,
    })),
  ]);
  protected readonly total = computed(() => {
    const nearness = this.nearness();
    if (nearness === null) return null;
    const squared = this.#rounded().reduce((sum, part) => sum + part, 0);
    return { distance: this.#text(nearness.distance), squared: this.#text(squared) };
  });

  #values(measure: PeerMeasure) {
    const own = this.own();
    return {
      label: measure.label,
      value: measureText(measure, measure.valueOf(this.company()), this.#numbers),
      ownValue: own === undefined ? '' : measureText(measure, measure.valueOf(own), this.#numbers),
    };
  }

  #partAt(place: number) {
    const part = this.#parts().at(place);
    if (part === undefined) return { part: this.#numbers.figure(null), full: '', bar: null };
    const parts = this.#parts();
    const [low, high] = [Math.min(0, ...parts), Math.max(0, ...parts)];
    const span = high - low || 1;
    return {
      part: this.#text(this.#rounded()[place]),
      full: this.#numbers.full(part, 'plain'),
      bar: {
        isLess: part < 0,
        from: (100 * (Math.min(0, part) - low)) / span,
        width: (100 * Math.abs(part)) / span,
      },
    };
  }

  #text(value: number): string {
    return fixedText(value, 2, this.#numbers.locale());
  }
}
