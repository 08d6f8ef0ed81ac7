import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { ScenarioReply } from '@contract';
import { type Observable, Subject, firstValueFrom, startWith, switchMap } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { ScenariosApi } from '../api/scenarios-api';
import { DraftKeeper } from './draft-keeper';
import { DraftOrigins } from './draft-origins';
import { yearsThatDiffer } from './figures-agree';
import { noHistory } from './plan-history';
import { ScenarioEdits } from './scenario-edits';
import {
  type ScenarioAddress,
  type ScenarioGround,
  ScenarioGrounds,
  type ScenarioView,
} from './scenario-ground';
import { ScenarioState } from './scenario-state';
import {
  type ScenarioText,
  type StoredText,
  copyName,
  isSameText,
  storedText,
  toStoredText,
  toText,
} from './scenario-text';

/** One plan on one fit: opened, saved, and brought together with what somebody else saved. */
@Injectable()
export class ScenarioStore {
  readonly #api = inject(ScenariosApi);
  readonly #drafts = inject(DraftKeeper);
  readonly #edits = inject(ScenarioEdits);
  readonly #grounds = inject(ScenarioGrounds);
  readonly #origins = inject(DraftOrigins);
  readonly #state = inject(ScenarioState);
  readonly #addresses = new Subject<ScenarioAddress>();
  #address: ScenarioAddress = { scenarioId: null, fitId: null };
  readonly #isSaving = signal(false);

  readonly view = this.#state.view.asReadonly();
  readonly text = this.#state.text.asReadonly();
  readonly restoredAt = this.#state.restoredAt.asReadonly();
  readonly problem = this.#state.problem.asReadonly();
  readonly confirmation = this.#state.confirmation.asReadonly();
  readonly maySave = this.#state.maySave;
  readonly ground = this.#state.ground;
  readonly reading = this.#state.reading;
  readonly isChanged = this.#state.isChanged;
  readonly theirs = this.#state.theirs;
  readonly isSaving = this.#isSaving.asReadonly();
  readonly draftState = this.#drafts.state;

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

  /** @returns the stored scenario; null when it could not be stored, or when somebody else's version is to be met first. */
  async save(): Promise<ScenarioReply | null> {
    if (this.theirs() !== null) return null;
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
    if (copy !== null && opened !== null) {
      this.#origins.forget(opened.id);
      await this.#state.guarded(() => this.#drafts.discard(copy.fitId, opened.id));
    }
    return copy;
  }

  /** Goes on from the version that somebody else stored, with what was chosen of both; it is not saved yet. */
  meetTheirs(chosen: ScenarioText): void {
    const theirs = this.theirs();
    if (theirs === null) return;
    this.#state.origin.set(theirs.version);
    const { name, note, ...asked } = chosen;
    this.#edits.change(asked, { words: 'what was chosen of both versions' });
    this.#edits.rename({ name, note });
  }

  /** Goes back to what is stored, or for a new plan to the base. */
  async discard(): Promise<void> {
    const ground = this.ground();
    if (ground === null) return;
    const given = this.text();
    await this.#state.guarded(async () => {
      await this.#drafts.discard(ground.fit.fit.id, ground.saved?.id ?? null);
      if (!this.#state.isShown(ground)) return;
      if (this.text() === given) this.#begin(ground, storedText(ground));
      else this.#edits.keepDraft();
      this.#state.restoredAt.set(null);
      this.#state.confirmation.set(null);
    });
  }

  dismissProblem(): void {
    this.#state.problem.set(null);
  }

  async #store(
    send: (ground: ScenarioGround, text: StoredText) => Observable<ScenarioReply>,
  ): Promise<ScenarioReply | null> {
    const [ground, reading] = [this.ground(), this.reading()];
    if (ground === null || reading === null || this.#isSaving()) return null;
    const sent = this.text();
    this.#isSaving.set(true);
    let stored: ScenarioReply | null = null;
    await this.#state.guarded(async () => {
      await this.#drafts.drop();
      const reply = await this.#sent(send(ground, toStoredText(sent)), ground);
      if (reply === null) return;
      stored = reply;
      this.#origins.forget(reply.id);
      if (!this.#state.isShown(ground)) return;
      this.#state.setSaved(reply);
      this.#state.origin.set(reply.version);
      this.#state.restoredAt.set(null);
      // What was changed while the reply was on its way is not saved: it stays, as a draft of what now is.
      if (!isSameText(this.text(), sent)) {
        this.#edits.keepDraft();
        if (ground.saved === null) await this.#drafts.discard(ground.fit.fit.id, null);
        return;
      }
      this.#state.text.set(toText(reply));
      const years = yearsThatDiffer(reading.years, reply.years);
      this.#state.confirmation.set(
        years.length === 0
          ? { kind: 'agrees', version: reply.version }
          : { kind: 'differs', version: reply.version, years },
      );
    });
    this.#isSaving.set(false);
    if (stored === null) this.#edits.keepEdit(ground, sent);
    return stored;
  }

  /** Null where somebody else saved first and the plan is still on the page: then both versions stand on it. */
  async #sent(
    reply: Observable<ScenarioReply>,
    ground: ScenarioGround,
  ): Promise<ScenarioReply | null> {
    try {
      return await firstValueFrom(reply);
    } catch (error) {
      const isStale = error instanceof ApiProblem && error.slug === 'stale-version';
      if (!isStale || ground.saved === null || !this.#state.isShown(ground)) throw error;
      const theirs = await firstValueFrom(this.#api.read(ground.saved.id));
      if (this.#state.isShown(ground)) this.#state.setSaved(theirs);
      return null;
    }
  }

  #show(view: ScenarioView): void {
    this.#state.view.set(view);
    this.#state.problem.set(null);
    this.#state.confirmation.set(null);
    this.#state.history.set(noHistory);
    if (view.kind !== 'ready') return;
    const stored = storedText(view.ground);
    const { draft, saved } = view.ground;
    const isRestored = draft !== null && !isSameText(draft, stored);
    this.#state.text.set(isRestored ? toText(draft) : stored);
    this.#state.restoredAt.set(isRestored ? draft.updatedAt : null);
    this.#state.origin.set(isRestored ? this.#originOf(draft, saved) : (saved?.version ?? null));
  }

  /** The version that a draft began with; where this browser does not know, the times tell. */
  #originOf(draft: { readonly updatedAt: string }, saved: ScenarioReply | null): number | null {
    if (saved === null) return null;
    const isOlder = draft.updatedAt < saved.updatedAt;
    return this.#origins.read(saved.id) ?? (isOlder ? saved.version - 1 : saved.version);
  }

  #begin(ground: ScenarioGround, text: ScenarioText): void {
    if (ground.saved !== null) this.#origins.forget(ground.saved.id);
    this.#state.origin.set(ground.saved?.version ?? null);
    this.#state.history.set(noHistory);
    this.#state.text.set(text);
  }
}
