import { Readable } from 'node:stream';
import { readTable } from './read-table';
import { TableError } from './table-error';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

async function refusal(source: Uint8Array): Promise<TableError> {
  try {
    await readTable(source);
  } catch (error) {
    if (error instanceof TableError) return error;
    throw error;
  }
  throw new Error('the file was not refused');
}

describe('readTable', () => {
  for (const [name, delimiter] of [
    ['commas', ','],
    ['semicolons', ';'],
    ['tabs', '\t'],
  ] as const) {
    it(`reads ${name}`, async () => {
      const text =
        ['company', 'year', 'value'].join(delimiter) + '\nA' + delimiter + '2020' + delimiter;
      const table = await readTable(bytes(`${text}7\n`));
      expect(table.delimiter).toBe(delimiter);
      expect(table.rows).toEqual([['A', '2020', '7']]);
    });
  }

  it('takes semicolons where decimal commas are as frequent', async () => {
    const table = await readTable(bytes('a;b\n1,5;2,5\n3,5;4,5\n'));
    expect(table.rows).toEqual([
      ['1,5', '2,5'],
      ['3,5', '4,5'],
    ]);
  });

  it('counts lines of the file through blank lines and line ends inside quotes', async () => {
    for (const end of ['\n', '\r\n', '\r']) {
      const text = ['a,b', '1,"x', 'y"', '', '2,z', '3,w'].join(end);
      const table = await readTable(bytes(text));
      expect(table.lines).toEqual([2, 5, 6]);
      expect(table.rows[0][1]).toBe('x\ny');
    }
  });

  it('keeps a line end whole that a stream cuts in two', async () => {
    const chunks = ['a,b\r', '\n1,2\r', '\n3,4'].map((text) => Buffer.from(text));
    const table = await readTable(Readable.from(chunks));
    expect(table.lines).toEqual([2, 3]);
  });

  it('reads UTF-8 and both kinds of UTF-16 by their byte order marks', async () => {
    const text = 'Börsenwert,b\n1,2\n';
    const little = Buffer.from(`\ufeff${text}`, 'utf16le');
    const big = Buffer.from(little).swap16();
    for (const source of [bytes(`\ufeff${text}`), bytes(text), little, big]) {
      expect((await readTable(source)).header).toEqual(['Börsenwert', 'b']);
    }
  });

  it('names blank headers and tells repeated ones apart', async () => {
    const table = await readTable(bytes('x,,x\n1,2,3\n'));
    expect(table.header).toEqual(['x', 'column 2', 'x (2)']);
    expect(table.repeatedHeaders).toEqual(['x']);
  });

  it('fills a short row and refuses one that is too long, with its line', async () => {
    expect((await readTable(bytes('a,b\n1\n'))).rows).toEqual([['1', '']]);
    const { code, data } = await refusal(bytes('a,b\n1,2\n1,2,3\n'));
    expect(code).toBe('csv-invalid');
    expect(data).toEqual({ row: 3, column: 3 });
  });

  it('refuses an empty file, a NUL, other encodings and quotes that do not match', async () => {
    for (const source of [
      bytes(''),
      bytes('a,b\n1,\0\n'),
      Uint8Array.of(0x61, 0x0a, 0xe4, 0x0a),
      bytes('a,b\n"1,2\n3,4\n'),
      bytes('a,b\n1"2,3\n'),
      bytes('a,b\n"1"2,3\n'),
    ]) {
      expect((await refusal(source)).code).toBe('csv-invalid');
    }
  });

  it('names the line of a quote in the wrong place', async () => {
    expect((await refusal(bytes('a,b\n1,2\n1"2,3\n4,5\n'))).data).toEqual({ row: 3 });
    expect((await refusal(bytes('a,b\n1,2\n"1"2,3\n4,5\n'))).data).toEqual({ row: 3 });
    expect((await refusal(bytes('a,b\n"1,2\n3,4'))).message).toContain(
      'never closed, up to line 3',
    );
  });

  it('refuses a NUL with the line it stands on', async () => {
    expect((await refusal(bytes('a,b\n1,2\n1,\0\n'))).data).toEqual({ row: 3 });
  });

  it('stops at its limits', async () => {
    const limits = { rows: 2, columns: 2, cells: 8, fieldLength: 3 };
    const read = (text: string): Promise<unknown> => readTable(bytes(text), limits);
    await expectAsync(read('a,b\n1,2\n3,4\n')).toBeResolved();
    await expectAsync(read('a,b\n1,2\n3,4\n5,6\n')).toBeRejectedWithError(
      TableError,
      /at most 2 rows/,
    );
    await expectAsync(read('a,b,c\n')).toBeRejectedWithError(TableError, /at most 2 columns/);
    await expectAsync(read('a,b\n1234,2\n')).toBeRejectedWithError(
      TableError,
      /at most 3 characters/,
    );
  });

  it('counts cells, not only rows and columns', async () => {
    const limits = { rows: 9, columns: 9, cells: 5, fieldLength: 9 };
    await expectAsync(readTable(bytes('a,b\n1,2\n3,4\n'), limits)).toBeResolved();
    await expectAsync(readTable(bytes('a,b\n1,2\n3,4\n5,6\n'), limits)).toBeRejectedWithError(
      TableError,
      /at most 2 rows of 2 columns/,
    );
  });

  it('reports a failure of the stream itself', async () => {
    const broken = Readable.from(
      (async function* () {
        await Promise.resolve();
        yield Buffer.from('a,b\n1,2\n');
        throw new Error('disk gone');
      })(),
    );
    await expectAsync(readTable(broken)).toBeRejectedWithError('disk gone');
  });
});
