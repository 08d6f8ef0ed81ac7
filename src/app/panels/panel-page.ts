import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  numberAttribute,
  signal,
  untracked,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import type { PanelVersionSummary } from '@contract';
import type { CoverageCell } from '@figures';
import { SessionStore } from '../api/session-store';
import { NumberFormat } from '../ui/number-format';
import { PageContext, type StaleNotice } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import type { ChartText } from '../charts/chart-text';
import { CoverageMap } from '../charts/coverage-map/coverage-map';
import { BringInPanel } from './importing/bring-in-panel';
import { GapList } from './gap-list';
import { panelCompleteness, panelFinding, yearSpan } from './panel-finding';
import { PanelGrid, type RowFocus } from './panel-grid';
import { columnSources, columnTitle, missingIn, panelRows } from './panel-rows';
import { PanelStore } from './panel-store';
import { PanelVersions } from './panel-versions';
import { counted } from '../ui/phrases';

/** Is my data complete and right? The coverage of a panel version, its rows, and where it came from. */
@Component({
  selector: 'kv-panel-page',
  imports: [
    BringInPanel,
    CoverageMap,
    GapList,
    MatButtonModule,
    PageHeader,
    PanelGrid,
    PanelVersions,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './panel-page.html',
  styleUrl: './panel-page.css',
  providers: [PanelStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelPage {
  readonly #router = inject(Router);
  readonly #context = inject(PageContext);
  readonly #numbers = inject(NumberFormat);
  readonly #roles = inject(SessionStore).roles;
  protected readonly store = inject(PanelStore);

  /** From the address; without it the newest version is shown. */
  readonly panelVersionId = input<string>();
  /** Line of the file to look at, from the address. */
  readonly row = input(null, { transform: lineOf });

  protected readonly mayChange = computed(() => this.#roles().includes('analyst'));
  protected readonly isBringingIn = signal(false);
  protected readonly hasOnlyGaps = signal(false);

  readonly #panel = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.panel : null;
  });
  protected readonly rows = computed(() => {
    const panel = this.#panel();
    return panel === null ? [] : panelRows(panel);
  });
  protected readonly titles = computed(() => this.#panel()?.columns.map(columnTitle) ?? []);
  protected readonly found = computed(() => panelCompleteness(this.rows(), this.titles()));
  protected readonly finding = computed(() => panelFinding(this.found()));
  protected readonly sources = computed(() => {
    const panel = this.#panel();
    return panel === null ? '' : columnSources(panel);
  });
  protected readonly source = computed(() => {
    const version = this.#panel()?.version;
    if (version === undefined) return '';
    const { rows, completeRows } = this.found();
    const complete = `${counted(rows, 'row')}, ${completeRows.toLocaleString('en')} of them complete`;
    return `${version.panelName}, version ${version.number} · ${this.#numbers.unitLabel()} · ${complete}`;
  });
  protected readonly cells = computed((): readonly CoverageCell[] =>
    this.rows().map((row) => ({
      company: row.company,
      year: row.year,
      missing: missingIn(row, this.titles()),
    })),
  );
  /** The column that the map looks at; null for all. */
  protected readonly variable = linkedSignal<readonly string[], string | null>({
    source: this.titles,
    computation: () => null,
  });
  protected readonly mapText = computed((): ChartText => ({
    title: this.finding(),
    caption: this.source(),
    source: `File ${this.#panel()?.version.file.name ?? ''}, SHA-256 ${this.#panel()?.version.file.sha256 ?? ''}`,
  }));
  /** The row that the address names, where this version has it; new each time it is asked for. */
  protected readonly focusedRow = linkedSignal((): RowFocus | null => {
    const line = this.row();
    return line !== null && this.rows().some(({ fileRow }) => fileRow === line) ? { line } : null;
  });
  protected readonly missedLine = computed(() =>
    this.#panel() !== null && this.focusedRow() === null ? this.row() : null,
  );
  /** The cell of the map that has no row behind it. */
  protected readonly emptyPlace = signal('');

  constructor() {
    effect(() => {
      const id = this.panelVersionId();
      untracked(() => {
        this.store.open(id);
      });
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind !== 'ready') return;
      const { version } = view.panel;
      this.#context.show({
        currency: version.currency,
        unit: version.unit,
        lineage: [
          {
            label: 'Panel',
            version: `v${version.number}`,
            detail: yearSpan(version.firstYear, version.lastYear),
            link: `/panel/${version.id}`,
          },
        ],
        stale: staleNotice(version, view.versions),
        ...(view.ownCompany === null ? {} : { ownCompany: view.ownCompany }),
      });
    });
    // A row that is asked for must be in the grid, whatever was left out before.
    effect(() => {
      if (this.focusedRow() !== null) untracked(() => this.hasOnlyGaps.set(false));
    });
  }

  protected lookAt(title: string): void {
    this.variable.set(title === '' ? null : title);
  }

  /** Leads to the row of the file behind a cell of the map; the address says which. */
  protected openRow(place: { readonly company: string; readonly year: number }): void {
    const found = this.rows().find(
      (row) => row.company === place.company && row.year === place.year,
    );
    this.emptyPlace.set(found === undefined ? `${place.company} ${place.year}` : '');
    const line = found?.fileRow ?? null;
    if (line !== null && line === this.row()) {
      this.focusedRow.set({ line });
      return;
    }
    void this.#router.navigate([], {
      queryParams: { row: line },
      replaceUrl: true,
    });
  }
}

function lineOf(text: string | undefined): number | null {
  const line = numberAttribute(text, 0);
  return Number.isInteger(line) && line > 0 ? line : null;
}

/** Said where the panel that is shown has a newer version. */
function staleNotice(
  shown: PanelVersionSummary,
  versions: readonly PanelVersionSummary[],
): StaleNotice | null {
  const newest = versions
    .filter((version) => version.panelId === shown.panelId)
    .reduce((latest, version) => (version.number > latest.number ? version : latest), shown);
  if (newest.id === shown.id) return null;
  return {
    text: `This panel has a newer version, v${newest.number}.`,
    action: { label: 'Open it', link: `/panel/${newest.id}` },
  };
}
