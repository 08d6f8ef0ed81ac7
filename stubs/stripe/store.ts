import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import type { WireCustomer, WireInvoice, WireSubscription } from './wire';

/** A card that the customer holds, by the id of the test payment method it came from. */
export interface StoredPaymentMethod {
  readonly id: string;
  readonly customer: string;
  readonly testCard: string;
}

/** The first answer to an idempotency key, and what was asked. */
export interface StoredAnswer {
  readonly request: string;
  readonly status: number;
  readonly body: string;
  readonly created: number;
}

/** Everything the stub remembers. Records keep the order of creation. */
export interface StubState {
  readonly version: 1;
  readonly customers: Record<string, WireCustomer>;
  readonly paymentMethods: Record<string, StoredPaymentMethod>;
  readonly subscriptions: Record<string, WireSubscription>;
  readonly invoices: Record<string, WireInvoice>;
  answers: Record<string, StoredAnswer>;
}

/** Holds the state in memory and, with a path, in a file replaced whole at every change. */
export class Store {
  #state: StubState;

  constructor(private readonly path?: string) {
    if (path !== undefined) mkdirSync(dirname(path), { recursive: true });
    this.#state = path !== undefined && existsSync(path) ? readState(path) : emptyState();
  }

  /** Runs `work` on a copy; keeps the copy only if `work` succeeds and the file is written. */
  change<T>(work: (state: StubState) => T): T {
    const draft = structuredClone(this.#state);
    const result = work(draft);
    if (this.path !== undefined) {
      const written = `${this.path}.${process.pid}.tmp`;
      writeFileSync(written, JSON.stringify(draft), { mode: 0o600, flush: true });
      renameSync(written, this.path);
    }
    this.#state = draft;
    return result;
  }

  read<T>(work: (state: Readonly<StubState>) => T): T {
    return work(this.#state);
  }
}

function emptyState(): StubState {
  return {
    version: 1,
    customers: {},
    paymentMethods: {},
    subscriptions: {},
    invoices: {},
    answers: {},
  };
}

function readState(path: string): StubState {
  const found = JSON.parse(readFileSync(path, 'utf8')) as Partial<StubState> | null;
  const wanted = emptyState();
  const missing = Object.keys(wanted).filter(
    (key) => found?.[key as keyof StubState] === undefined,
  );
  if (found?.version !== 1 || missing.length > 0) {
    throw new Error(
      `expected the stub's state, version 1, in ${path}; found version ${String(found?.version)}` +
        (missing.length > 0 ? `, without ${missing.join(', ')}` : ''),
    );
  }
  return found as StubState;
}
