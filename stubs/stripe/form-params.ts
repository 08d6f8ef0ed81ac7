import { badRequest, notInStub } from './stripe-failure';

/** What bracket nesting (`items[0][price]=…`) gives: text at the leaves. */
export type FormValue = string | readonly FormValue[] | FormObject;
export interface FormObject {
  readonly [name: string]: FormValue;
}

/** Reads one parameter; `path` is its name in brackets, for messages. */
export type Param<V> = (value: FormValue, path: string) => V;

/**
 * One reader for every parameter that the SDK's type knows: the compiler refuses a shape that
 * leaves one out, so nothing Stripe understands can be ignored in silence.
 */
export type Shape<T> = { readonly [K in keyof Required<T>]: Param<unknown> };

/** What {@link readParams} gives: `undefined` was not sent, `null` was sent empty (unset it). */
export type Read<S> = { [K in keyof S]?: S[K] extends Param<infer V> ? V | null : never };

/** Reads all of `form`; unknown names give 400, known ones outside the stub's scope give 501. */
export function readParams<S extends Record<string, Param<unknown>>>(
  shape: S,
  form: FormObject,
  parent = '',
): Read<S> {
  const read: Record<string, unknown> = {};
  for (const [name, value] of Object.entries(form)) {
    const path = parent === '' ? name : `${parent}[${name}]`;
    if (!Object.hasOwn(shape, name)) {
      throw badRequest(`Received unknown parameter: ${path}`, path, 'parameter_unknown');
    }
    const isEmpty = value === '' && shape[name] !== unsupported;
    read[name] = isEmpty ? null : shape[name](value, path);
  }
  return read as Read<S>;
}

/** Known to Stripe, not done here. */
export const unsupported: Param<never> = (value, path) => {
  throw notInStub(firstLeaf(value, path));
};

function firstLeaf(value: FormValue, path: string): string {
  if (typeof value === 'string') return path;
  const first = Object.entries(value).at(0);
  return first === undefined ? path : firstLeaf(first[1], `${path}[${first[0]}]`);
}

export const text: Param<string> = (value, path) => {
  if (typeof value !== 'string') throw badRequest(`Invalid string: ${path}`, path);
  return value;
};

export const flag: Param<boolean> = (value, path) => {
  if (value !== 'true' && value !== 'false') {
    throw badRequest(`Invalid boolean: ${show(value)}`, path);
  }
  return value === 'true';
};

export function whole(low: number, high: number): Param<number> {
  return (value, path) => {
    const given = show(value);
    if (!/^-?\d{1,15}$/.test(given)) {
      throw badRequest(`Invalid integer: ${given}`, path, 'parameter_invalid_integer');
    }
    if (Number(given) < low || Number(given) > high) {
      throw badRequest(`${path} must be between ${low} and ${high}; found ${given}`, path);
    }
    return Number(given);
  };
}

/** One of Stripe's words; those in `later` are valid at Stripe and outside the stub's scope. */
export function word<const W extends string>(
  words: readonly W[],
  later: readonly string[] = [],
): Param<W> {
  return (value, path) => {
    const found = words.find((candidate) => candidate === value);
    if (found !== undefined) return found;
    const given = show(value);
    if (later.includes(given)) throw notInStub(path, `${path}=${given}`);
    const all = [...words, ...later].join(', ');
    throw badRequest(`Invalid ${path}: must be one of ${all}; found ${given}`, path);
  };
}

export function nested<S extends Record<string, Param<unknown>>>(shape: S): Param<Read<S>> {
  return (value, path) => {
    if (typeof value === 'string' || isList(value)) {
      throw badRequest(`Invalid object: ${path}`, path);
    }
    return readParams(shape, value, path);
  };
}

export function listOf<V>(param: Param<V>): Param<V[]> {
  return (value, path) => {
    if (typeof value === 'string') throw badRequest(`Invalid array: ${path}`, path);
    return Object.entries(value).map(([index, entry]) => {
      if (!/^\d+$/.test(index)) throw badRequest(`Invalid array: ${path}`, path);
      return param(entry, `${path}[${index}]`);
    });
  };
}

/** Names with text values; an empty value asks for the name's removal. */
export const metadata: Param<Record<string, string>> = (value, path) => {
  if (typeof value === 'string' || isList(value)) {
    throw badRequest(`Invalid object: ${path}`, path);
  }
  const entries = Object.entries(value).map(([key, entry]) => {
    const words = text(entry, `${path}[${key}]`);
    if (key.length > 40) throw badRequest(`${path} keys hold at most 40 characters`, path);
    if (words.length > 500) throw badRequest(`${path} values hold at most 500 characters`, path);
    return [key, words] as const;
  });
  return Object.fromEntries(entries);
};

function isList(value: FormValue): value is readonly FormValue[] {
  return Array.isArray(value);
}

function show(value: FormValue): string {
  return typeof value === 'string' ? value : JSON.stringify(value);
}
