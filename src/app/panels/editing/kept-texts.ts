import { DOCUMENT, Injectable, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { SessionStore } from '../../api/session-store';

const prefix = 'kv-panel-';

/**
 * What a person has begun on a panel, as JSON texts: it outlives a reload of the tab, and a session that ends for as
 * long as the page stays open. Nothing is left in the browser's storage after signing out.
 */
@Injectable({ providedIn: 'root' })
export class KeptTexts {
  readonly #storage = inject(DOCUMENT).defaultView?.sessionStorage;
  readonly #texts = new Map<string, string>();

  constructor() {
    inject(SessionStore)
      .ended.pipe(takeUntilDestroyed())
      .subscribe(() => {
        const keys = Object.keys(this.#storage ?? {}).filter((key) => key.startsWith(prefix));
        for (const key of keys) this.#storage?.removeItem(key);
      });
  }

  /** @returns whether it would outlive a reload: the browser may have no room for very much. */
  put(name: string, content: unknown): boolean {
    const key = prefix + name;
    const text = JSON.stringify(content);
    this.#texts.set(key, text);
    try {
      this.#storage?.setItem(key, text);
      return true;
    } catch (error) {
      if (!(error instanceof DOMException) || error.name !== 'QuotaExceededError') throw error;
      this.#storage?.removeItem(key);
      return false;
    }
  }

  /** Null where nothing, or nothing legible, is kept. */
  read(name: string): unknown {
    const key = prefix + name;
    const text = this.#texts.get(key) ?? this.#storage?.getItem(key);
    return text == null ? null : readJson(text);
  }

  remove(name: string): void {
    const key = prefix + name;
    this.#texts.delete(key);
    this.#storage?.removeItem(key);
  }
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
