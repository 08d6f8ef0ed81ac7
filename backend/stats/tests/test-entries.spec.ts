import { readdirSync } from 'node:fs';
import { goldenJson } from '../testing/golden-panels';
import { testTable } from './test-table';

const goldenFiles = readdirSync(new URL('../golden/', import.meta.url));

/** What stands at a path of names with dots between in a golden panel's JSON. */
function blockAt(json: unknown, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>(
      (value, name) =>
        typeof value === 'object' && value !== null
          ? (value as Readonly<Record<string, unknown>>)[name]
          : undefined,
      json,
    );
}

describe('the entries of the test table', () => {
  it('have codes of their own', () => {
    const codes = testTable.map(({ code }) => code);
    expect(new Set(codes).size).toBe(codes.length);
    for (const code of codes) expect(code).toMatch(/^[a-z]+(-[a-z]+)*$/u);
  });

  const panel = goldenJson<unknown>('grunfeld10.json');

  for (const test of testTable) {
    it(`say of ${test.code} what it is, where it comes from and what each outcome means`, () => {
      const { rejects, keeps, none } = test.readings;
      expect(test.name.trim()).not.toBe('');
      for (const text of [test.definition, rejects, keeps, none])
        expect(text).toMatch(/\S+ \S+.*\.$/u);
      expect(test.source).toMatch(/\(\d{4}\)/u);
    });

    it(`name a block of the golden panels, or a golden file, that holds the outside result of ${test.code}`, () => {
      const block = blockAt(panel, test.reference);
      const isFile = goldenFiles.includes(`${test.reference}.json`);
      if (!isFile)
        expect(block).toEqual(jasmine.objectContaining({ statistic: jasmine.anything() }));
      expect(isFile || block !== undefined)
        .withContext(test.reference)
        .toBeTrue();
    });
  }
});
