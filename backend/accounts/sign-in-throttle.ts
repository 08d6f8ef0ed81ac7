import type { Repositories } from '../../db/repositories/repositories';
import { TooManyRequests } from '../errors/app-error';

/** A whole office may stand behind one address: it is slowed down later than an account. */
const freeFailures = { account: 5, address: 50 } as const;
const longestDelayMs = 60_000;
const forgetAfterMs = 15 * 60_000;

/** What failures are counted by: an account, or the address that asks. */
export interface ThrottleKey {
  readonly kind: keyof typeof freeFailures;
  readonly value: string;
}

/**
 * Slows guessing down without locking anybody out: after the free failures each further one doubles the wait,
 * up to a minute, for the account and for the address apart.
 */
export class SignInThrottle {
  constructor(
    private readonly repositories: Repositories,
    private readonly now: () => Date,
  ) {}

  /** @throws {TooManyRequests} while the wait lasts. */
  async assertMayTry(keys: readonly ThrottleKey[]): Promise<void> {
    for (const key of keys) {
      const count = await this.repositories.signInThrottle.failures(stored(key));
      if (count === undefined || count.failures < freeFailures[key.kind]) continue;
      const delayMs = Math.min(
        longestDelayMs,
        1000 * 2 ** (count.failures - freeFailures[key.kind]),
      );
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

  async failed(keys: readonly ThrottleKey[]): Promise<void> {
    for (const key of keys)
      await this.repositories.signInThrottle.addFailure(stored(key), this.now(), forgetAfterMs);
  }

  async succeeded(key: ThrottleKey): Promise<void> {
    await this.repositories.signInThrottle.clear(stored(key));
  }
}

function stored({ kind, value }: ThrottleKey): string {
  return `${kind}:${value}`;
}
