import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { PredictionBasis } from '@prediction';
import { Mark } from '../mark';
import { NumberFormat } from '../number-format';
import { familiarFinding, familiarReason } from './plan-words';
import type { PlannedYear, ReadYear } from './read-plan';
import { regressorKind } from './regressor-labels';
import { steppedInside } from './slider-range';

/** For each planned year: whether the peer group has shown anything like it, why, and the way back inside. */
@Component({
  selector: 'kv-familiar-notes',
  imports: [Mark],
  template: `
    <ul aria-live="polite">
      @if (inside(); as finding) {
        <li>
          <kv-mark kind="fine" />
          <p>
            <strong>{{ finding }}.</strong>
          </p>
        </li>
      }
      @for (note of notes(); track note.year) {
        <li>
          <kv-mark kind="caution" />
          <div>
            <p>
              <strong>{{ note.finding }}.</strong>
            </p>
            <details>
              <summary>Why</summary>
              <p>{{ note.reason }}</p>
            </details>
            <p class="inside">
              @if (note.inside; as inside) {
                Nearest plan inside: {{ note.nearest }}.
                <button
                  type="button"
                  class="kv-link kv-no-print"
                  [attr.aria-label]="'Take the nearest plan inside for FY' + inside.year"
                  (click)="insideWanted.emit(inside)"
                >
                  Take the nearest plan inside
                </button>
              } @else {
                It reads FY{{ note.of }} as it was, which no plan changes.
              }
            </p>
          </div>
        </li>
      }
    </ul>
    @if (canTakeAll()) {
      <button type="button" class="kv-link kv-no-print" (click)="allInsideWanted.emit()">
        Take the nearest plan inside for all years
      </button>
    }
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
    }
    li > div {
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    kv-mark {
      margin-block-start: 2px;
    }
    strong {
      font-weight: 500;
    }
    summary {
      inline-size: max-content;
      cursor: pointer;
    }
    .inside {
      color: var(--kv-soft-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FamiliarNotes {
  readonly #numbers = inject(NumberFormat);

  readonly basis = input.required<PredictionBasis>();
  readonly labels = input.required<readonly string[]>();
  readonly years = input.required<readonly ReadYear[]>();
  /** The year with the values that bring it back inside. */
  readonly insideWanted = output<PlannedYear>();
  /** Whether all years can be brought inside at once. */
  readonly offersAll = input(false);
  readonly allInsideWanted = output();

  protected readonly inside = computed(() => {
    const years = this.years().filter(({ familiar }) => familiar.kind === 'inside');
    return years.length === 0
      ? ''
      : familiarFinding(
          years.map(({ year }) => year),
          'inside',
        );
  });
  protected readonly canTakeAll = computed(
    () => this.offersAll() && this.notes().filter(({ inside }) => inside !== null).length > 1,
  );
  protected readonly notes = computed(() =>
    this.years()
      .filter(({ familiar }) => familiar.kind !== 'inside')
      .map(({ year, of, familiar }) => {
        const values = steppedInside(this.basis(), familiar, this.years());
        const amounts = this.labels().map(
          (label, k) => `${label} ${this.#numbers.figure(values[k], regressorKind(k))}`,
        );
        return {
          year,
          of,
          // With a lag the values to change are those of the year before, where that one is planned.
          inside: of > this.basis().last.year ? { year: of, values } : null,
          finding: familiarFinding([year], familiar.kind),
          reason: familiarReason(this.basis(), this.labels(), familiar, this.#numbers),
          nearest: amounts.join(', '),
        };
      }),
  );
}
