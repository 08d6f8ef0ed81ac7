import { readdirSync } from 'node:fs';
import { goldenJson } from '../testing/golden-panels';
import { testTable } from './test-table';

const goldenFiles = readdirSync(new URL('../golden/', import.meta.url)).filter((name) =>
  name.endsWith('.json'),
);

/** Whether a block of that name with a statistic stands anywhere in the JSON. */
function holdsBlock(json: unknown, name: string): boolean {
  if (typeof json !== 'object' || json === null) return false;
  return Object.entries(json).some(
    ([key, value]: [string, unknown]) =>
      (key === name && hasStatistic(value)) || holdsBlock(value, name),
  );
}

function hasStatistic(block: unknown): boolean {
  return typeof block === 'object' && block !== null && 'statistic' in block;
}

describe('the entries of the test table', () => {
  it('have codes of their own', () => {
    const codes = testTable.map(({ code }) => code);
    expect(new Set(codes).size).toBe(codes.length);
    for (const code of codes) expect(code).toMatch(/^[a-z]+(-[a-z]+)*$/u);
  });

  const contents = goldenFiles.map((file) => goldenJson<unknown>(file));

  for (const test of testTable) {
    it(`say of ${test.code} what it is, where it comes from and what each outcome means`, () => {
      const { rejects, keeps, none } = test.readings;
      for (const text of [test.name, test.definition, test.source, rejects, keeps, none]) {
        expect(text.length).toBeGreaterThan(5);
      }
      for (const reading of [rejects, keeps, none]) expect(reading).toMatch(/\.$/u);
      expect(test.source).toMatch(/\(\d{4}\)/u);
    });

    it(`name a block of the golden files for ${test.code}`, () => {
      expect(contents.some((json) => holdsBlock(json, test.reference)))
        .withContext(test.reference)
        .toBeTrue();
    });
  }
});
