import { randomBytes } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';

/** OWASP's least for argon2id: 19 MiB, two passes, one lane. */
const parameters = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Hashes run in the thread pool that everything else shares: more at once would make signing in a way to stall it. */
const mostAtOnce = 2;

export class Passwords {
  #running = 0;
  readonly #waiting: (() => void)[] = [];
  /** A hash of nothing anybody knows, so that an unknown address takes as long as a wrong password. */
  readonly #dummy = hash(randomBytes(32), parameters);

  hash(password: string): Promise<string> {
    return this.#limited(() => hash(password, parameters));
  }

  async matches(stored: string | undefined, password: string): Promise<boolean> {
    const against = stored ?? (await this.#dummy);
    const isRight = await this.#limited(() => verify(against, password));
    return isRight && stored !== undefined;
  }

  async #limited<T>(work: () => Promise<T>): Promise<T> {
    if (this.#running >= mostAtOnce)
      await new Promise<void>((resolve) => this.#waiting.push(resolve));
    this.#running++;
    try {
      return await work();
    } finally {
      this.#running--;
      this.#waiting.shift()?.();
    }
  }
}
