import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { SeatsReply } from '@contract';
import { Mark } from '../ui/mark';
import { NumberFormat } from '../ui/number-format';
import { moneyText } from './money-text';
import { missingSeats, seatTotals } from './seats-headline';

const kindWords = { analyst: 'Analyst', reading: 'Reading' } as const;

/** Bought, used, invited and free, by kind and in all. */
@Component({
  selector: 'kv-seat-table',
  imports: [Mark],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Seats by kind, table">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col">Seats</th>
            <th scope="col" class="kv-number">Bought</th>
            <th scope="col" class="kv-number">Used</th>
            <th scope="col" class="kv-number">Invited</th>
            <th scope="col" class="kv-number">Free</th>
            <th scope="col" class="kv-number price">One a {{ interval() }}</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.kind) {
            <tr>
              <th scope="row">{{ row.label }}</th>
              @for (count of row.counts; track $index) {
                <td class="kv-number">{{ count }}</td>
              }
              <td class="kv-number">{{ row.price }}</td>
            </tr>
          }
          <tr class="kv-total-row">
            <th scope="row">All</th>
            @for (count of totals(); track $index) {
              <td class="kv-number">{{ count }}</td>
            }
            <td></td>
          </tr>
        </tbody>
      </table>
    </div>
    @for (sentence of missing(); track sentence) {
      <p class="missing"><kv-mark kind="caution" /> {{ sentence }}</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
      min-inline-size: 0;
    }
    .missing {
      display: flex;
      gap: 8px;
    }
    @media (width < 480px) {
      th,
      td {
        padding-inline-end: 8px;
      }
      th.price {
        white-space: normal;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SeatTable {
  readonly #numbers = inject(NumberFormat);

  readonly seats = input.required<SeatsReply['seats']>();
  readonly locale = input.required<string>();

  protected readonly interval = computed(() => this.seats()[0]?.interval ?? 'month');
  protected readonly rows = computed(() =>
    this.seats().map((seat) => ({
      kind: seat.kind,
      label: kindWords[seat.kind],
      counts: this.#counts(seat),
      price: seat.unitPrice === null ? 'n/a' : moneyText(seat.unitPrice, this.locale()),
    })),
  );
  protected readonly totals = computed(() => this.#counts(seatTotals(this.seats())));
  protected readonly missing = computed(() => missingSeats(this.seats()));

  #counts(of: ReturnType<typeof seatTotals>): readonly string[] {
    return [of.bought, of.used, of.invited, of.free].map((count) =>
      this.#numbers.figure(count, 'count'),
    );
  }
}
