import type { Request, Response } from 'express';
import { expanded } from './expand';
import type { FormObject } from './form-params';
import { earlierAnswer, rememberAnswer, requestDigest } from './idempotency';
import { isAnythingDue, passTime } from './renewals';
import type { Route } from './route';
import type { Store, StubState } from './store';

/** Tells the time in Unix seconds. */
export type Clock = () => number;

/**
 * Runs one operation and replies. Work is synchronous from reading the key to keeping the answer,
 * so two requests under one key never overlap. Refusals are thrown, change nothing and are not kept.
 */
export function answer(
  route: Route,
  request: Request,
  response: Response,
  store: Store,
  now: number,
): void {
  if (store.read((state) => isAnythingDue(state, now))) {
    store.change((state) => {
      passTime(state, now);
    });
  }
  const isPost = route.method === 'post';
  const form = ((isPost ? request.body : request.query) ?? {}) as FormObject;
  const ids = request.params as Record<string, string>;
  const run = (state: StubState): string =>
    JSON.stringify(expanded(route.run({ form, ids, state, now }), form, state));
  const key = isPost ? request.get('idempotency-key') : undefined;
  response.status(200).type('application/json');
  if (key === undefined) {
    response.send(isPost ? store.change(run) : store.read((state) => run(state as StubState)));
    return;
  }
  response.set('Idempotency-Key', key);
  const digest = requestDigest(request.method, request.path, form);
  const earlier = store.read((state) => earlierAnswer(state, key, digest, now));
  if (earlier !== undefined) {
    response.set('Idempotent-Replayed', 'true').status(earlier.status).send(earlier.body);
    return;
  }
  response.send(
    store.change((state) => {
      const body = run(state);
      rememberAnswer(state, key, { request: digest, status: 200, body, created: now });
      return body;
    }),
  );
}
