import type { FormObject } from './form-params';
import type { StubState } from './store';

/** One request, past the gate: its form or query, ids from the path, the state to work on. */
export interface Call {
  readonly form: FormObject;
  readonly ids: Readonly<Record<string, string>>;
  readonly state: StubState;
  /** Unix seconds. */
  readonly now: number;
}

/** One operation of the API. A resource's file exports its routes; `routes.ts` joins them. */
export interface Route {
  readonly method: 'get' | 'post' | 'delete';
  readonly path: string;
  readonly run: (call: Call) => object;
}
