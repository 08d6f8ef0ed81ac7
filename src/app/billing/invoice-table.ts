import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SeatsReply } from '@contract';
import { moneyText } from './money-text';
import { invoiceStatusText } from './plan-words';

/** As many as the server lists. */
const listed = 24;

/** Invoices so far, newest first. */
@Component({
  selector: 'kv-invoice-table',
  imports: [DatePipe],
  template: `
    @if (rows().length === 0) {
      <p>There is no invoice yet.</p>
    } @else {
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Invoices, table">
        <table class="kv-table">
          @if (isCut()) {
            <caption>
              The newest 24
            </caption>
          }
          <thead>
            <tr>
              <th scope="col">Number</th>
              <th scope="col">Date</th>
              <th scope="col">State</th>
              <th scope="col" class="kv-number">Total</th>
            </tr>
          </thead>
          <tbody>
            @for (row of rows(); track row.id) {
              <tr>
                <th scope="row">{{ row.number ?? 'none yet' }}</th>
                <td class="date">{{ row.createdAt | date: 'd MMM y' }}</td>
                <td>{{ row.state }}</td>
                <td class="kv-number">{{ row.total }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    }
  `,
  styles: `
    .date {
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceTable {
  readonly invoices = input.required<SeatsReply['invoices']>();
  readonly locale = input.required<string>();

  protected readonly isCut = computed(() => this.invoices().length >= listed);
  protected readonly rows = computed(() =>
    this.invoices().map((invoice) => ({
      ...invoice,
      state: invoiceStatusText(invoice.status),
      total: moneyText(invoice.total, this.locale()),
    })),
  );
}
