import type * as z from 'zod';
import { Invalid } from '../errors/app-error';

/** More would help nobody: a body of 50,000 cells can be wrong in 300,000 places. */
const mostErrors = 100;

/**
 * Checks a request body against the contract.
 *
 * @throws {Invalid} with a pointer and a reason for each field that is wrong, the first 100 of them.
 */
export function parse<T extends z.ZodType>(schema: T, body: unknown): z.output<T> {
  const parsed = schema.safeParse(body);
  if (parsed.success) return parsed.data;
  throw new Invalid(
    'The request is not as expected.',
    parsed.error.issues.slice(0, mostErrors).map((issue) => ({
      pointer: `/${issue.path.map(String).join('/')}`,
      detail: issue.message,
    })),
  );
}
