import * as z from 'zod';

/** Every problem type that the API answers, by the last part of its URI. Clients switch on the type alone. */
export const problemSlugs = [
  'bad-request',
  'not-signed-in',
  'wrong-credentials',
  'forbidden',
  'cross-site',
  'not-found',
  'conflict',
  'gone',
  'too-large',
  'type-not-allowed',
  'unreadable-file',
  'too-many-requests',
  'quota',
  'unavailable',
  'internal',
  'four-eyes',
  'warnings-unopened',
  'headline-mismatch',
  'import-not-ready',
  'stale-version',
  'billing-unavailable',
  'storage-full',
] as const;

export type ProblemSlug = (typeof problemSlugs)[number];

const base = 'https://kinvale.example/problems/';

/** The stable URI of a problem type (RFC 9457). */
export function problemType(slug: ProblemSlug): string {
  return base + slug;
}

/** The slug of a problem type's URI; `internal` for one this client does not know. */
export function problemSlug(type: string): ProblemSlug {
  const slug = problemSlugs.find((known) => base + known === type);
  return slug ?? 'internal';
}

/** An error reply, `application/problem+json`. */
export const Problem = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  /** The request's id. */
  instance: z.string().optional(),
  errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
});
export type Problem = z.infer<typeof Problem>;
