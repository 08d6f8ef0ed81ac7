import { Injectable, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Scatter } from '@panel-data';
import { SessionStore } from '../../api/session-store';

/** How the analyst wants nearness measured. */
export interface NearnessChoice {
  /** Keys of the measures that count; null for the five of the model. */
  readonly measures: readonly string[] | null;
  readonly scatter: Scatter;
}

/** The choice of each workspace, kept until the session ends. */
@Injectable({ providedIn: 'root' })
export class RememberedNearness {
  readonly #byWorkspace = new Map<string, NearnessChoice>();

  constructor() {
    inject(SessionStore)
      .ended.pipe(takeUntilDestroyed())
      .subscribe(() => {
        this.#byWorkspace.clear();
      });
  }

  remember(workspaceId: string, choice: NearnessChoice): void {
    this.#byWorkspace.set(workspaceId, choice);
  }

  recall(workspaceId: string): NearnessChoice | undefined {
    return this.#byWorkspace.get(workspaceId);
  }
}
