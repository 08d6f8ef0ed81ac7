import type * as z from 'zod';

type Issue = Parameters<z.core.$ZodErrorMap>[0];

/**
 * What the contract says of a request where a schema has no words of its own: `expected a number`. Given to a parse as
 * its `error`; what was found is said by `foundWords`.
 */
export function wantedWords(issue: Issue): string {
  return `expected ${wanted(issue)}`;
}

/**
 * What stands where something else was wanted: `a text of 3 characters`. Texts are measured and not repeated, since a
 * password may be among them.
 */
export function foundWords(input: unknown): string {
  if (input === undefined) return 'nothing';
  if (input === '') return 'an empty text';
  if (typeof input === 'string') return `a text of ${counted(input.length, 'character')}`;
  if (Array.isArray(input)) return `a list of ${counted(input.length, 'entry', 'entries')}`;
  return typeof input === 'object' && input !== null ? 'an object' : JSON.stringify(input);
}

const kinds: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object',
  record: 'an object',
  null: 'null',
};

const formats: Readonly<Record<string, string>> = {
  uuid: 'an id, as 1f0e7c1a-3c52-4d0e-9b57-0f6a2f1c9d3e',
  email: 'an e-mail address, as name@company.example',
  datetime: 'a date and time, as 2024-03-31T12:00:00Z',
  date: 'a date, as 2024-03-31',
};

function wanted(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return kinds[issue.expected] ?? issue.expected;
    case 'too_small':
      return atLeast(issue.origin, Number(issue.minimum), issue.inclusive !== false);
    case 'too_big':
      return atMost(issue.origin, Number(issue.maximum), issue.inclusive !== false);
    case 'invalid_format':
      return formats[issue.format] ?? 'a text of another form';
    case 'invalid_value':
      return oneOf(issue.values.map(String));
    case 'unrecognized_keys':
      return `nothing more than the contract names; found ${issue.keys.slice(0, 3).map(quoted).join(', ')}`;
    case 'invalid_union':
      return Array.isArray(issue.options) ? oneOf(issue.options.map(String)) : 'another form';
    case 'not_multiple_of':
      return `a multiple of ${issue.divisor}`;
    default:
      return 'another value';
  }
}

function atLeast(origin: string, least: number, isInclusive: boolean): string {
  if (origin === 'string' && least === 1) return 'a text that is not empty';
  if (origin === 'string') return `a text of at least ${counted(least, 'character')}`;
  if (origin === 'array') return `a list of at least ${counted(least, 'entry', 'entries')}`;
  return isInclusive ? `a number of at least ${least}` : `a number above ${least}`;
}

function atMost(origin: string, most: number, isInclusive: boolean): string {
  if (origin === 'string') return `a text of at most ${counted(most, 'character')}`;
  if (origin === 'array') return `a list of at most ${counted(most, 'entry', 'entries')}`;
  return isInclusive ? `a number of at most ${most}` : `a number below ${most}`;
}

function oneOf(values: readonly string[]): string {
  const [last, ...rest] = values.map(quoted).reverse();
  return rest.length === 0 ? last : `${rest.reverse().join(', ')} or ${last}`;
}

function quoted(text: string): string {
  return `“${text.slice(0, 40)}”`;
}

function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
