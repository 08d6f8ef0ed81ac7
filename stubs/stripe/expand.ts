import { products } from './catalogue';
import type { FormObject, FormValue } from './form-params';
import type { StubState } from './store';
import { badRequest, notInStub } from './stripe-failure';

/** A copy of `reply` in which each `expand[]` path's ids are replaced by their objects. */
export function expanded(reply: object, form: FormObject, state: StubState): object {
  const paths = expandPaths(form['expand']);
  if (paths.length === 0) return reply;
  const copy = structuredClone(reply);
  for (const path of paths) {
    if (path.split('.').length > 4) {
      throw badRequest(`You cannot expand more than 4 levels: ${path}`, 'expand');
    }
    expandAt(copy, path.split('.'), path, state);
  }
  return copy;
}

/** The routes have read `expand` as a list of text by now. */
function expandPaths(value: FormValue | undefined): readonly string[] {
  return value === undefined || value === '' ? [] : (Object.values(value) as string[]);
}

function expandAt(target: unknown, steps: readonly string[], path: string, state: StubState): void {
  if (Array.isArray(target)) {
    for (const entry of target) expandAt(entry, steps, path, state);
    return;
  }
  const [step, ...rest] = steps;
  if (typeof target !== 'object' || target === null || !Object.hasOwn(target, step)) {
    throw badRequest(`This property cannot be expanded (${path}).`, 'expand');
  }
  const parent = target as Record<string, unknown>;
  const value = parent[step];
  if (typeof value === 'string') parent[step] = objectOf(value, path, state);
  if (rest.length > 0 && parent[step] !== null) expandAt(parent[step], rest, path, state);
}

function objectOf(id: string, path: string, state: StubState): object {
  const found =
    state.customers[id] ??
    state.subscriptions[id] ??
    state.invoices[id] ??
    products.find((product) => product.id === id);
  if (found !== undefined) return structuredClone(found);
  if (id in state.paymentMethods) throw notInStub('expand', `expand=${path}`);
  throw badRequest(`This property cannot be expanded (${path}).`, 'expand');
}
