import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { estimatorTable } from './estimators/estimator-table';
import { covarianceTable } from './slopes/covariance-table';
import { goldenJson } from './testing/golden-panels';
import { testTable } from './tests/test-table';

const stats = new URL('./', import.meta.url);
const goldenFolder = new URL('golden/', stats);

const panels = [
  'grunfeld10',
  'grunfeld11',
  'grunfeld11_value_on_inv_capital',
  'grunfeld10_unbalanced',
  'grunfeld10_loglog',
  'usairlines',
  'instinnovation120',
].map((name) => `${name}.json`);

interface Row {
  readonly figure: string;
  /** Blocks as `file#path`. */
  readonly blocks: readonly string[];
  readonly source: string;
  /** Spec files, from this folder. */
  readonly specs: readonly string[];
}

/** The rows of every table whose columns are figure, reference, source and held by. */
function referenceRows(text: string): Row[] {
  const rows: Row[] = [];
  let isReference = false;
  for (const line of text.split('\n')) {
    if (!line.startsWith('|')) {
      isReference = false;
      continue;
    }
    const cells = line
      .split('|')
      .slice(1, -1)
      .map((cell) => cell.trim());
    if (cells.join() === 'figure,reference,source,held by') isReference = true;
    else if (isReference && !/^-+$/u.test(cells[0])) {
      const [figure, reference, source, heldBy] = cells;
      rows.push({ figure, blocks: quoted(reference), source, specs: quoted(heldBy) });
    }
  }
  return rows;
}

/** What stands between backticks. */
function quoted(text: string): string[] {
  return [...text.matchAll(/`([^`]+)`/gu)].map(([, inside]) => inside);
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}

/** Whether a path of names with dots between leads to something; a name may hold dots itself. */
function leadsTo(value: unknown, path: string): boolean {
  if (!isRecord(value)) return false;
  if (Object.hasOwn(value, path)) return true;
  return Object.keys(value).some(
    (name) => path.startsWith(`${name}.`) && leadsTo(value[name], path.slice(name.length + 1)),
  );
}

/** The file itself, and the cases or panels it is a list of. */
function rootsOf(file: string): unknown[] {
  const json = goldenJson<Readonly<Record<string, unknown>>>(file);
  const lists = ['cases', 'panels', 'results'].map((name) => json[name]).filter(isRecord);
  const within = [json, ...lists].flatMap((list) => Object.values(list));
  return [json, ...within, ...within.map((one) => isRecord(one) && one['figures'])];
}

function hasBlock(block: string): boolean {
  const [file, path] = block.split('#');
  const files = file === 'panel' ? panels : [file];
  return files.some((name) => rootsOf(name).some((root) => leadsTo(root, path)));
}

const rows = referenceRows(readFileSync(new URL('README.md', goldenFolder), 'utf8'));

/** All blocks of the rows whose figure is such an entry of the engine's tables. */
function blocksOf(kind: string, code: string): readonly string[] {
  return rows
    .filter(({ figure }) => figure.startsWith(`${kind} \`${code}\``))
    .flatMap(({ blocks }) => blocks);
}

function expectEntry(kind: string, code: string, references: readonly string[]): void {
  const blocks = blocksOf(kind, code);
  expect(references.length).withContext(code).toBeGreaterThan(0);
  for (const reference of references) {
    expect(blocks.some((block) => isNamed(block, reference)))
      .withContext(`${kind} ${code}: ${reference} among ${blocks.join(', ')}`)
      .toBeTrue();
  }
}

/** A reference is a block of the panels, a golden file by itself, or a file and its block with a blank between. */
function isNamed(block: string, reference: string): boolean {
  const [file, path] = block.split('#');
  return (
    block === `panel#${reference}` ||
    file === `${reference}.json` ||
    `${file.replace(/\.json$/u, '')} ${path}` === reference
  );
}

describe('the table of references', () => {
  for (const { code, reference } of Object.values(covarianceTable)) {
    it(`has a row for the covariance ${code} with its blocks`, () => {
      expectEntry('covariance', code, reference);
    });
  }

  for (const { code, reference } of estimatorTable) {
    it(`has a row for the estimator ${code} with its block`, () => {
      expectEntry('estimator', code, [reference]);
    });
  }

  for (const { code, reference } of testTable) {
    it(`has a row for the test ${code} with its block`, () => {
      expectEntry('test', code, [reference]);
    });
  }

  it('names no covariance, estimator or test that the engine does not have', () => {
    const known = [
      ...Object.keys(covarianceTable).map((code) => `covariance ${code}`),
      ...estimatorTable.map(({ code }) => `estimator ${code}`),
      ...testTable.map(({ code }) => `test ${code}`),
    ];
    const named = rows.flatMap(({ figure }) => {
      const [, kind, code] = /^(covariance|estimator|test) `([^`]+)`/u.exec(figure) ?? [];
      return kind === undefined ? [] : [`${kind} ${code}`];
    });
    expect([...new Set(named)].sort()).toEqual(known.sort());
  });

  for (const { figure, blocks, source, specs } of rows) {
    it(`leads from ${figure} to blocks and specs that are there`, () => {
      for (const block of blocks) expect(hasBlock(block)).withContext(block).toBeTrue();
      // A row without a block says in words that nothing outside computes it.
      if (blocks.length === 0) expect(source).toMatch(/^law only/u);
      expect(source).not.toBe('');
      const texts = specs.map((spec) => {
        expect(spec).toMatch(/\.spec\.ts$/u);
        expect(existsSync(new URL(spec, stats)))
          .withContext(spec)
          .toBeTrue();
        return readFileSync(new URL(spec, stats), 'utf8');
      });
      expect(texts.length).toBeGreaterThan(0);
      const files = new Set(blocks.map((block) => block.split('#')[0]));
      for (const file of files) {
        if (file === 'panel') continue;
        expect(texts.some((text) => text.includes(`'${file}'`)))
          .withContext(`${file} is read by ${specs.join(' or ')}`)
          .toBeTrue();
      }
    });
  }

  it('has a row for every figure that R computes in outside.json', () => {
    interface Outside {
      readonly cases: readonly { readonly figures: Readonly<Record<string, unknown>> }[];
    }
    const named = new Set(rows.flatMap(({ blocks }) => blocks));
    const figures = goldenJson<Outside>('outside.json').cases.flatMap((one) =>
      Object.keys(one.figures),
    );
    const missing = figures.filter((figure) => {
      // With year effects a plan's figure is there for each choice of the coming years' effects.
      const plain = figure.replace(/\.(last|meanOfLastThree)$/u, '');
      return !named.has(`outside.json#${plain}`) && !named.has(`outside.json#${figure}`);
    });
    expect([...new Set(missing)]).toEqual([]);
  });

  it('has every golden JSON file in a row', () => {
    const named = new Set(rows.flatMap(({ blocks }) => blocks.map((one) => one.split('#')[0])));
    const files = readdirSync(goldenFolder).filter((name) => name.endsWith('.json'));
    expect(files.filter((file) => !panels.includes(file) && !named.has(file))).toEqual([]);
  });
});
