import type * as z from 'zod';
import { Invalid } from '../errors/app-error';

/**
 * Checks a request body against the contract.
 *
 * @throws {Invalid} with a pointer and a reason for each field that is wrong.
 */
export function parse<T extends z.ZodType>(schema: T, body: unknown): z.output<T> {
  const parsed = schema.safeParse(body);
  if (parsed.success) return parsed.data;
  throw new Invalid(
    'The request is not as expected.',
    parsed.error.issues.map((issue) => ({
      pointer: `/${issue.path.map(String).join('/')}`,
      detail: issue.message,
    })),
  );
}
