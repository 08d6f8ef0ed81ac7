import * as fc from 'fast-check';
import { Readable } from 'node:stream';
import { readCsv } from './read-csv';
import { TableError } from './table-error';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

async function refusal(text: string): Promise<TableError> {
  try {
    await readCsv(bytes(text));
  } catch (error) {
    if (error instanceof TableError) return error;
    throw error;
  }
  throw new Error('the file was not refused');
}

describe('a text file without quotes', () => {
  const text = fc.string({
    unit: fc.constantFrom('a', '1', ' ', '.', 'ü', '\t', ',', ';', '\n', '\n', '\r', '\r\n'),
    maxLength: 60,
  });

  it('is read as the parser of quoted files reads it', async () => {
    await fc.assert(
      fc.asyncProperty(text, async (body) => {
        // A quote in the first line has the whole file read by that parser.
        const [plain, quoted] = await Promise.all(
          ['x', '"x"'].map((cell) => readCsv(bytes(`${cell}\n${body}`))),
        );
        expect(plain).toEqual(quoted);
      }),
    );
  });

  it('is one file however a stream cuts it', async () => {
    // Longer than what the delimiter is read from, so that pieces follow each other.
    const lines = Array.from({ length: 12_000 }, (_, line) => `Company ${line},${line},1.5`);
    const whole = bytes(`${lines.join('\n')}\n`);
    for (const size of [1000, 4097, 65_536]) {
      const pieces = Array.from({ length: Math.ceil(whole.length / size) }, (_, index) =>
        whole.subarray(index * size, (index + 1) * size),
      );
      const { grid } = await readCsv(Readable.from(pieces));
      expect(grid.rows.map((cells) => cells.join(','))).toEqual(lines);
      expect(grid.lines[11_999]).toBe(12_000);
    }
  });
});

describe('a text file whose first quote comes late', () => {
  const before = Array.from({ length: 12_000 }, (_, line) => `Company ${line},${line},1.5`);
  const file = (...lines: readonly string[]): string => [...before, ...lines].join('\n');

  it('counts its lines through those before and line ends inside quotes', async () => {
    const { grid } = await readCsv(bytes(file('"A\nB",1,2', '', 'C,"3",4')));
    expect(grid.rows.slice(-2)).toEqual([
      ['A\nB', '1', '2'],
      ['C', '3', '4'],
    ]);
    expect(grid.lines.slice(-3)).toEqual([12_000, 12_001, 12_004]);
  });

  it('names the line of what it refuses', async () => {
    expect((await refusal(file('a"b,1,2'))).data).toEqual({ row: 12_001 });
    expect((await refusal(file('"a"b,1,2'))).data).toEqual({ row: 12_001 });
    expect((await refusal(file('"a,1,2', 'b,1,2'))).data).toEqual({ row: 12_002 });
    expect((await refusal(file('x'.repeat(5_000_000)))).data).toEqual({ row: 12_001 });
    expect((await refusal(file('"A\nB",1,2', 'x'.repeat(70_000)))).data).toEqual({
      row: 12_003,
      column: 1,
    });
  });

  it('lets go of a source that it refuses half read', async () => {
    for (const fault of ['x'.repeat(70_000), '"x"y']) {
      const source = Readable.from([bytes(file(fault, '')), bytes(file(''))]);
      await expectAsync(readCsv(source)).toBeRejectedWithError(TableError);
      expect(source.destroyed).toBeTrue();
    }
  });
});
