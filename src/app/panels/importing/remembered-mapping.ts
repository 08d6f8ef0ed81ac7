import { Injectable, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { ImportMapping } from '@contract';
import { SessionStore } from '../../api/session-store';

/**
 * What the analyst said of a file's columns, kept until the session ends: a mended file with the same header
 * is not asked about again.
 */
@Injectable({ providedIn: 'root' })
export class RememberedMapping {
  readonly #byHeader = new Map<string, ImportMapping>();

  constructor() {
    inject(SessionStore)
      .ended.pipe(takeUntilDestroyed())
      .subscribe(() => {
        this.#byHeader.clear();
      });
  }

  remember(headers: readonly string[], mapping: ImportMapping): void {
    this.#byHeader.set(keyOf(headers), mapping);
  }

  recall(headers: readonly string[]): ImportMapping | undefined {
    return this.#byHeader.get(keyOf(headers));
  }
}

function keyOf(headers: readonly string[]): string {
  return JSON.stringify(headers);
}
