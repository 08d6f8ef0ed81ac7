import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  input,
  output,
  viewChildren,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type FigureKind, NumberFormat } from '../ui/number-format';
import type { PanelCompany } from './peer-draft';

import type { StandingsWithout } from './peers-store';
import { ReasonField } from './reason-field';
import { yearsText } from '../ui/phrases';

/** A company on one side of the choice, with what is known about it. */
export interface PeerRow {
  readonly company: PanelCompany;
  readonly reason: string;
  /** What the standing would be without it, where a fit of this version knows. */
  readonly standingWithout?: number | null;
}

/** The companies of one side, in or out: each with its reason and the facts to defend it by. */
@Component({
  selector: 'kv-peer-table',
  imports: [MatButton, ReasonField],
  templateUrl: './peer-table.html',
  styleUrl: './peer-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeerTable {
  readonly #numbers = inject(NumberFormat);

  readonly rows = input.required<readonly PeerRow[]>();
  readonly side = input.required<'in' | 'out'>();
  readonly isReadOnly = input(false);
  /** Shows what leaving each out would change, by this fit. */
  readonly without = input<Pick<StandingsWithout, 'fitName' | 'kind' | 'standing'> | null>(null);
  readonly reasons = input<readonly string[]>([]);
  readonly moved = output<string>();
  readonly written = output<{ readonly company: string; readonly reason: string }>();

  private readonly fields = viewChildren(ReasonField);
  private readonly lines = viewChildren<ElementRef<HTMLTableRowElement>>('line');

  protected readonly digits = computed(() => {
    const companies = this.rows().map(({ company }) => company);
    const of = (measure: 'marketValue' | 'capex' | 'bookEquity') =>
      this.#numbers.columnDigits(companies.map((company) => company[measure]));
    return {
      marketValue: of('marketValue'),
      capex: of('capex'),
      bookEquity: of('bookEquity'),
      standing: this.#numbers.columnDigits(
        this.rows().map(({ standingWithout }) => standingWithout ?? null),
        this.without()?.kind,
      ),
    };
  });

  protected readonly caption = computed(() => {
    const values = `Last reported values in ${this.#numbers.unitLabel()}`;
    const without = this.without();
    return without === null
      ? values
      : `${values}; the standing with all peers is ${this.#numbers.interval(without.standing, without.kind)} by fit ${without.fitName}`;
  });

  protected money(
    value: number | null | undefined,
    digits: number,
    kind: FigureKind = 'money',
  ): string {
    return this.#numbers.figure(value, kind, digits);
  }

  protected years({ firstYear, lastYear }: PanelCompany): string {
    return yearsText(firstYear, lastYear);
  }

  /** Goes to where a company's reason is written; its row where it can only be read. */
  focusReason(company: string): void {
    const index = this.rows().findIndex((row) => row.company.name === company);
    if (index === -1) return;
    if (this.isReadOnly()) this.lines().at(index)?.nativeElement.focus();
    else this.fields().at(index)?.focus();
  }
}
