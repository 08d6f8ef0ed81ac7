import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { NumberFormat } from '../ui/number-format';
import { ProblemNotice } from '../ui/problem-notice';
import { InvoiceTable } from './invoice-table';
import { NextInvoice } from './next-invoice';
import { PlanStatus } from './plan-status';
import { SeatTable } from './seat-table';
import { seatsHeadline } from './seats-headline';
import { SeatsStore } from './seats-store';

/** Who has access and what does it cost? For billing admins; holds no model data. */
@Component({
  selector: 'kv-seats-page',
  imports: [DatePipe, InvoiceTable, NextInvoice, PlanStatus, ProblemNotice, RouterLink, SeatTable],
  templateUrl: './seats-page.html',
  styleUrl: './seats-page.css',
  providers: [SeatsStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SeatsPage {
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(SeatsStore);

  protected readonly locale = this.#numbers.locale;
  protected readonly headline = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? seatsHeadline(view.seats.seats) : 'Seats';
  });

  constructor() {
    void this.store.load();
  }
}
