import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  untracked,
} from '@angular/core';
import { Router } from '@angular/router';
import type { ImportMapping } from '@contract';
import { Confirm } from '../../ui/confirm';
import { PageHeader } from '../../ui/page-header';
import { ProblemNotice } from '../../ui/problem-notice';
import { BringInStore } from './bring-in-store';
import { countWords, findingWords } from './check-words';
import { CommitForm } from './commit-form';
import { FileDrop } from './file-drop';
import { FindingTable } from './finding-table';
import { FirstRows } from './first-rows';
import { ImportStore } from './import-store';
import { type MappingEntry, isSameEntry, nextVersion, startingEntry } from './mapping-entry';
import { MappingForm } from './mapping-form';

import { RememberedMapping } from './remembered-mapping';
import { counted } from '../../ui/phrases';

/** From a file to a panel version: its first rows, which column is what, what the check finds, and bringing it in. */
@Component({
  selector: 'kv-import-page',
  imports: [CommitForm, FileDrop, FindingTable, FirstRows, MappingForm, PageHeader, ProblemNotice],
  templateUrl: './import-page.html',
  styleUrl: './import-page.css',
  providers: [BringInStore, ImportStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  readonly #router = inject(Router);
  readonly #confirm = inject(Confirm);
  readonly #remembered = inject(RememberedMapping);
  protected readonly store = inject(ImportStore);
  protected readonly bringIn = inject(BringInStore);

  readonly importId = input.required<string>();

  protected readonly start = computed<MappingEntry | null>(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return null;
    const { draft, versions } = view;
    return startingEntry(draft, this.#remembered.recall(draft.headers), versions.at(0));
  });
  readonly #openImportId = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.draft.id : null;
  });
  /** What stands in the form now: a check's reply does not touch it, another import starts it anew. */
  protected readonly entry = linkedSignal({
    source: this.#openImportId,
    computation: () => untracked(this.start),
  });
  protected readonly isChecked = computed(() => {
    const view = this.store.view();
    const entry = this.entry();
    if (view.kind !== 'ready' || view.draft.check === null || entry === null) return false;
    return isSameEntry(entry, view.draft.mapping);
  });
  protected readonly finding = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return 'Bring in a panel';
    const { check, fileName, rowCount } = view.draft;
    return check === null
      ? `${fileName}: ${counted(rowCount, 'row')}, not checked yet`
      : `${fileName}: ${findingWords(check)}`;
  });
  protected readonly source = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return '';
    const { check } = view.draft;
    return check === null ? 'Say which column is what, then check the file' : countWords(check);
  });
  protected readonly commitAction = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return '';
    return `Bring in as version ${nextVersion(view.draft.mapping.panelName ?? '', view.versions)}`;
  });

  constructor() {
    effect(() => {
      const id = this.importId();
      untracked(() => void this.store.open(id));
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind === 'ready' && view.draft.panelVersionId !== null)
        void this.#router.navigate(['/panel', view.draft.panelVersionId], { replaceUrl: true });
    });
  }

  protected check(mapping: ImportMapping): void {
    void this.store.check(this.importId(), mapping);
  }

  protected async commit(note: string): Promise<void> {
    const version = await this.store.commit(this.importId(), note);
    if (version !== null) await this.#router.navigate(['/panel', version.id], { replaceUrl: true });
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
}
