import { DOCUMENT, Injectable, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import * as z from 'zod';
import { SessionStore } from '../api/session-store';
import { Composition } from './composition';

const prefix = 'kv-composition:';

const KeptText = z.object({ personId: z.string(), composition: Composition });

/**
 * What was composed and not published, by fit. It may be inside information, so it lives in the tab alone: it outlives a
 * reload, and nothing of it is left on the computer once the tab is closed or the person has signed out.
 */
@Injectable({ providedIn: 'root' })
export class KeptComposition {
  readonly #sessions = inject(SessionStore);
  readonly #storage = inject(DOCUMENT).defaultView?.sessionStorage;

  constructor() {
    this.#sessions.ended.pipe(takeUntilDestroyed()).subscribe(() => {
      const keys = Object.keys(this.#storage ?? {}).filter((key) => key.startsWith(prefix));
      for (const key of keys) this.#storage?.removeItem(key);
    });
  }

  keep(fitId: string, composition: Composition): void {
    const personId = this.#sessions.person()?.id ?? '';
    this.#storage?.setItem(prefix + fitId, JSON.stringify({ personId, composition }));
  }

  drop(fitId: string): void {
    this.#storage?.removeItem(prefix + fitId);
  }

  /** Null where nothing is kept, or by another person. */
  recall(fitId: string): Composition | null {
    const text = this.#storage?.getItem(prefix + fitId) ?? null;
    if (text === null) return null;
    const kept = KeptText.safeParse(JSON.parse(text));
    const isOwn = kept.success && kept.data.personId === (this.#sessions.person()?.id ?? '');
    return isOwn ? kept.data.composition : null;
  }
}
