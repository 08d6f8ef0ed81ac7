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
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { apiRoutes, mayCall } from '@contract';
import { SessionStore } from '../api/session-store';
import { Confirm } from '../ui/confirm';
import { EmptyState } from '../ui/empty-state';
import { catchLostFocus } from '../ui/lost-focus';
import { Mark } from '../ui/mark';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { counted } from '../ui/phrases';
import { ProblemNotice } from '../ui/problem-notice';
import { noFilters } from './candidates/candidate-filters';
import { CandidatesStore } from './candidates/candidates-store';
import { FilterBar } from './candidates/filter-bar';
import { GroupRemarks } from './guidance/group-remarks';
import { NearnessBar } from './nearness/nearness-bar';
import { NearnessStore } from './nearness/nearness-store';
import { writtenCount } from './peer-draft';
import { PeerGround } from './peer-ground';
import { peersContext } from './peers-context';
import { type PeersShown, peersShown } from './peers-shown';
import { PeersStore } from './peers-store';
import { PlaneSection } from './plane/plane-section';
import { AskReason } from './reasons/ask-reason';
import { MissingReasons } from './reasons/missing-reasons';
import { PeerSides } from './sides/peer-sides';
import { TrialSection } from './trials/trial-section';
import { PanelChanges } from './versions/panel-changes';
import { PeerVersions } from './versions/peer-versions';

/** Who do we compare ourselves with, and why? */
@Component({
  selector: 'kv-peers-page',
  imports: [
    EmptyState,
    FilterBar,
    GroupRemarks,
    Mark,
    MatButton,
    MissingReasons,
    NearnessBar,
    PageHeader,
    PanelChanges,
    PeerGround,
    PeerSides,
    PeerVersions,
    PlaneSection,
    ProblemNotice,
    RouterLink,
    TrialSection,
  ],
  templateUrl: './peers-page.html',
  styleUrl: './peers-page.css',
  providers: [PeersStore, NearnessStore, CandidatesStore],
  host: { '(window:beforeunload)': 'holdBack($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeersPage {
  readonly #context = inject(PageContext);
  readonly #session = inject(SessionStore);
  readonly #router = inject(Router);
  readonly #confirm = inject(Confirm);
  readonly #injector = inject(Injector);
  readonly #askReason = inject(AskReason);
  protected readonly store = inject(PeersStore);
  protected readonly nearness = inject(NearnessStore);
  protected readonly candidates = inject(CandidatesStore);

  /** The version to show; the newest where the address names none. */
  readonly peerGroupId = input<string>();
  /** The company whose reason is asked for, from the address. */
  readonly company = input<string>();

  private readonly sides = viewChild(PeerSides);
  private readonly counts = viewChild<ElementRef<HTMLElement>>('counts');

  protected readonly note = signal('');
  /** What was done last with several companies at once, for the ear. */
  protected readonly said = signal('');
  protected readonly hasAllParts = signal(false);
  protected readonly isReadOnly = computed(
    () => !mayCall(apiRoutes.savePeerGroup, this.#session.roles()),
  );
  protected readonly shown = computed<PeersShown | null>(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return null;
    const listed = {
      members: this.candidates.members(),
      candidates: this.candidates.candidates(),
      hasAllCandidates: this.candidates.hasAll(),
    };
    return peersShown(view.ground, view.draft, listed, this.nearness.nearness());
  });
  /** The panel version that the saved peers stand on, and the newest of the same panel, where they differ. */
  protected readonly panelsApart = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready' || view.ground.saved === null) return null;
    const { panelVersions, saved } = view.ground;
    const older = panelVersions.find(({ id }) => id === saved.panelVersionId);
    const newer = panelVersions.find(({ panelId }) => panelId === older?.panelId);
    if (newer === undefined || older === undefined || newer === older) return null;
    const peers = saved.peers.filter(({ isIncluded }) => isIncluded);
    return { older, newer, companies: [saved.ownCompany, ...peers.map(({ company }) => company)] };
  });

  readonly #isReady = computed(() => this.store.view().kind === 'ready');

  constructor() {
    effect(() => {
      const company = this.company();
      if (company === undefined || !this.#isReady()) return;
      untracked(() => this.lookAt(company));
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
    this.sides()?.focusReason(company);
  }

  /** Brings a company's reason into view; where it is filtered away or the lists stop short of it, its name is asked for. */
  protected lookAt(company: string): void {
    if (!this.#isListed(company)) this.candidates.listAll();
    const isKnown = this.store.companies().some(({ name }) => name === company);
    if (!this.#isListed(company) && isKnown && company !== this.store.ownCompany())
      this.candidates.filter({ ...noFilters, name: company });
    afterNextRender(() => this.focusReason(company), { injector: this.#injector });
  }

  #isListed(company: string): boolean {
    const { inside, outside } = this.shown() ?? { inside: [], outside: [] };
    return [...inside, ...outside].some((row) => row.company.name === company);
  }

  /** Puts several companies on one side once a reason for all of them is written. */
  protected async moveAll(companies: readonly string[], isIncluded: boolean): Promise<void> {
    const view = this.store.view();
    if (view.kind !== 'ready' || companies.length === 0) return;
    const who = counted(companies.length, 'company', 'companies');
    const answer = await this.#askReason.ask({
      title: isIncluded ? `Why ${who} in?` : `Why ${who} out?`,
      companies,
      action: isIncluded ? `Take ${companies.length} in` : `Leave ${companies.length} out`,
      reasons: this.store.reasons(),
      written: writtenCount(view.draft, companies, isIncluded),
    });
    if (answer === null) return;
    this.store.changeAll(companies, { isIncluded, ...answer });
    this.said.set(isIncluded ? `${who} taken in.` : `${who} left out.`);
    this.sides()?.catchFocus(isIncluded);
  }

  /** The button leaves with the changes: the focus goes to what the choice is now. */
  protected discard(): void {
    this.store.discardChanges();
    this.said.set('The changes are discarded.');
    catchLostFocus(this.#injector, () => this.counts()?.nativeElement);
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
    if (savedId === null) {
      catchLostFocus(this.#injector, () => this.counts()?.nativeElement);
      return;
    }
    if (this.note() === savedNote) this.note.set('');
    this.#isGoingOn = true;
    try {
      await this.#router.navigate(['/peers', savedId], { replaceUrl: true });
      const view = this.store.view();
      if (view.kind === 'ready' && view.ground.saved !== null)
        this.said.set(`Version ${view.ground.saved.number} saved.`);
    } finally {
      this.#isGoingOn = false;
    }
  }
}
