import { Injectable } from '@angular/core';
import type { ImportMapping } from '@contract';

/**
 * What the analyst said of a file's columns, kept while the application is open: a mended file with the same header
 * is not asked about again.
 */
@Injectable({ providedIn: 'root' })
export class RememberedMapping {
  readonly #byHeader = new Map<string, ImportMapping>();

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
