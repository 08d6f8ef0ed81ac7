import { HttpClient } from '@angular/common/http';
import { Injectable, computed, inject, signal } from '@angular/core';
import { type Preferences, type Session, SessionReply, apiRoutes } from '@contract';
import { Subject, firstValueFrom } from 'rxjs';

export const defaultPreferences: Preferences = {
  theme: 'system',
  unit: 'millions',
  negatives: 'minus',
};

/** Who is signed in, in which workspace and with which roles; one for the whole application. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  readonly #http = inject(HttpClient);
  readonly #session = signal<Session | null>(null);
  readonly #ended = new Subject<void>();
  #loading: Promise<Session | null> | undefined;

  /** The session known here is over: what a store of the whole application holds of it has to go. */
  readonly ended = this.#ended.asObservable();

  /** Null when nobody is signed in, or before the first `load`. */
  readonly session = this.#session.asReadonly();
  readonly person = computed(() => this.#session()?.person ?? null);
  readonly workspace = computed(() => this.#session()?.workspace ?? null);
  readonly roles = computed(() => this.#session()?.roles ?? []);
  readonly preferences = computed(() => this.#session()?.preferences ?? defaultPreferences);

  /** Asks the server once; later calls share its answer until `forget`. Rejects when the server gives none. */
  load(): Promise<Session | null> {
    this.#loading ??= this.#read().catch((error: unknown) => {
      this.#loading = undefined;
      throw error;
    });
    return this.#loading;
  }

  /** Takes over the session that signing in, signing up or joining was answered with. */
  accept(reply: SessionReply): void {
    const before = this.#session();
    if (before !== null && !isSamePlace(before, reply.session)) this.#ended.next();
    this.#session.set(reply.session);
    this.#loading = Promise.resolve(reply.session);
  }

  /** Drops what is known: after signing out, and when the server says that the session has ended. */
  forget(): void {
    this.#session.set(null);
    this.#loading = undefined;
    this.#ended.next();
  }

  /** Shows the change at once and stores it; puts the old preferences back when it cannot be stored. */
  async changePreferences(change: Partial<Preferences>): Promise<void> {
    const session = this.#session();
    if (session === null) return;
    const preferences = { ...session.preferences, ...change };
    this.#session.set({ ...session, preferences });
    try {
      await firstValueFrom(this.#http.put(apiRoutes.changePreferences.path, preferences));
    } catch (error) {
      this.#session.set(session);
      throw error;
    }
  }

  async signOut(): Promise<void> {
    await firstValueFrom(this.#http.delete(apiRoutes.signOut.path));
    this.forget();
  }

  async #read(): Promise<Session | null> {
    const reply: unknown = await firstValueFrom(this.#http.get(apiRoutes.readSession.path));
    const { session } = SessionReply.parse(reply);
    this.#session.set(session);
    return session;
  }
}

function isSamePlace(before: Session, now: Session | null): boolean {
  return before.person.id === now?.person.id && before.workspace.id === now.workspace.id;
}
