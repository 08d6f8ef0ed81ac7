import type { Repositories } from '../../db/repositories/repositories';
import { TooManyRequests } from '../errors/app-error';

const day = 86_400_000;
const common = { longestWaitSeconds: 60, forgetAfterSeconds: 15 * 60 } as const;

/** A whole office may stand behind one address: it is slowed down later than an account. */
const rules = {
  account: { ...common, freeTries: 5 },
  address: { ...common, freeTries: 50 },
} as const;

/** What tries are counted by: an account, or the address that asks. */
export interface ThrottleKey {
  readonly kind: keyof typeof rules;
  readonly value: string;
}

/**
 * Slows guessing down without locking anybody out: after the free tries each further one that fails doubles the wait,
 * up to a minute, for the account and for the address apart. A try counts before it is judged.
 */
export class SignInThrottle {
  constructor(
    private readonly repositories: Repositories,
    private readonly now: () => Date,
  ) {}

  /** @throws {TooManyRequests} while the wait lasts. */
  async countTry(keys: readonly ThrottleKey[]): Promise<void> {
    for (const key of keys) {
      const seconds = await this.repositories.signInThrottle.countTry(
        stored(key),
        this.now(),
        rules[key.kind],
      );
      if (seconds > 0)
        throw new TooManyRequests(
          `Too many failed attempts. Try again in ${seconds} ${seconds === 1 ? 'second' : 'seconds'}.`,
          seconds,
        );
    }
  }

  /** The account’s count starts anew; the address only gets this try back. */
  async succeeded(keys: readonly ThrottleKey[]): Promise<void> {
    for (const key of keys) {
      if (key.kind === 'account') await this.repositories.signInThrottle.clear(stored(key));
      else await this.repositories.signInThrottle.forgive(stored(key));
    }
  }

  /** Drops counts of more than a day ago. */
  async prune(): Promise<void> {
    await this.repositories.signInThrottle.prune(new Date(this.now().getTime() - day));
  }
}

function stored({ kind, value }: ThrottleKey): string {
  return `${kind}:${value}`;
}
