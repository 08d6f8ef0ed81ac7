import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { MappingEntry } from './mapping-entry';
import { ProblemList } from './problem-list';

type FiscalYears = MappingEntry['fiscalYears'];

const months = Array.from({ length: 12 }, (_, index) => ({
  number: index + 1,
  name: new Date(Date.UTC(2000, index, 1)).toLocaleString('en', {
    month: 'long',
    timeZone: 'UTC',
  }),
}));

const rules = [
  {
    value: 'year-of-end',
    words: 'The calendar year that it ends in',
    example: 'a year from April 2022 to March 2023 is 2023',
  },
  {
    value: 'year-of-most-months',
    words: 'The calendar year that holds most of its months',
    example:
      'a year from April 2022 to March 2023 is 2022; one that ends in June is the year it ends in',
  },
] as const;

/** Which calendar year a fiscal year belongs to, and when the companies' years end. */
@Component({
  selector: 'kv-fiscal-year-part',
  imports: [ProblemList],
  templateUrl: './fiscal-year-part.html',
  styleUrl: './entries.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FiscalYearPart {
  readonly fiscalYears = input.required<FiscalYears>();
  readonly problems = input<readonly string[]>([]);
  readonly changed = output<FiscalYears>();

  protected readonly months = months;
  protected readonly rules = rules;

  protected change(change: Partial<FiscalYears>): void {
    this.changed.emit({ ...this.fiscalYears(), ...change });
  }

  protected setCompany(place: number, change: Partial<FiscalYears['companies'][number]>): void {
    const companies = this.fiscalYears().companies.map((each, at) =>
      at === place ? { ...each, ...change } : each,
    );
    this.change({ companies });
  }

  protected add(): void {
    const { companies, usualEndMonth } = this.fiscalYears();
    this.change({ companies: [...companies, { company: '', endMonth: usualEndMonth }] });
  }

  protected remove(place: number): void {
    this.change({ companies: this.fiscalYears().companies.filter((_, at) => at !== place) });
  }
}
