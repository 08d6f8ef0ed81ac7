import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { problemOf } from './fit-problem';
import { runFit } from './run-fit';

const golden = fileURLToPath(
  new URL('../../backend/stats/golden/grunfeld11_value_on_inv_capital.csv', import.meta.url),
);
const command = fileURLToPath(new URL('../fit.ts', import.meta.url));
const columns = ['--company', 'company', '--year', 'year', '--outcome', 'value'];
const plain = ['--panel', golden, ...columns, '--regressors', 'inv,capital'];

const rows = ['A', 'B', 'C'].flatMap((company, index) =>
  Array.from({ length: 6 }, (_, year) =>
    [
      company,
      2000 + year,
      9 * index + ((year * 7 + index) % 5),
      (year * 3 + index) % 4,
      (year * year + index) % 6,
    ].join(','),
  ),
);

describe('the fit command', () => {
  const folder = mkdtempSync(join(tmpdir(), 'fit-'));
  afterAll(() => {
    rmSync(folder, { recursive: true });
  });

  function panel(...lines: string[]): string[] {
    const path = join(folder, 'panel.csv');
    writeFileSync(path, ['company,year,value,inv,capital', ...lines].join('\n'));
    return ['--panel', path, ...columns, '--regressors', 'inv,capital'];
  }

  async function problem(...args: string[]): Promise<Record<string, unknown>> {
    try {
      await runFit(args);
    } catch (error) {
      const found = problemOf(error);
      if (found === undefined) throw error;
      const json = found.toJson();
      return {
        ...json,
        type: String(json['type']).replace('https://kinvale.example/problems/', ''),
      };
    }
    throw new Error('nothing was refused');
  }

  it('prints the documented keys, figures at full precision and a reason beside every null', async () => {
    const reply = (await runFit([...plain, '--own', 'C06'])) as Record<string, unknown>;
    expect(Object.keys(reply)).toEqual([
      'engine',
      'hash',
      'specification',
      'sample',
      'slopes',
      'slopeCovariance',
      'intercepts',
      'yearEffects',
      'yearEffectsReason',
      'standing',
      'goodness',
      'pooled',
      'poolability',
      'warnings',
    ]);
    expect(reply['hash']).toMatch(/^[0-9a-f]{64}$/u);
    expect(reply['specification']).toEqual({
      effects: 'company',
      form: 'levels',
      lag: 0,
      slopes: 'cr2',
      confidence: 0.95,
      seed: null,
    });
    expect(reply['standing']).toEqual(
      jasmine.objectContaining({
        company: 'C06',
        rank: 1,
        rankSet: [1, 1],
        cosines: 3,
      }),
    );
    const { estimate } = reply['standing'] as { estimate: number };
    // stats/golden/standing.json, at 1e-9 relative: what is printed is not rounded.
    expect(Math.abs(estimate / 2407.024642135653 - 1)).toBeLessThan(1e-9);
    const [inv] = reply['slopes'] as Record<string, unknown>[];
    expect(Object.keys(inv)).toEqual([
      'name',
      'estimate',
      'standardError',
      'low',
      'high',
      'statistic',
      'degreesOfFreedom',
      'pValue',
    ]);
  });

  it('says beside a null why it is one', async () => {
    const reply = (await runFit([...panel(...rows, 'S,2000,1,2,3'), '--own', 'S'])) as Record<
      string,
      unknown
    >;
    expect(reply['standing']).toBeNull();
    expect(reply['standingReason']).toContain('one complete row');
    const single = (reply['intercepts'] as Record<string, unknown>[]).find(
      ({ company }) => company === 'S',
    );
    expect(single?.['low']).toBeNull();
    expect(single?.['lowReason']).toContain('One row');
    expect(single?.['deviationReason']).toContain('One row');
  });

  it('says why there is no rank, beside the rank and its set', async () => {
    const short = ['P', 'Q', 'R', 'S'].flatMap((company, index) =>
      [2000, 2001].map((year) =>
        [company, year, index + (year % 7), year % 2, index % 3].join(','),
      ),
    );
    const own = Array.from({ length: 20 }, (_, year) =>
      ['A', 2000 + year, (year * 7) % 5, (year * 3) % 4, (year * year) % 7].join(','),
    );
    const reply = (await runFit([...panel(...own, ...short), '--own', 'A'])) as Record<
      string,
      Record<string, unknown>
    >;
    const reason = 'No peer has 3 rows or more, so there is no one to rank against.';
    expect(reply['standing']).toEqual(
      jasmine.objectContaining({
        rank: null,
        rankReason: reason,
        rankSet: null,
        rankSetReason: reason,
      }),
    );
    expect(reply['standing']['low']).not.toBeNull();
  });

  it('lists dropped rows with their lines, also those without a year', async () => {
    const reply = (await runFit(
      panel(...rows, 'A,,1,2,3', 'A,2010,NA,2,-', ',2011,1,2,3'),
    )) as Record<string, Record<string, unknown>>;
    expect(reply['sample']['dropped']).toEqual([
      { row: 20, column: 'year', reason: 'missing' },
      { row: 21, column: 'value', reason: 'missing' },
      { row: 21, column: 'capital', reason: 'missing' },
      { row: 22, column: 'company', reason: 'missing' },
    ]);
  });

  it('takes names with commas in quotes, and restricts to the members', async () => {
    const quoted = rows.map((row) => row.replace(/^B/u, '"B, Inc."'));
    const args = [...panel(...quoted), '--members', 'A,"B, Inc."', '--own', 'C'];
    const reply = (await runFit(args)) as { intercepts: { company: string }[] };
    expect(reply.intercepts.map(({ company }) => company)).toEqual(['A', 'B, Inc.', 'C']);
    const two = (await runFit(args.slice(0, -2))) as { intercepts: { company: string }[] };
    expect(two.intercepts.length).toBe(2);
  });

  it('refuses cells that cannot be used, with all their places', async () => {
    const found = await problem(
      ...panel(...rows, 'A,2000,1,2,3', 'B,20x7,1,2,3', 'C,2008,1,two,3', 'C,2009.5,1,2,3'),
    );
    expect(found['type']).toBe('year-not-whole');
    expect(
      (found['rows'] as Record<string, unknown>[]).map(
        ({ row, column, found: text, problem: kind }) => [row, column, text, kind],
      ),
    ).toEqual([
      [2, 'year', '2000', 'duplicate-rows'],
      [20, 'year', '2000', 'duplicate-rows'],
      [21, 'year', '20x7', 'year-not-whole'],
      [22, 'inv', 'two', 'not-a-number'],
      [23, 'year', '2009.5', 'year-not-whole'],
    ]);
  });

  it('refuses what cannot be estimated, naming what is concerned', async () => {
    const change = (pattern: (cells: string[]) => string[]): string[] =>
      panel(...rows.map((row) => pattern(row.split(',')).join(',')));
    const cases: [string, string[], Record<string, unknown>][] = [
      ['missing-column', [...panel(...rows).slice(0, -1), 'inv,zzz'], { columns: ['zzz'] }],
      ['ambiguous-column', [...panel(...rows).slice(0, -1), 'inv,value'], { columns: ['value'] }],
      ['unknown-company', [...plain, '--own', 'Z'], { companies: ['Z'] }],
      ['unknown-company', [...plain, '--members', 'C01,Y'], { companies: ['Y'] }],
      ['too-few-companies', [...plain, '--members', 'C01'], { companies: ['C01'] }],
    ];
    for (const [type, args, concerned] of cases) {
      expect(await problem(...args))
        .withContext(args.join(' '))
        .toEqual(jasmine.objectContaining({ type, ...concerned }));
    }
    expect(
      await problem(
        ...change(([company, year, value, inv]) => [
          company,
          year,
          value,
          inv,
          company.charCodeAt(0).toString(),
        ]),
      ),
    ).toEqual(
      jasmine.objectContaining({ type: 'constant-within-companies', columns: ['capital'] }),
    );
    expect(
      await problem(
        ...change(([company, year, value, inv]) => [
          company,
          year,
          value,
          inv,
          String(2 * Number(inv) + 1),
        ]),
      ),
    ).toEqual(
      jasmine.objectContaining({ type: 'collinear-regressors', columns: ['inv', 'capital'] }),
    );
    expect(
      (
        await problem(
          ...change(([company, year, , inv, capital]) => [company, year, '5', inv, capital]),
        )
      )['type'],
    ).toBe('outcome-constant');
    expect((await problem(...panel(rows[0], rows[1], rows[6], rows[7])))['type']).toBe(
      'no-residual-degrees-of-freedom',
    );
  });

  it('says of a company without a year that it has no rows with one, not that it is missing', async () => {
    const found = await problem(...panel(...rows, 'D,,1,2,3'), '--own', 'D');
    expect(found).toEqual(
      jasmine.objectContaining({
        type: 'unknown-company',
        title: 'A company has no rows with a year',
        detail: 'expected rows with a year in the panel for every company; found none for D',
        companies: ['D'],
      }),
    );
  });

  it('takes every choice of the specification, and a seed with the bootstrap alone', async () => {
    const plainChoice = {
      effects: 'company',
      form: 'levels',
      lag: 0,
      slopes: 'cr2',
      confidence: 0.95,
      seed: null,
    };
    const cases: [string[], object][] = [
      [['--lag', '1'], { lag: 1 }],
      [['--form', 'log'], { form: 'log' }],
      [['--effects', 'company,year'], { effects: 'company,year' }],
      [['--slopes', 'wild'], { slopes: 'wild', seed: 1 }],
      [['--slopes', 'wild', '--seed', '7'], { slopes: 'wild', seed: 7 }],
      [['--seed', '7'], {}],
      ...['cr1', 'cr0', 'classical', 'hc0', 'hc1', 'hc2', 'hc3', 'two-way', 'driscoll-kraay'].map(
        (slopes): [string[], object] => [['--slopes', slopes], { slopes }],
      ),
    ];
    for (const [extra, expected] of cases) {
      const reply = (await runFit([...plain, ...extra])) as Record<string, unknown>;
      expect(reply['specification'])
        .withContext(extra.join(' '))
        .toEqual({ ...plainChoice, ...expected });
    }
  });

  it('prints year effects that sum to zero, and in logs the standing in percent too', async () => {
    const reply = (await runFit([
      ...[...plain, '--own', 'C06'],
      ...['--effects', 'company,year', '--form', 'log'],
    ])) as Record<string, unknown>;
    const effects = reply['yearEffects'] as { year: number; estimate: number }[];
    expect(effects.map(({ year }) => year)).toEqual(
      Array.from({ length: 20 }, (_, index) => 1935 + index),
    );
    expect(effects.reduce((sum, { estimate }) => sum + estimate, 0)).toBeCloseTo(0, 10);
    const standing = reply['standing'] as { estimate: number; percent: { estimate: number } };
    expect(standing.percent.estimate).toBeCloseTo(100 * Math.expm1(standing.estimate), 8);
  });

  it('prints evidence only where it is asked for, with a reason beside every null', async () => {
    const nullsWithoutReason = (value: unknown, path = ''): string[] => {
      if (Array.isArray(value)) return value.flatMap((entry) => nullsWithoutReason(entry, path));
      if (value === null || typeof value !== 'object') return [];
      return Object.entries(value).flatMap(([key, entry]) =>
        entry === null && !(`${key}Reason` in value)
          ? [`${path}.${key}`]
          : nullsWithoutReason(entry, `${path}.${key}`),
      );
    };
    for (const args of [
      [...plain, '--own', 'C06', '--slopes', 'wild'],
      [...plain, '--effects', 'company,year', '--form', 'log', '--slopes', 'wild'],
      [...panel(...rows.slice(0, 14), 'D,2000,1,2,3'), '--own', 'D', '--slopes', 'wild'],
    ]) {
      expect((await runFit(args)) as object).not.toEqual(
        jasmine.objectContaining({ evidence: jasmine.anything() }),
      );
      const reply = (await runFit([...args, '--evidence'])) as Record<string, object>;
      expect(Object.keys(reply['evidence'])).toEqual(
        jasmine.arrayContaining(['verdict', 'covariances', 'alternatives', 'tests', 'residuals']),
      );
      expect(nullsWithoutReason(reply)).toEqual([]);
    }
  });

  it('refuses what year effects and logarithms cannot take, with all that is concerned', async () => {
    const logs = await problem(
      ...panel(...rows, 'A,2010,-1,0,3', 'B,2010,4,2,0'),
      ...['--form', 'log'],
    );
    expect(logs['type']).toBe('not-positive');
    expect(logs['rows']).toEqual(
      jasmine.arrayContaining([
        { row: 20, company: 'A', year: 2010, column: 'value' },
        { row: 20, company: 'A', year: 2010, column: 'inv' },
        { row: 21, company: 'B', year: 2010, column: 'capital' },
      ]),
    );
    const shifted = rows.map((row) => row.replace(/^C,20/u, 'C,30'));
    const years = await problem(...panel(...shifted), '--effects', 'company,year');
    expect(years).toEqual(
      jasmine.objectContaining({ type: 'disconnected-years', companies: ['A', 'B', 'C'] }),
    );
    const alike = rows.map((row) => {
      const [company, year, value, inv] = row.split(',');
      return [company, year, value, inv, Number(year) % 3].join(',');
    });
    const same = await problem(...panel(...alike), '--effects', 'company,year');
    expect(same).toEqual(
      jasmine.objectContaining({ type: 'same-for-all-companies', columns: ['capital'] }),
    );
  });

  it('refuses a command line it cannot read, and files that are no tables', async () => {
    for (const args of [
      [],
      plain.slice(2),
      [...plain, '--slopes', 'best'],
      [...plain, '--effects', 'year'],
      [...plain, '--form', 'logs'],
      [...plain, '--lag', '2'],
      [...plain, '--confidence', '95'],
      [...plain, '--seed', 'x'],
      [...plain, '--unknown'],
      [...plain, 'stray'],
      [...plain, '--members', ','],
      [...plain, '--members', '"A'],
    ]) {
      expect((await problem(...args))['type'])
        .withContext(args.join(' '))
        .toBe('bad-arguments');
    }
    expect((await problem('--panel', join(folder, 'none.csv'), ...plain.slice(2)))['type']).toBe(
      'unreadable-file',
    );
    expect((await problem('--panel', folder, ...plain.slice(2)))['type']).toBe('unreadable-file');
    writeFileSync(join(folder, 'broken.csv'), 'a,b\n"1,2\n');
    expect(await problem('--panel', join(folder, 'broken.csv'), ...plain.slice(2))).toEqual(
      jasmine.objectContaining({ type: 'csv-invalid' }),
    );
  });

  it('exits 0 with JSON on standard output, and 2 with the problem on standard error alone', () => {
    const run = (...args: string[]): { status: number | null; stdout: string; stderr: string } =>
      spawnSync(process.execPath, ['--import', 'tsx', command, ...args], {
        encoding: 'utf8',
      });
    const good = run(...plain, '--own', 'C06');
    expect(good.status).toBe(0);
    expect(good.stderr).toBe('');
    expect((JSON.parse(good.stdout) as { sample: unknown }).sample).toEqual(
      jasmine.objectContaining({ companies: 11, observations: 220 }),
    );
    const bad = run(...plain, '--own', 'Z');
    expect(bad.status).toBe(2);
    expect(bad.stdout).toBe('');
    expect(Object.keys(JSON.parse(bad.stderr) as object)).toEqual([
      'type',
      'title',
      'detail',
      'companies',
    ]);
  });
});
