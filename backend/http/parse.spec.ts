import * as z from 'zod';
import * as contract from '../contract';
import { Invalid } from '../errors/app-error';
import { parse } from './parse';

describe('parsing a request', () => {
  const schema = z.strictObject({ cells: z.array(z.strictObject({ value: z.number() })) });

  it('gives the request as the contract has it', () => {
    expect(parse(schema, { cells: [{ value: 1 }] })).toEqual({ cells: [{ value: 1 }] });
  });

  it('names the places that are wrong, the first hundred of them', () => {
    const cells = Array.from({ length: 5000 }, () => ({}));
    let refused: unknown;
    try {
      parse(schema, { cells });
    } catch (error) {
      refused = error;
    }
    expect(refused).toBeInstanceOf(Invalid);
    const { errors } = (refused as Invalid).members as { errors: { pointer: string }[] };
    expect(errors.length).toBe(100);
    expect(errors[99].pointer).toBe('/cells/99/value');
  });

  it('says what was wanted and what was found, in words of its own', () => {
    const all = z.strictObject({
      name: z.string().min(1),
      note: z.string().max(3),
      password: z.string().min(12, 'expected at least 12 characters'),
      year: z.number().int().min(1000),
      rate: z.number().positive(),
      unit: z.enum(['units', 'millions']),
      layout: z.discriminatedUnion('kind', [
        z.strictObject({ kind: z.literal('long') }),
        z.strictObject({ kind: z.literal('wide') }),
      ]),
      cells: z.array(z.number()).max(1),
      id: z.uuid(),
      at: z.iso.datetime(),
      isNew: z.boolean(),
      missing: z.string(),
    });
    const body = {
      name: '',
      note: 'long',
      password: 'hunter2',
      year: 1.5,
      rate: 0,
      unit: 'dozens',
      layout: { kind: 'tall' },
      cells: [1, 2],
      id: 'x',
      at: 'now',
      isNew: null,
      further: 1,
    };
    expect(details(all, body)).toEqual([
      '/name: expected a text that is not empty; found an empty text',
      '/note: expected a text of at most 3 characters; found a text of 4 characters',
      '/password: expected at least 12 characters; found a text of 7 characters',
      '/year: expected a whole number; found 1.5',
      '/rate: expected a number above 0; found 0',
      '/unit: expected “units” or “millions”; found a text of 6 characters',
      '/layout/kind: expected “long” or “wide”; found a text of 4 characters',
      '/cells: expected a list of at most 1 entry; found a list of 2 entries',
      '/id: expected an id, as 1f0e7c1a-3c52-4d0e-9b57-0f6a2f1c9d3e; found a text of 1 character',
      '/at: expected a date and time, as 2024-03-31T12:00:00Z; found a text of 3 characters',
      '/isNew: expected true or false; found null',
      '/missing: expected a text; found nothing',
      '/: expected nothing more than the contract names; found “further”',
    ]);
  });

  it('has words of its own for whatever a contract refuses', () => {
    const strange = [undefined, null, '', 'x', 0.5, -1, 1e9, true, [], [[]], {}, { a: 1 }];
    const schemas = Object.values(contract).filter((each) => each instanceof z.ZodType);
    expect(schemas.length).toBeGreaterThan(50);
    const words = new Set(schemas.flatMap((one) => strange.flatMap((body) => details(one, body))));
    expect(words.size).toBeGreaterThan(100);
    expect(
      [...words].filter((one) => /invalid|received|too (big|small)|undefined/i.test(one)),
    ).toEqual([]);
  });

  function details(schema: z.ZodType, body: unknown): readonly string[] {
    try {
      parse(schema, body);
      return [];
    } catch (error) {
      if (!(error instanceof Invalid)) throw error;
      const { errors } = error.members as { errors: { pointer: string; detail: string }[] };
      return errors.map(({ pointer, detail }) => `${pointer}: ${detail}`);
    }
  }
});
