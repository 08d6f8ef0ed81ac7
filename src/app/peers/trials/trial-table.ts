import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ModelForm } from '@contract';
import { Figure } from '../../ui/figure';
import { Mark } from '../../ui/mark';
import { differenceKind, differenceUnit } from '../../ui/model-form';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { TableScroll } from '../../ui/table-scroll';
import type { Places, TrialBase, TrialChange } from './trial-changes';
import { type TrialOrder, type TrialOrderKey, largestFirst, ordered, pressed } from './trial-order';
import { placesText } from './trial-words';

interface Header {
  readonly key: TrialOrderKey;
  readonly text: string;
}

const nothingToSay = 'None of these moves places, a sign, or zero in or out of the interval.';

/** What leaving each member out, or taking each candidate in, would change: one row each, in an order to choose. */
@Component({
  selector: 'kv-trial-table',
  imports: [Figure, Mark, MatButton, TableScroll],
  templateUrl: './trial-table.html',
  styleUrl: './trial-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrialTable {
  readonly #numbers = inject(NumberFormat);

  readonly side = input.required<'without' | 'taking'>();
  readonly changes = input.required<readonly TrialChange[]>();
  readonly base = input.required<TrialBase>();
  readonly form = input.required<ModelForm>();
  /** In the reader's words. */
  readonly regressors = input.required<readonly string[]>();
  /** Those that can be moved from here: on the side that they were tried from, still. */
  readonly movable = input<ReadonlySet<string>>(new Set());
  /** The company to move. */
  readonly moved = output<string>();

  readonly #order = signal<TrialOrder>(largestFirst);

  protected readonly name = computed(() =>
    this.side() === 'without' ? 'Leaving each member out' : 'Taking each of the nearest in',
  );
  protected readonly action = computed(() => (this.side() === 'without' ? 'Take out' : 'Take in'));
  protected readonly kind = computed((): FigureKind => differenceKind(this.form()));
  protected readonly headers = computed((): readonly Header[] => [
    { key: 'standing', text: `Standing, ${differenceUnit(this.form(), this.#numbers)}` },
    { key: 'change', text: this.form() === 'log' ? 'Change, percentage points' : 'Change' },
  ]);
  protected readonly company: Header = { key: 'company', text: 'Company' };
  protected readonly slopeHeaders = computed((): readonly Header[] =>
    this.regressors().map((word, index) => ({
      key: `slope-${index}`,
      text: `Slope of ${word}, change`,
    })),
  );
  /** Digits that align the changes of a column. */
  protected readonly digits = computed(() => {
    const changes = this.changes();
    const moved = changes.map(({ change }) => this.changeValue(change));
    return {
      change: this.#numbers.columnDigits(moved, this.changeKind()),
      slopes: this.regressors().map((_, index) =>
        this.#numbers.columnDigits(
          changes.map(({ slopes }) => slopes.at(index)?.change ?? null),
          'plain',
        ),
      ),
    };
  });
  protected readonly rows = computed(() => ordered(this.changes(), this.#order()));
  protected readonly columnCount = computed(() => this.slopeHeaders().length + 5);
  /** Said once under a table of figures in which no row has a mark. */
  protected readonly calm = computed(() => {
    const fitted = this.changes().filter(({ why }) => why === '');
    return fitted.length > 0 && fitted.every(({ marks }) => marks.length === 0) ? nothingToSay : '';
  });
  /** What the order is now, for those who do not see the arrow. */
  protected readonly status = signal('');

  protected sortOf(key: TrialOrderKey): 'ascending' | 'descending' | 'none' {
    const { by, isDescending } = this.#order();
    if (by !== key) return 'none';
    return isDescending ? 'descending' : 'ascending';
  }

  protected orderBy({ key, text }: Header): void {
    this.#order.update((order) => pressed(order, key));
    this.status.set(`Ordered by ${text.toLowerCase()}, ${this.sortOf(key)}`);
  }

  /** A change of shares is in percentage points. */
  protected changeKind(): FigureKind {
    return this.form() === 'log' ? 'plain' : 'money';
  }

  protected changeValue(change: number | null): number | null {
    return change === null || this.form() === 'levels' ? change : change * 100;
  }

  protected placesOf(places: Places | null): string {
    return places === null ? 'n/a' : placesText(places);
  }
}
