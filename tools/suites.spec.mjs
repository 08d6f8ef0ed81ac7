import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { countOf } from './suites.mjs';

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
