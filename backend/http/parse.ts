import type * as z from 'zod';
import { foundWords, wantedWords } from '../contract/issue-words';
import { Invalid } from '../errors/app-error';

/** More would help nobody: a body of 50,000 cells can be wrong in 300,000 places. */
const mostErrors = 100;

/**
 * Checks a request body against the contract.
 *
 * @throws {Invalid} with a pointer and a reason for each field that is wrong, the first 100 of them.
 */
export function parse<T extends z.ZodType>(schema: T, body: unknown): z.output<T> {
  const parsed = schema.safeParse(body, { error: wantedWords, reportInput: true });
  if (parsed.success) return parsed.data;
  throw new Invalid(
    'Change what is named and send it again.',
    parsed.error.issues.slice(0, mostErrors).map((issue) => ({
      pointer: `/${issue.path.map(String).join('/')}`,
      detail: detailOf(issue),
    })),
  );
}

/** What was wanted and what was found; a rule over several members has words for both of its own. */
function detailOf(issue: z.core.$ZodIssue): string {
  const { code, message, path, input } = issue;
  if (code === 'custom' || code === 'unrecognized_keys') return message;
  const isKind = code === 'invalid_union' && issue.discriminator === path.at(-1);
  const found = isKind ? memberOf(input, issue.discriminator) : input;
  return `${message}; found ${foundWords(found)}`;
}

function memberOf(object: unknown, name: string | undefined): unknown {
  return new Map<string | undefined, unknown>(Object.entries(Object(object) as object)).get(name);
}
