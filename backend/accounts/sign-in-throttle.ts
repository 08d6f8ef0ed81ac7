import type { Repositories } from '../../db/repositories/repositories';
import { TooManyRequests } from '../errors/app-error';

const freeFailures = 5;
const longestDelayMs = 60_000;
const forgetAfterMs = 15 * 60_000;

/**
 * Slows guessing down without locking anybody out: after five failures each further one doubles the wait, up to a
 * minute, for the account and for the address apart.
 */
export class SignInThrottle {
  constructor(
    private readonly repositories: Repositories,
    private readonly now: () => Date,
  ) {}

  /** @throws {TooManyRequests} while the wait lasts. */
  async assertMayTry(keys: readonly string[]): Promise<void> {
    for (const key of keys) {
      const count = await this.repositories.signInThrottle.failures(key);
      if (count === undefined || count.failures < freeFailures) continue;
      const delayMs = Math.min(longestDelayMs, 1000 * 2 ** (count.failures - freeFailures));
      const leftMs = count.lastFailureAt.getTime() + delayMs - this.now().getTime();
      if (leftMs > 0 && leftMs <= longestDelayMs) {
        const seconds = Math.ceil(leftMs / 1000);
        throw new TooManyRequests(
          `Too many failed attempts. Try again in ${seconds} seconds.`,
          seconds,
        );
      }
    }
  }

  async failed(keys: readonly string[]): Promise<void> {
    for (const key of keys)
      await this.repositories.signInThrottle.addFailure(key, this.now(), forgetAfterMs);
  }

  async succeeded(key: string): Promise<void> {
    await this.repositories.signInThrottle.clear(key);
  }
}
