import { Injectable, inject } from '@angular/core';
import { ImportMapping, noMending } from '@contract';
import * as z from 'zod';
import { SessionStore } from '../../api/session-store';

/** The number goes up when an older entry no longer tells what a newer one would. */
const storageKey = 'kinvale-mappings-1';
const mostKept = 30;

const Kept = z.array(z.object({ owner: z.string(), headers: z.string(), mapping: z.unknown() }));

/**
 * What the analyst said of a file's columns, kept in this browser by workspace and person: a file with the same header
 * is not asked about again. What was mended belongs to one file and is not kept.
 */
@Injectable({ providedIn: 'root' })
export class RememberedMapping {
  readonly #sessions = inject(SessionStore);

  remember(headers: readonly string[], mapping: ImportMapping): void {
    const place = { owner: this.#owner(), headers: JSON.stringify(headers) };
    const rest = readKept().filter(
      (kept) => kept.owner !== place.owner || kept.headers !== place.headers,
    );
    const kept = [{ ...place, mapping: { ...mapping, mending: noMending } }, ...rest];
    write(kept.slice(0, mostKept));
  }

  /** Undefined for headers not seen yet, and for an entry of another time that is no mapping any more. */
  recall(headers: readonly string[]): ImportMapping | undefined {
    const wanted = JSON.stringify(headers);
    const owner = this.#owner();
    const kept = readKept().find((one) => one.owner === owner && one.headers === wanted);
    return kept === undefined ? undefined : ImportMapping.safeParse(kept.mapping).data;
  }

  #owner(): string {
    const session = this.#sessions.session();
    return session === null ? '' : `${session.workspace.id} ${session.person.id}`;
  }
}

function readKept(): z.infer<typeof Kept> {
  try {
    return Kept.safeParse(JSON.parse(localStorage.getItem(storageKey) ?? '[]')).data ?? [];
  } catch (error) {
    // Storage may be switched off, and its text may be anything: then nothing is remembered.
    if (error instanceof SyntaxError || error instanceof DOMException) return [];
    throw error;
  }
}

function write(kept: z.infer<typeof Kept>): void {
  try {
    localStorage.setItem(storageKey, JSON.stringify(kept));
  } catch (error) {
    // Full or switched off: the mapping is asked for again next time.
    if (!(error instanceof DOMException)) throw error;
  }
}
