import * as z from 'zod';
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
});
