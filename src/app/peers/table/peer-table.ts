import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  input,
  output,
  signal,
  viewChildren,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { fixedText } from '@figures';
import { CautionLine } from '../../ui/caution-line';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { yearsText } from '../../ui/phrases';
import { TableScroll } from '../../ui/table-scroll';
import type { PeerMeasure } from '../nearness/peer-measures';
import type { Nearness } from '../nearness/peer-nearness-of';
import type { PanelCompany } from '../peer-draft';
import type { StandingsWithout } from '../peers-ground';
import { ReasonField } from '../reasons/reason-field';
import { DistanceParts } from './distance-parts';

/** A company on one side of the choice, with what is known about it. */
export interface PeerRow {
  readonly company: PanelCompany;
  readonly reason: string;
  /** Null where it has no distance. */
  readonly nearness: Nearness | null;
  /** Why it has no distance: `no growth: one year only`; empty where it has one or nobody has. */
  readonly whyNone: string;
  /** What the standing would be without it, where a fit of this version knows. */
  readonly standingWithout?: number | null;
}

/** The companies of one side, in or out: each with its reason and the facts to defend it by. */
@Component({
  selector: 'kv-peer-table',
  imports: [CautionLine, DistanceParts, MatButton, ReasonField, TableScroll],
  templateUrl: './peer-table.html',
  styleUrl: './peer-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeerTable {
  readonly #numbers = inject(NumberFormat);

  readonly rows = input.required<readonly PeerRow[]>();
  readonly side = input.required<'in' | 'out'>();
  readonly isReadOnly = input(false);
  readonly own = input<PanelCompany>();
  /** The measures that the distance counts. */
  readonly measures = input<readonly PeerMeasure[]>([]);
  /** Measures that are shown beside them. */
  readonly others = input<readonly PeerMeasure[]>([]);
  /** Shows what each distance is made of, of all companies. */
  readonly hasAllParts = input(false);
  /** Shows what leaving each out would change, by this fit. */
  readonly without = input<Pick<StandingsWithout, 'fitName' | 'kind' | 'standing'> | null>(null);
  readonly reasons = input<readonly string[]>([]);
  readonly moved = output<string>();
  readonly written = output<{ readonly company: string; readonly reason: string }>();

  private readonly fields = viewChildren(ReasonField);
  private readonly lines = viewChildren<ElementRef<HTMLTableRowElement>>('line');
  /** Companies whose parts stand otherwise than those of all. */
  readonly #turned = signal<ReadonlySet<string>>(new Set());

  readonly #standingDigits = computed(() =>
    this.#numbers.columnDigits(
      this.rows().map(({ standingWithout }) => standingWithout ?? null),
      this.without()?.kind,
    ),
  );
  /** Money, or of a fit in logs a percentage. */
  protected readonly standingUnit = computed(() =>
    this.without()?.kind === 'money' ? this.#numbers.unitLabel() : '%',
  );
  protected readonly columnCount = computed(
    () => 3 + (this.without() === null ? 0 : 1) + (this.isReadOnly() ? 0 : 1),
  );
  protected readonly caption = computed(() => {
    const without = this.without();
    return [
      ...(this.measures().length === 0 ? [] : ['Distance in standard deviations']),
      ...(without === null
        ? []
        : [
            `the standing with all peers is ${this.#numbers.interval(without.standing, without.kind)}${without.kind === 'money' ? ` ${this.#numbers.unitLabel()}` : ''} by fit ${without.fitName}; without one peer the fit gives the estimate alone, with no interval of its own`,
          ]),
    ]
      .map((part, place) => (place === 0 ? part.charAt(0).toUpperCase() + part.slice(1) : part))
      .join('; ');
  });

  protected standing(value: number | null | undefined, kind: FigureKind): string {
    return this.#numbers.figure(value, kind, this.#standingDigits());
  }

  protected years({ firstYear, lastYear }: PanelCompany): string {
    return yearsText(firstYear, lastYear);
  }

  /** `, 10 of 11 rows complete`; nothing where all are. */
  protected rowsWords({ rows, completeRows }: PanelCompany): string {
    return completeRows === rows ? '' : `, ${completeRows} of ${rows} rows complete`;
  }

  protected distance({ nearness }: PeerRow): string {
    return nearness === null
      ? this.#numbers.figure(null)
      : fixedText(nearness.distance, 2, this.#numbers.locale());
  }

  protected distanceLabel(row: PeerRow): string {
    const what = this.isOpen(row) ? 'hide its parts' : 'show its parts';
    return `Distance of ${row.company.name}: ${this.distance(row)}, ${what}`;
  }

  protected isOpen({ company }: PeerRow): boolean {
    return this.hasAllParts() !== this.#turned().has(company.name);
  }

  protected toggle({ company }: PeerRow): void {
    this.#turned.update((before) => {
      const turned = new Set(before);
      if (!turned.delete(company.name)) turned.add(company.name);
      return turned;
    });
  }

  /** Goes to where a company's reason is written; its row where it can only be read. */
  focusReason(company: string): void {
    const index = this.rows().findIndex((row) => row.company.name === company);
    if (index === -1) return;
    if (this.isReadOnly()) this.lines().at(index)?.nativeElement.focus();
    else this.fields().at(index)?.focus();
  }
}
