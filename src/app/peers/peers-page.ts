import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChildren,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { apiRoutes, mayCall } from '@contract';
import { SessionStore } from '../api/session-store';
import { Confirm } from '../ui/confirm';
import { EmptyState } from '../ui/empty-state';
import { Mark } from '../ui/mark';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { PeerTable } from './peer-table';
import { PeerVersions } from './peer-versions';

import { PeersStore } from './peers-store';
import { type PeersShown, peersShown } from './peers-shown';
import { peersContext } from './peers-context';
import { counted } from '../ui/phrases';

/** Who do we compare ourselves with, and why? */
@Component({
  selector: 'kv-peers-page',
  imports: [
    EmptyState,
    Mark,
    MatButton,
    MatFormFieldModule,
    MatInput,
    PageHeader,
    PeerTable,
    PeerVersions,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './peers-page.html',
  styleUrl: './peers-page.css',
  providers: [PeersStore],
  host: { '(window:beforeunload)': 'holdBack($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeersPage {
  readonly #context = inject(PageContext);
  readonly #session = inject(SessionStore);
  readonly #router = inject(Router);
  readonly #confirm = inject(Confirm);
  readonly #injector = inject(Injector);
  protected readonly store = inject(PeersStore);

  /** The version to show; the newest where the address names none. */
  readonly peerGroupId = input<string>();
  /** The company whose reason is asked for, from the address. */
  readonly company = input<string>();

  private readonly tables = viewChildren(PeerTable);

  protected readonly note = signal('');
  protected readonly search = signal('');
  protected readonly isReadOnly = computed(
    () => !mayCall(apiRoutes.savePeerGroup, this.#session.roles()),
  );
  protected readonly shown = computed<PeersShown | null>(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? peersShown(view.ground, view.draft, this.search()) : null;
  });

  readonly #isReady = computed(() => this.store.view().kind === 'ready');

  constructor() {
    effect(() => {
      const company = this.company();
      if (company === undefined || !this.#isReady()) return;
      untracked(() => this.#lookAt(company));
    });
    effect(() => {
      const id = this.peerGroupId();
      untracked(() => {
        const view = this.store.view();
        const isShown = view.kind === 'ready' && view.ground.saved?.id === id;
        if (id === undefined || !isShown) this.load();
      });
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind !== 'ready') return;
      const context = peersContext(view.ground, view.draft);
      untracked(() => {
        this.#context.show(context);
      });
    });
  }

  protected readonly counted = counted;
  /** Going on to the version just saved leaves nothing behind: the page stays, with what was entered since. */
  #isGoingOn = false;

  protected load(): void {
    const id = this.peerGroupId();
    void this.store.load(id, id === undefined && !this.isReadOnly());
  }

  protected move(company: string, isIncluded: boolean): void {
    this.store.change(company, { isIncluded });
    afterNextRender(() => this.focusReason(company), { injector: this.#injector });
  }

  protected write(company: string, reason: string, isIncluded: boolean): void {
    this.store.change(company, isIncluded ? { reasonIn: reason } : { reasonOut: reason });
  }

  protected focusReason(company: string): void {
    for (const table of this.tables()) table.focusReason(company);
  }

  /** Brings a company's reason into view; where the lists stop short of it, the search finds it. */
  #lookAt(company: string): void {
    const page = this.shown();
    if (page === null) return;
    const isListed = [...page.inside, ...page.outside].some((row) => row.company.name === company);
    if (!isListed && page.notShown > 0) this.search.set(company);
    afterNextRender(() => this.focusReason(company), { injector: this.#injector });
  }

  protected async save(): Promise<void> {
    const note = this.note();
    await this.#show(await this.store.save(note), note);
  }

  protected async saveOnTop(): Promise<void> {
    const note = this.note();
    await this.#show(await this.store.saveOnTop(note), note);
  }

  /** Has the browser ask before the tab is closed on choices that are not saved. */
  protected holdBack(event: BeforeUnloadEvent): void {
    if (!this.isReadOnly() && this.store.hasInput()) event.preventDefault();
  }

  /** Asks before choices that are not saved are lost. */
  async mayLeave(): Promise<boolean> {
    if (this.#isGoingOn || this.isReadOnly() || !this.store.hasInput()) return true;
    return this.#confirm.ask({
      title: 'Leave without saving?',
      detail: 'The choice of peers and the reasons on this page are not saved as a version yet.',
      action: 'Leave without saving',
    });
  }

  async #show(savedId: string | null, savedNote: string): Promise<void> {
    if (savedId === null) return;
    if (this.note() === savedNote) this.note.set('');
    this.#isGoingOn = true;
    try {
      await this.#router.navigate(['/peers', savedId], { replaceUrl: true });
    } finally {
      this.#isGoingOn = false;
    }
  }
}
