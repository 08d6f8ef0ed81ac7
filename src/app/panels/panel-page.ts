import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
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
import type { Flag } from '@panel-data';
import { PanelsApi } from '../api/panels-api';
import { SessionStore } from '../api/session-store';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import type { ChartText } from '../charts/chart-text';
import { BringInPanel } from './importing/bring-in-panel';
import { WaitingImports } from './importing/waiting-imports';
import { PanelDeskGrid } from './editing/panel-desk-grid';
import { DismissalsStore } from './flags/dismissals-store';
import { flagReason } from './flags/flag-words';
import { FlagsStore } from './flags/flags-store';
import { PanelCheck, type WantedPlace } from './flags/panel-check';
import { ShownWindow } from './flags/shown-window';
import { MultiplesSection } from './multiples/multiples-section';
import { panelContext, versionSource } from './panel-context';
import { panelCompleteness, panelFinding } from './panel-finding';
import { type PanelRow, columnSources, columnTitle, panelRows } from './panel-rows';
import { PanelStore } from './panel-store';
import { type RowFocus, addressWords, isAsked, rowAt } from './row-focus';
import { PanelVersions } from './versions/panel-versions';
import { newestOf } from './versions/version-words';
import { counted } from '../ui/phrases';

/** Is my data complete and right? The coverage of a panel version, its rows, and where it came from. */
@Component({
  selector: 'kv-panel-page',
  imports: [
    BringInPanel,
    MatButtonModule,
    MultiplesSection,
    PageHeader,
    PanelCheck,
    PanelDeskGrid,
    PanelVersions,
    ProblemNotice,
    RouterLink,
    ShownWindow,
    WaitingImports,
  ],
  templateUrl: './panel-page.html',
  styleUrl: './panel-page.css',
  providers: [DismissalsStore, FlagsStore, PanelStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelPage {
  readonly #document = inject(DOCUMENT);
  readonly #router = inject(Router);
  readonly #context = inject(PageContext);
  readonly #numbers = inject(NumberFormat);
  readonly #roles = inject(SessionStore).roles;
  readonly #panels = inject(PanelsApi);
  readonly #dismissals = inject(DismissalsStore);
  protected readonly flags = inject(FlagsStore);
  protected readonly store = inject(PanelStore);

  /** From the address; without it the newest version is shown. */
  readonly panelVersionId = input<string>();
  /** Company and fiscal year of the row to look at, from the address. */
  readonly company = input<string>();
  readonly year = input(null, { transform: wholeNumber(1) });
  /** Line of the file to look at, from an address that names no company and year. */
  readonly row = input(null, { transform: wholeNumber(1) });
  /** Position of the column to look at in that row, from the address. */
  readonly column = input(null, { transform: wholeNumber(0) });

  protected readonly mayChange = computed(() => this.#roles().includes('analyst'));
  readonly #isNewest = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return false;
    const { version } = view.panel;
    return newestOf(version, view.versions).id === version.id;
  });
  protected readonly mayDismiss = computed(() => this.mayChange() && this.#isNewest());
  protected readonly templates = {
    csv: this.#panels.templateAddress('csv'),
    xlsx: this.#panels.templateAddress('xlsx'),
  };
  protected readonly isBringingIn = signal(false);

  readonly #panel = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.panel : null;
  });
  readonly #panelId = computed(() => this.#panel()?.version.panelId);
  /** As the version has them. */
  protected readonly savedRows = computed(() => {
    const panel = this.#panel();
    return panel === null ? [] : panelRows(panel);
  });
  /** As they stand, with what is not saved. */
  protected readonly rows = linkedSignal<readonly PanelRow[]>(() => this.savedRows());
  protected readonly titles = computed(() => this.#panel()?.columns.map(columnTitle) ?? []);
  protected readonly found = computed(() => panelCompleteness(this.rows(), this.titles()));
  protected readonly finding = computed(() =>
    panelFinding(this.found(), this.flags.figuresToLookAt()),
  );
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
  protected readonly mapText = computed((): ChartText => ({
    title: this.finding(),
    caption: this.source(),
    source: versionSource(this.#panel()?.version),
  }));
  readonly #address = computed(() => ({
    company: this.company(),
    year: this.year(),
    line: this.row(),
  }));
  readonly #addressed = computed(() => rowAt(this.savedRows(), this.#address()));
  /** The row that the address names, where this version has it; new each time it is asked for. */
  protected readonly focusedRow = linkedSignal((): RowFocus | null => {
    const [found, column] = [this.#addressed(), this.column()];
    return found === undefined ? null : focusOn(found, column);
  });
  /** What the address names and this version has not. */
  protected readonly missedRow = computed(() => {
    const isHere = this.#panel() === null || this.#addressed() !== undefined;
    return isHere ? '' : addressWords(this.#address());
  });
  /** A flag at the cell where it is shown. */
  protected readonly flagWords = computed(() => {
    const numbers = this.#numbers;
    numbers.factor();
    return (flag: Flag): string => flagReason(flag, numbers);
  });
  /** The cell of the map that has no row behind it. */
  protected readonly emptyPlace = signal('');
  /** Id of the version that follows from the one that is shown, while it is gone on to. */
  #onward: string | undefined;

  constructor() {
    effect(() => {
      const id = this.panelVersionId();
      untracked(() => {
        if (id !== undefined && id === this.#onward) this.store.goOnTo(id);
        else this.store.open(id);
        this.#onward = undefined;
      });
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind !== 'ready') return;
      const { panel, versions, ownCompany } = view;
      this.#context.show(panelContext(panel.version, versions, ownCompany));
    });
    // From one version of a panel to the next, what is known of it stays until it is looked through again.
    effect(() => {
      const panelId = this.#panelId();
      if (panelId === undefined) return;
      untracked(() => {
        this.flags.forget();
        void this.#dismissals.open(panelId);
      });
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind === 'ready')
        this.flags.lookThrough(this.rows(), view.panel.columns, view.ownCompany);
    });
  }

  /** Goes on to the version that was made of this one: the page and the focus stay where they are. */
  protected async goOnTo(panelVersionId: string): Promise<void> {
    const focused = this.#document.activeElement;
    this.#onward = panelVersionId;
    const isThere = await this.#router.navigate(['/panel', panelVersionId], { scroll: 'manual' });
    if (isThere && focused instanceof HTMLElement) focused.focus({ preventScroll: true });
    else this.#onward = undefined;
  }

  /** Leads to a cell's row; the address says which that is, unless it is not saved yet. */
  protected openPlace({ company, year, column = null }: WantedPlace): void {
    const place = { company, year };
    const isHere = this.rows().some((row) => isAsked(row, place));
    this.emptyPlace.set(isHere ? '' : `${company} ${year}`);
    if (!isHere) return;
    const isAddressed =
      company === this.company() && year === this.year() && column === this.column();
    if (isAddressed || !this.savedRows().some((row) => isAsked(row, place))) {
      this.focusedRow.set(focusOn(place, column));
      return;
    }
    void this.#router.navigate([], { queryParams: { ...place, column }, replaceUrl: true });
  }
}

function focusOn({ company, year }: RowFocus, column: number | null): RowFocus {
  return { company, year, ...(column === null ? {} : { column }) };
}

/** A whole number above or at `least` in the address; null for anything else. */
function wholeNumber(least: number): (text: string | undefined) => number | null {
  return (text) => {
    const number = numberAttribute(text, -1);
    return Number.isInteger(number) && number >= least ? number : null;
  };
}
