interface Waiting {
  readonly begin: () => void;
}

/**
 * Lets so many pieces of work run at once, one an owner, and the others wait. Owners who wait take turns, whoever ended
 * a piece last behind the others; the pieces of one owner are first come first served.
 */
export class Turns {
  readonly #running = new Set<string>();
  /** By owner, in the order in which the owners come next; none is empty. */
  readonly #waiting = new Map<string, Waiting[]>();

  constructor(private readonly most: number) {}

  /**
   * Runs the work when its turn comes.
   *
   * @param owner  whose pieces of work run one after another.
   * @throws the signal's reason where it is aborted before; work that has begun minds the signal itself.
   */
  async take<T>(owner: string, work: () => Promise<T>, signal?: AbortSignal): Promise<T> {
    if (this.#running.size >= this.most || this.#running.has(owner))
      await this.#wait(owner, signal);
    else this.#running.add(owner);
    try {
      signal?.throwIfAborted();
      return await work();
    } finally {
      this.#pass(owner);
    }
  }

  /** The turn goes to the next one; nobody who comes in between takes it. */
  #pass(owner: string): void {
    this.#running.delete(owner);
    const own = this.#waiting.get(owner);
    if (own !== undefined) {
      this.#waiting.delete(owner);
      this.#waiting.set(owner, own);
    }
    for (const [next, list] of this.#waiting) {
      if (this.#running.has(next)) continue;
      this.#running.add(next);
      const [first] = list;
      this.#leave(next, first);
      first.begin();
      return;
    }
  }

  #wait(owner: string, signal: AbortSignal | undefined): Promise<void> {
    return new Promise((resolve, reject) => {
      const waiting: Waiting = {
        begin: () => {
          signal?.removeEventListener('abort', giveUp);
          resolve();
        },
      };
      const giveUp = (): void => {
        this.#leave(owner, waiting);
        const reason: unknown = signal?.reason;
        reject(reason instanceof Error ? reason : new Error('cancelled while waiting'));
      };
      if (signal?.aborted === true) {
        reject(signal.reason as Error);
        return;
      }
      signal?.addEventListener('abort', giveUp, { once: true });
      const list = this.#waiting.get(owner);
      if (list === undefined) this.#waiting.set(owner, [waiting]);
      else list.push(waiting);
    });
  }

  #leave(owner: string, waiting: Waiting): void {
    const rest = this.#waiting.get(owner)?.filter((other) => other !== waiting) ?? [];
    if (rest.length === 0) this.#waiting.delete(owner);
    else this.#waiting.set(owner, rest);
  }
}
