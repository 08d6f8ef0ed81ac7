import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chosenSuites, countOf, inStartOrder, suites } from './suites.mjs';

describe('the count of a suite', () => {
  let folder;
  beforeEach(async () => (folder = await mkdtemp(join(tmpdir(), 'kinvale-counts-'))));
  afterEach(() => rm(folder, { recursive: true, force: true }));

  async function countsOf(report, hasPassed) {
    const file = join(folder, 'counts.json');
    await writeFile(file, JSON.stringify(report));
    const { passed, failed } = await countOf({ countsSpecs: true }, hasPassed, file);
    return [passed, failed];
  }

  it('is one for a check without specs', async () => {
    expect(await countOf({}, true, '')).toEqual({ passed: 1, failed: 0 });
    expect(await countOf({}, false, '')).toEqual({ passed: 0, failed: 1 });
  });

  it('is what the runner reports', async () => {
    expect(await countsOf({ passed: 7, failed: 2 }, false)).toEqual([7, 2]);
  });

  it('is a failure when no spec ran', async () => {
    expect(await countsOf({ passed: 0, failed: 0 }, true)).toEqual([0, 1]);
  });

  it('is a failure more when the runner failed outside its specs', async () => {
    expect(await countsOf({ passed: 7, failed: 0 }, false)).toEqual([7, 1]);
  });

  it('is a failure when the runner wrote nothing', async () => {
    const { passed, failed } = await countOf(
      { countsSpecs: true },
      true,
      join(folder, 'none.json'),
    );
    expect([passed, failed]).toEqual([0, 1]);
  });

  it('takes a journey that was skipped or passed on a second try as failed', async () => {
    const stats = { expected: 3, unexpected: 1, flaky: 1, skipped: 2 };
    expect(await countsOf({ stats, errors: [] }, false)).toEqual([3, 4]);
  });
});

describe('the choice of suites', () => {
  const typesOf = (chosen) =>
    chosen
      .find(({ name }) => name === 'types')
      .commands.flat()
      .slice(1);

  it('is all of them in their order unless some are named', () => {
    expect(chosenSuites().map(({ name }) => name)).toEqual(suites.map(({ name }) => name));
    expect(chosenSuites(['db', 'lint']).map(({ name }) => name)).toEqual(['lint', 'db']);
  });

  it('leaves the types of the application to the build only where the build runs', () => {
    expect(typesOf(chosenSuites())).toEqual(['tools/typecheck.mjs', '--build-follows']);
    expect(typesOf(chosenSuites(['types', 'build'])).at(-1)).toBe('--build-follows');
    expect(typesOf(chosenSuites(['types', 'browser']))).toEqual(['tools/typecheck.mjs']);
    expect(typesOf(chosenSuites(['types']))).toEqual(['tools/typecheck.mjs']);
  });
});

describe('the start of suites', () => {
  it('begins with the longest, and ends with those that want the machine to themselves', () => {
    const chosen = [
      { name: 'short', seconds: 5 },
      { name: 'alone', seconds: 90, alone: true },
      { name: 'long', seconds: 60 },
      { name: 'last', seconds: 200, alone: true },
    ];
    expect(inStartOrder(chosen).map(({ name }) => name)).toEqual([
      'long',
      'short',
      'alone',
      'last',
    ]);
  });

  it('leaves none out and knows how long each takes', () => {
    expect(new Set(inStartOrder(suites))).toEqual(new Set(suites));
    for (const { name, seconds } of suites) expect(seconds).withContext(name).toBeGreaterThan(0);
  });
});
