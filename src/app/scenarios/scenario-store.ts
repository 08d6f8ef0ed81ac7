import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { type ScenarioReply, apiRoutes, mayCall } from '@contract';
import { type Observable, Subject, firstValueFrom, startWith, switchMap } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { ScenariosApi } from '../api/scenarios-api';
import { SessionStore } from '../api/session-store';
import { ProblemBannerState } from '../ui/problem';
import { readPlan } from '../ui/plan/read-plan';
import { tQuantile } from '../ui/plan/t-quantile';
import { DraftKeeper } from './draft-keeper';
import { yearsThatDiffer } from './figures-agree';
import {
  type ScenarioAddress,
  type ScenarioGround,
  ScenarioGrounds,
  type ScenarioView,
  isSameGround,
} from './scenario-ground';
import {
  type ScenarioText,
  type StoredText,
  copyName,
  draftOf,
  isSameText,
  noText,
  storedText,
  toStoredText,
  toText,
  withScenario,
} from './scenario-text';

/** What the server said of the figures when the plan was saved. */
export type Confirmation =
  | { readonly kind: 'agrees'; readonly version: number }
  | { readonly kind: 'differs'; readonly version: number; readonly years: readonly number[] };

/** One plan on one fit: what is stored, what is on the page, and the way between them. */
@Injectable()
export class ScenarioStore {
  readonly #api = inject(ScenariosApi);
  readonly #banner = inject(ProblemBannerState);
  readonly #page = inject(DestroyRef);
  readonly #drafts = inject(DraftKeeper);
  readonly #grounds = inject(ScenarioGrounds);
  readonly #sessions = inject(SessionStore);
  readonly #addresses = new Subject<ScenarioAddress>();
  #address: ScenarioAddress = { scenarioId: null, fitId: null };
  readonly #view = signal<ScenarioView>({ kind: 'loading' });
  readonly #text = signal<ScenarioText>(noText);
  readonly #restoredAt = signal<string | null>(null);
  readonly #setAside = signal<ScenarioText | null>(null);
  readonly #conflict = signal<ApiProblem | null>(null);
  readonly #problem = signal<ApiProblem | null>(null);
  readonly #confirmation = signal<Confirmation | null>(null);
  readonly #isSaving = signal(false);

  readonly view = this.#view.asReadonly();
  readonly text = this.#text.asReadonly();
  /** When the draft that came back was kept; null when the page began with what is stored. */
  readonly restoredAt = this.#restoredAt.asReadonly();
  /** One's own plan while somebody else's version is looked at. */
  readonly setAside = this.#setAside.asReadonly();
  readonly conflict = this.#conflict.asReadonly();
  readonly problem = this.#problem.asReadonly();
  readonly confirmation = this.#confirmation.asReadonly();
  readonly isSaving = this.#isSaving.asReadonly();
  readonly draftState = this.#drafts.state;

