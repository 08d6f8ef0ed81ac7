import { DOCUMENT, Injectable, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { SessionStore } from '../../api/session-store';

const prefix = 'kv-peer-trial-';

/** Which trial of each workspace was looked at last: its id outlives a reload of the tab, and ends with the session. */
@Injectable({ providedIn: 'root' })
export class KeptTrial {
  readonly #storage = inject(DOCUMENT).defaultView?.sessionStorage;

  constructor() {
    inject(SessionStore)
      .ended.pipe(takeUntilDestroyed())
      .subscribe(() => {
        const keys = Object.keys(this.#storage ?? {}).filter((key) => key.startsWith(prefix));
        for (const key of keys) this.#storage?.removeItem(key);
      });
  }

  keep(workspaceId: string, trialId: string): void {
    this.#storage?.setItem(prefix + workspaceId, trialId);
  }

  recall(workspaceId: string): string | null {
    return this.#storage?.getItem(prefix + workspaceId) ?? null;
  }

  forget(workspaceId: string): void {
    this.#storage?.removeItem(prefix + workspaceId);
  }
}
