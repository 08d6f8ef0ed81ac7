import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { Router } from '@angular/router';
import { Confirm } from '../../ui/confirm';
import { PageHeader } from '../../ui/page-header';
import { counted } from '../../ui/phrases';
import type { ShownProblem } from '../../ui/problem';
import { ProblemNotice } from '../../ui/problem-notice';
import { BringInPart } from './bring-in-part';
import { BringInStore } from './bring-in-store';
import { ChangeTable } from './change-table';
import { countWords, importFinding, leftOutWords } from './check-words';
import { CurrencyPart } from './currency-part';
import { isSameMapping, readEntry } from './entry-mapping';
import { FileDrop } from './file-drop';
import { FirstRows } from './first-rows';
import { FiscalYearPart } from './fiscal-year-part';
import { HowRead } from './how-read';
import { ImportStore, type ImportWork } from './import-store';
import { type MappingEntry, columnChoices, nextVersion, startingEntry } from './mapping-entry';
import { MappingForm } from './mapping-form';
import { OtherColumns } from './other-columns';
import { PanelPreview } from './panel-preview';
import { PricePart } from './price-part';
import { ProblemList } from './problem-list';
import { withMissingRates } from './rate-table';
import { refusalWords } from './refusal-words';
import { RememberedMapping } from './remembered-mapping';
import { ReviewTable } from './review-table';
import { SpellingList } from './spelling-list';

const noProblems = { columns: [], currencies: [], prices: [], fiscalYears: [] };

/** From a file to a panel version: how it is read, which column is what, what the check finds, and bringing it in. */
@Component({
  selector: 'kv-import-page',
  imports: [
    BringInPart,
    ChangeTable,
    CurrencyPart,
    FileDrop,
    FirstRows,
    FiscalYearPart,
    HowRead,
    MappingForm,
    MatButtonModule,
    OtherColumns,
    PageHeader,
    PanelPreview,
    PricePart,
    ProblemList,
    ProblemNotice,
    ReviewTable,
    SpellingList,
  ],
  templateUrl: './import-page.html',
  styleUrl: './import-page.css',
  providers: [BringInStore, ImportStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  readonly #injector = inject(Injector);
  readonly #router = inject(Router);
  readonly #confirm = inject(Confirm);
  readonly #remembered = inject(RememberedMapping);
  protected readonly store = inject(ImportStore);
  protected readonly bringIn = inject(BringInStore);

  readonly importId = input.required<string>();

  private readonly form = viewChild(MappingForm);
  private readonly outcome = viewChild<ElementRef<HTMLElement>>('outcome');
  readonly #draft = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.draft : null;
  });
  /** Changes with the import and with its table's header: then the entries start anew. */
  readonly #table = computed(() => {
    const draft = this.#draft();
    return draft === null ? null : JSON.stringify([draft.id, draft.headers]);
  });
  /** What is entered now: a check's reply does not touch it, another table starts it anew. */
  protected readonly entry = linkedSignal<string | null, MappingEntry | null>({
    source: this.#table,
    computation: (table, previous) =>
      table === null
        ? null
        : untracked(() => this.#startOf(table, previous?.source, previous?.value)),
  });
  /** What the form starts from; one that comes back after rows were being written, from what was entered before. */
  protected readonly start = computed(() => {
    this.#table();
    this.isCommitting();
    return untracked(this.entry);
  });
  readonly #read = computed(() => {
    const [entry, draft] = [this.entry(), this.#draft()];
    if (entry === null || draft === null) return { mapping: null, problems: noProblems };
    return readEntry(entry, draft.headers, draft.reading);
  });
  protected readonly problems = computed(() => this.#read().problems);
  protected readonly isCommitting = computed(() => this.#draft()?.state === 'committing');
  protected readonly isChecked = computed(() => {
    const draft = this.#draft();
    if (draft?.check == null) return false;
    return isSameMapping(this.#read().mapping, draft.mapping);
  });
  protected readonly usedHeaders = computed(() => {
    const entry = this.entry();
    if (entry === null) return [];
    const chosen = columnChoices.map(({ key }) => entry[key]);
    return [...chosen, ...entry.others, ...entry.attributes, entry.currencyColumn];
  });
  protected readonly finding = computed(() => {
    const draft = this.#draft();
    return draft === null ? 'Bring in a panel' : importFinding(draft);
  });
  protected readonly source = computed(() => {
    const draft = this.#draft();
    if (draft === null) return '';
    return draft.check === null
      ? 'Say how the file is read and which column is what, then check it'
      : countWords(draft.check);
  });
  protected readonly commitAction = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return '';
    return `Bring in as version ${nextVersion(view.draft.mapping.panelName ?? '', view.versions)}`;
  });
  protected readonly sending = this.bringIn.view;
  protected readonly sendingProblem = computed(() => {
    const sending = this.sending();
    return sending.kind === 'failed' ? sending.problem : null;
  });
  protected readonly countWords = countWords;
  protected readonly leftOutWords = leftOutWords;

  constructor() {
    effect(() => {
      const id = this.importId();
      untracked(() => void this.store.open(id));
    });
    effect(() => {
      const versionId = this.#draft()?.panelVersionId;
      if (versionId != null)
        void this.#router.navigate(['/panel', versionId], { replaceUrl: true });
    });
    // What lacks a rate gets its empty row, ready to be filled in.
    effect(() => {
      const missing = this.#draft()?.check?.missingRates ?? [];
      if (missing.length > 0)
        this.entry.update(
          (entry) => entry && { ...entry, rates: withMissingRates(entry.rates, missing) },
        );
    });
  }

  protected change(change: Partial<MappingEntry>): void {
    this.entry.update((entry) => entry && { ...entry, ...change });
  }

  /** Why one of these steps was not done last. */
  protected problemOf(works: readonly ImportWork[]): ShownProblem | null {
    const failed = this.store.failed();
    return failed !== null && works.includes(failed.work) ? refusalWords(failed.problem) : null;
  }

  protected blockingWords(count: number): string {
    return `${counted(count, 'finding')} ${count === 1 ? 'keeps' : 'keep'} the file from becoming a panel.`;
  }

  protected async check(): Promise<void> {
    if (this.form()?.validate() !== true) return;
    const { mapping } = this.#read();
    if (mapping === null || !(await this.store.check(this.importId(), mapping))) return;
    // The button that was pressed is gone: the focus goes on to what it was pressed for.
    afterNextRender(() => this.outcome()?.nativeElement.focus(), { injector: this.#injector });
  }

  protected async discard(): Promise<void> {
    const isSure = await this.#confirm.ask({
      title: 'Discard this import?',
      detail: 'The uploaded file goes with it. Panel versions stay as they are.',
      action: 'Discard import',
    });
    if (isSure && (await this.store.discard(this.importId())))
      await this.#router.navigate(['/panel'], { replaceUrl: true });
  }

  #startOf(
    table: string,
    tableBefore: string | null | undefined,
    before: MappingEntry | null | undefined,
  ): MappingEntry | null {
    const view = this.store.view();
    if (view.kind !== 'ready') return null;
    const { draft, versions } = view;
    const isSameImport = tableBefore?.includes(draft.id) === true && tableBefore !== table;
    return startingEntry(
      draft,
      this.#remembered.recall(draft.headers),
      versions.at(0),
      isSameImport && before != null ? before : undefined,
    );
  }
}