  readonly maySave = computed(() => mayCall(apiRoutes.saveScenario, this.#sessions.roles()));
  readonly ground = computed(() => {
    const view = this.#view();
    return view.kind === 'ready' ? view.ground : null;
  });
  readonly reading = computed(() => {
    const ground = this.ground();
    return ground === null ? null : readPlan(ground.basis, this.#text().plan, tQuantile);
  });
  readonly isChanged = computed(() => {
    const ground = this.ground();
    return ground !== null && !isSameText(this.#text(), storedText(ground));
  });

  constructor() {
    this.#addresses
      .pipe(
        switchMap((address): Observable<ScenarioView> =>
          this.#grounds.read(address).pipe(startWith<ScenarioView>({ kind: 'loading' })),
        ),
        takeUntilDestroyed(),
      )
      .subscribe((view) => this.#show(view));
  }

  /** Opens what the address names, unless it is what the page shows already. */
  open(address: ScenarioAddress): void {
    const ground = this.ground();
    const isShown =
      ground !== null &&
      (ground.saved?.id ?? null) === address.scenarioId &&
      (address.scenarioId !== null || ground.fit.fit.id === address.fitId);
    if (isShown) return;
    void this.#drafts.flush();
    this.#address = address;
    this.#addresses.next(address);
  }

  /** Reads once more what was asked for last, after it could not be read. */
  retry(): void {
    this.#addresses.next(this.#address);
  }

  change(change: Partial<ScenarioText>): void {
    this.#text.update((text) => ({ ...text, ...change }));
    this.#confirmation.set(null);
    this.#keepDraft();
  }

  /** @returns the stored scenario, or null when it could not be stored. */
  save(): Promise<ScenarioReply | null> {
    return this.#store((ground, text) =>
      ground.saved === null
        ? this.#api.save({ fitId: ground.fit.fit.id, ...text })
        : this.#api.change(ground.saved.id, { ...text, version: ground.saved.version }),
    );
  }

  /** Stores the plan on the page beside the scenario that is open. */
  async saveAsCopy(): Promise<ScenarioReply | null> {
    const opened = this.ground()?.saved ?? null;
    const copy = await this.#store((ground, text) =>
      this.#api.save({
        fitId: ground.fit.fit.id,
        ...text,
        name: copyName(text.name),
        keepsDraft: true,
      }),
    );
    if (copy !== null && opened !== null)
      await this.#guarded(() => this.#drafts.discard(copy.fitId, opened.id));
    return copy;
  }

  /** Shows the version that somebody else stored meanwhile; one's own stays as a draft and can be brought back. */
  async openTheirs(): Promise<void> {
    const ground = this.ground();
    const saved = ground?.saved;
    if (!saved) return;
    this.#keepDraft();
    await this.#drafts.flush();
    await this.#guarded(async () => {
      const theirs = await firstValueFrom(this.#api.read(saved.id));
      if (!this.#isShown(ground)) return;
      this.#patchGround(theirs);
      this.#setAside.set(this.#setAside() ?? this.#text());
      this.#text.set(toText(theirs));
      this.#conflict.set(null);
    });
  }

  bringBack(): void {
    const mine = this.#setAside();
    if (mine === null) return;
    this.#setAside.set(null);
    this.change(mine);
  }

  /** Goes back to what is stored, or for a new plan to the base. */
  async discard(): Promise<void> {
    const ground = this.ground();
    if (ground === null) return;
    const given = this.#text();
    await this.#guarded(async () => {
      await this.#drafts.discard(ground.fit.fit.id, ground.saved?.id ?? null);
      if (!this.#isShown(ground)) return;
      if (this.#text() === given) this.#text.set(storedText(ground));
      else this.#keepDraft();
      this.#restoredAt.set(null);
      this.#setAside.set(null);
      this.#conflict.set(null);
      this.#confirmation.set(null);
    });
  }

  /** @returns whether it is gone. */
  async remove(scenario: ScenarioReply): Promise<boolean> {
    const ground = this.ground();
    const isGone = await this.#guarded(async () => {
      if (scenario.id === ground?.saved?.id) await this.#drafts.drop();
      await firstValueFrom(this.#api.delete(scenario.id), { defaultValue: undefined });
    });
    if (!isGone) this.#keepEdit(ground);
    else this.#patchScenarios((scenarios) => scenarios.filter(({ id }) => id !== scenario.id));
    return isGone;
  }

