import { createHash } from 'node:crypto';
import type { StoredAnswer, StubState } from './store';
import { badRequest, StripeFailure } from './stripe-failure';

const keptSeconds = 86_400;

/** What makes two requests the same: operation and parameters, in the order sent. */
export function requestDigest(method: string, path: string, form: object): string {
  return createHash('sha256')
    .update(`${method} ${path} ${JSON.stringify(form)}`)
    .digest('hex');
}

/**
 * The answer already given under `key`, if any.
 *
 * @throws {StripeFailure} 400 `idempotency_error` when the key was used for another request.
 */
export function earlierAnswer(
  state: StubState,
  key: string,
  request: string,
  now: number,
): StoredAnswer | undefined {
  if (key.length > 255) throw badRequest('Idempotency keys hold at most 255 characters.');
  const found = Object.hasOwn(state.answers, key) ? state.answers[key] : undefined;
  if (found === undefined || found.created + keptSeconds <= now) return undefined;
  if (found.request !== request) {
    throw new StripeFailure(
      400,
      'idempotency_error',
      'Keys for idempotent requests can only be used with the same parameters they were first ' +
        `used with. Try using a key other than '${key}' if you meant to execute a different request.`,
    );
  }
  return found;
}

/** Keeps an answer for a day, and lets go of those older than that. */
export function rememberAnswer(state: StubState, key: string, answer: StoredAnswer): void {
  const kept = Object.entries(state.answers).filter(
    ([, { created }]) => created + keptSeconds > answer.created,
  );
  state.answers = Object.fromEntries([...kept, [key, answer]]);
}
