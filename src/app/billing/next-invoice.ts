import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SeatsReply } from '@contract';
import { moneyText } from './money-text';

/** What the next invoice will say as things stand, line by line. */
@Component({
  selector: 'kv-next-invoice',
  imports: [DatePipe],
  template: `
    @if (invoice(); as next) {
      <p>
        {{ next.dueAt | date: 'd MMM y' }}, as things stand{{
          hasPaymentMethod() ? '' : ' and if a payment method is on file by then'
        }}
      </p>
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Next invoice, table">
        <table class="kv-table">
          <thead>
            <tr>
              <th scope="col">For</th>
              <th scope="col" class="kv-number">Amount</th>
            </tr>
          </thead>
          <tbody>
            @for (line of lines(); track $index) {
              <tr>
                <th scope="row">{{ line.description }}</th>
                <td class="kv-number">{{ line.amount }}</td>
              </tr>
            }
            <tr class="kv-total-row">
              <th scope="row">Total</th>
              <td class="kv-number">{{ total() }}</td>
            </tr>
          </tbody>
        </table>
      </div>
    } @else {
      <p>The payment provider expects no further invoice.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      min-inline-size: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NextInvoice {
  readonly invoice = input.required<SeatsReply['nextInvoice']>();
  readonly hasPaymentMethod = input.required<boolean>();
  readonly locale = input.required<string>();

  protected readonly lines = computed(() =>
    (this.invoice()?.lines ?? []).map((line) => ({
      description: line.description,
      amount: moneyText(line.amount, this.locale()),
    })),
  );
  protected readonly total = computed(() => {
    const total = this.invoice()?.total;
    return total === undefined ? '' : moneyText(total, this.locale());
  });
}
