import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  output,
  untracked,
  viewChild,
} from '@angular/core';
import type { CellDifference, PanelColumn, PanelVersionSummary } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { counted, listed } from '../../ui/phrases';
import { ProblemNotice } from '../../ui/problem-notice';
import { columnTitle, kindOf } from '../panel-rows';
import { DifferencesStore } from './differences-store';
import { moneyWords, versionChanges } from './change-lines';

const moreRoom = 200;

/** What changed from one version of a panel to another: cells before and after, rows added and removed. */
@Component({
  selector: 'kv-version-differences',
  imports: [ProblemNotice],
  templateUrl: './version-differences.html',
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 8px;
      padding-block: 16px 8px;
    }
    .head {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 24px;
      align-items: baseline;
      justify-content: space-between;
    }
    .kv-table-scroll {
      max-block-size: 480px;
      overflow-y: auto;
    }
    select {
      min-block-size: 32px;
      max-inline-size: 240px;
      padding-inline: 8px;
      background: var(--kv-paper);
      color: var(--kv-ink);
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      font: inherit;
    }
    .late {
      animation: kv-appear 0s 1s both;
    }
    @keyframes kv-appear {
      from {
        visibility: hidden;
      }
    }
  `,
  providers: [DifferencesStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VersionDifferences {
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(DifferencesStore);

  readonly older = input.required<PanelVersionSummary>();
  readonly newer = input.required<PanelVersionSummary>();

  readonly closed = output();

  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');

  protected readonly moreRoom = moreRoom;
  readonly #found = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.differences : null;
  });
  protected readonly title = computed(
    () => `From ${this.older().panelName} v${this.older().number} to v${this.newer().number}`,
  );
  protected readonly counts = computed(() => {
    const found = this.#found();
    if (found === null) return '';
    const words = [
      ...(found.changedCells === 0 ? [] : [`${counted(found.changedCells, 'cell')} changed`]),
      ...(found.addedRows === 0 ? [] : [`${counted(found.addedRows, 'row')} added`]),
      ...(found.removedRows === 0 ? [] : [`${counted(found.removedRows, 'row')} removed`]),
    ];
    if (words.length > 0) return `${listed(words)}.`;
    return this.changes().length === 0 ? 'The two hold the same.' : 'No figure changed.';
  });
  protected readonly companies = computed(() => {
    const names = new Set(this.#found()?.listed.map(({ company }) => company));
    return [...names].sort((left, right) => left.localeCompare(right, 'en'));
  });
  /** Empty for all. */
  protected readonly company = linkedSignal({ source: this.#found, computation: () => '' });
  protected readonly room = linkedSignal({ source: this.company, computation: () => moreRoom });
  protected readonly rows = computed(() => {
    const company = this.company();
    const all = this.#found()?.listed ?? [];
    return company === '' ? all : all.filter((row) => row.company === company);
  });
  protected readonly unlisted = computed(() => {
    const found = this.#found();
    if (found === null) return 0;
    return found.changedCells + found.addedRows + found.removedRows - found.listed.length;
  });
  /** What changed that is no figure, a line each. */
  protected readonly changes = computed(() => {
    const found = this.#found();
    return found === null ? [] : versionChanges(this.older(), this.newer(), found);
  });
  /** Money in the unit of the page follows the unit switch; any other stays as it is saved. */
  readonly #isOfPage = computed(() => {
    const money = this.#found()?.money;
    return money?.unit === this.#numbers.panelUnit() && money.currency === this.#numbers.currency();
  });
  protected readonly unitWords = computed(() => {
    const money = this.#found()?.money ?? null;
    return this.#isOfPage()
      ? `Money in ${this.#numbers.unitLabel()}, every digit`
      : moneyWords(this.older(), this.newer(), money);
  });

  constructor() {
    effect(() => {
      this.older();
      this.newer();
      untracked(() => {
        this.load();
      });
    });
    afterNextRender(() => {
      this.heading().nativeElement.focus();
    });
  }

  protected load(): void {
    this.store.open(this.older().id, this.newer().id);
  }

  protected choose(company: string): void {
    this.company.set(company);
  }

  protected what({ kind, column }: CellDifference): string {
    if (kind === 'added-row') return 'row added';
    if (kind === 'removed-row') return 'row removed';
    const known = this.#columnOf(column);
    return known === undefined ? (column ?? '') : columnTitle(known);
  }

  protected figure(value: number | null, column: string | null): string {
    const known = this.#columnOf(column);
    const kind = known === undefined || !this.#isOfPage() ? 'plain' : kindOf(known);
    return this.#numbers.full(value, kind);
  }

  #columnOf(name: string | null): PanelColumn | undefined {
    return this.#found()?.columns.find((column) => column.name === name);
  }
}