  /** @returns whether it is back. */
  restore(scenario: ScenarioReply): Promise<boolean> {
    return this.#guarded(async () => {
      const back = await firstValueFrom(this.#api.restore(scenario.id));
      if (this.ground()?.fit.fit.id !== back.fitId) return;
      this.#patchScenarios((scenarios) => withScenario(scenarios, back));
    });
  }

  /** @returns the copy, or null when there is none. */
  async copy(scenario: ScenarioReply): Promise<ScenarioReply | null> {
    let copy: ScenarioReply | null = null;
    await this.#guarded(async () => {
      copy = await firstValueFrom(this.#api.copy(scenario.id));
    });
    return copy;
  }

  dismissProblem(): void {
    this.#problem.set(null);
  }

  async #store(
    send: (ground: ScenarioGround, text: StoredText) => Observable<ScenarioReply>,
  ): Promise<ScenarioReply | null> {
    const [ground, reading] = [this.ground(), this.reading()];
    if (ground === null || reading === null || this.#isSaving()) return null;
    const sent = this.#text();
    this.#isSaving.set(true);
    this.#conflict.set(null);
    let stored: ScenarioReply | null = null;
    await this.#guarded(async () => {
      await this.#drafts.drop();
      const reply = await firstValueFrom(send(ground, toStoredText(sent)));
      stored = reply;
      if (!this.#isShown(ground)) return;
      this.#patchGround(reply);
      this.#restoredAt.set(null);
      this.#setAside.set(null);
      // What was changed while the reply was on its way is not saved: it stays, as a draft of what now is.
      if (!isSameText(this.#text(), sent)) {
        this.#keepDraft();
        if (ground.saved === null) await this.#drafts.discard(ground.fit.fit.id, null);
        return;
      }
      this.#text.set(toText(reply));
      const years = yearsThatDiffer(reading.years, reply.years);
      this.#confirmation.set(
        years.length === 0
          ? { kind: 'agrees', version: reply.version }
          : { kind: 'differs', version: reply.version, years },
      );
    });
    this.#isSaving.set(false);
    if (stored === null) this.#keepEdit(ground, sent);
    return stored;
  }

  /** Runs a change; its problem stays beside what was entered, and goes to the banner when the page has gone on. */
  async #guarded(work: () => Promise<void>): Promise<boolean> {
    const ground = this.ground();
    this.#problem.set(null);
    try {
      await work();
      return true;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      if (!this.#isShown(ground)) this.#banner.report(error.shown);
      else if (error.slug === 'stale-version') this.#conflict.set(error);
      else this.#problem.set(error);
      return false;
    }
  }

  #show(view: ScenarioView): void {
    this.#view.set(view);
    this.#setAside.set(null);
    this.#conflict.set(null);
    this.#problem.set(null);
    this.#confirmation.set(null);
    if (view.kind !== 'ready') return;
    const stored = storedText(view.ground);
    const { draft } = view.ground;
    const isRestored = draft !== null && !isSameText(draft, stored);
    this.#text.set(isRestored ? toText(draft) : stored);
    this.#restoredAt.set(isRestored ? draft.updatedAt : null);
  }

  /** While somebody else's version is looked at the draft is one's own plan, and no edit of theirs takes its place. */
  #keepDraft(): void {
    const ground = this.ground();
    if (ground === null || !this.maySave() || this.#setAside() !== null) return;
    this.#drafts.keep(draftOf(ground, this.#text()));
  }

  /** Keeps the draft again that a failed change had dropped; `sent` when the page has gone on to another plan. */
  #keepEdit(ground: ScenarioGround | null, sent?: ScenarioText): void {
    if (this.#isShown(ground)) {
      if (this.isChanged()) this.#keepDraft();
    } else if (ground !== null && sent !== undefined) {
      void this.#drafts.flush();
      this.#drafts.keep(draftOf(ground, sent));
      void this.#drafts.flush();
    }
  }

  /** Whether a reply for this ground still finds it on the page. */
  #isShown(ground: ScenarioGround | null): boolean {
    return !this.#page.destroyed && isSameGround(ground, this.ground());
  }

  #patchGround(saved: ScenarioReply): void {
    this.#patch((ground) => ({
      ...ground,
      saved,
      draft: null,
      scenarios: withScenario(ground.scenarios, saved),
    }));
  }

  #patchScenarios(change: (scenarios: readonly ScenarioReply[]) => readonly ScenarioReply[]): void {
    this.#patch((ground) => ({ ...ground, scenarios: change(ground.scenarios) }));
  }

  #patch(change: (ground: ScenarioGround) => ScenarioGround): void {
    this.#view.update((view) =>
      view.kind === 'ready' ? { kind: 'ready', ground: change(view.ground) } : view,
    );
  }
}
