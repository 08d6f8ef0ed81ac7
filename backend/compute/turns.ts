/** Lets so many pieces of work run at once and the others wait, first come first served. */
export class Turns {
  #running = 0;
  readonly #waiting: (() => void)[] = [];

  constructor(private readonly most: number) {}

  /**
   * Runs the work when its turn comes.
   *
   * @throws the signal's reason where it is aborted before; work that has begun minds the signal itself.
   */
  async take<T>(work: () => Promise<T>, signal?: AbortSignal): Promise<T> {
    if (this.#running >= this.most) await this.#wait(signal);
    else this.#running += 1;
    try {
      signal?.throwIfAborted();
      return await work();
    } finally {
      const next = this.#waiting.shift();
      // The turn goes to the next one; nobody who comes in between takes it.
      if (next === undefined) this.#running -= 1;
      else next();
    }
  }

  #wait(signal: AbortSignal | undefined): Promise<void> {
    return new Promise((resolve, reject) => {
      const begin = (): void => {
        signal?.removeEventListener('abort', leave);
        resolve();
      };
      const leave = (): void => {
        this.#waiting.splice(this.#waiting.indexOf(begin), 1);
        const reason: unknown = signal?.reason;
        reject(reason instanceof Error ? reason : new Error('cancelled while waiting'));
      };
      if (signal?.aborted === true) {
        reject(signal.reason as Error);
        return;
      }
      signal?.addEventListener('abort', leave, { once: true });
      this.#waiting.push(begin);
    });
  }
}
