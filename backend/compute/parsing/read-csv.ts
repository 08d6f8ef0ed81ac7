import { CsvError, parse } from 'csv-parse';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { TextEncoding } from '../file-recipe';
import { addUnquotedLines } from './add-unquoted-lines';
import { decodeText } from './decode-text';
import { sniffDelimiter } from './sniff-delimiter';
import type { Grid } from './grid';
import { GridBuilder } from './grid-builder';
import { type Delimiter, type TableLimits, tableLimits } from './table';
import { TableError } from './table-error';

/** Characters of the file's beginning that the delimiter is read from. */
const sniffedLength = 65_536;

const pieceLength = 65_536;

/** A record longer than this is a quote that was never closed. */
const longestRecord = 4_194_304;

/**
 * Reads a CSV file: comma, semicolon or tab, quoted fields, as a stream.
 *
 * @param source  the file's bytes, or a stream of them.
 * @param encoding  how its text is written; UTF-16 is recognised, and else UTF-8 expected, where it is left out.
 * @throws {TableError} 'csv-invalid' with the line, or 'table-too-large' as soon as a limit is passed.
 */
export async function readCsv(
  source: Uint8Array | AsyncIterable<Uint8Array>,
  limits: TableLimits = tableLimits,
  encoding?: TextEncoding,
): Promise<{ readonly grid: Grid; readonly delimiter: Delimiter }> {
  const text = decodeText(source instanceof Uint8Array ? piecesOf(source) : source, encoding);
  try {
    const { head, isWhole } = await readHead(text);
    const delimiter = sniffDelimiter(head);
    const builder = new GridBuilder(limits);
    const whole = isWhole ? beginningWith(head) : beginningWith(head, text);
    const rest = await addUnquotedLines(whole, delimiter, longestRecord, builder);
    if (rest !== undefined) await addRecords(beginningWith(rest, whole), delimiter, builder);
    return { grid: builder.finish(), delimiter };
  } finally {
    // A refusal leaves the source half read.
    await text.return(undefined);
  }
}

/** Adds text of which any field may be quoted. */
async function addRecords(
  text: AsyncIterable<string>,
  delimiter: Delimiter,
  builder: GridBuilder,
): Promise<void> {
  const linesBefore = builder.lineCount;
  const parser = parse({
    delimiter,
    relax_column_count: true,
    record_delimiter: '\n',
    max_record_size: longestRecord,
  });
  parser.on('data', (record: string[]) => {
    try {
      builder.add(record);
    } catch (error) {
      parser.destroy(error as Error);
    }
  });
  try {
    await pipeline(Readable.from(text), parser);
  } catch (error) {
    throw asTableError(error, linesBefore);
  }
}

/** Pieces, so that a file is never one more long string in memory. */
function* piecesOf(bytes: Uint8Array): Generator<Uint8Array> {
  for (let start = 0; start < bytes.length; start += pieceLength)
    yield bytes.subarray(start, start + pieceLength);
}

async function readHead(text: AsyncGenerator<string>): Promise<{ head: string; isWhole: boolean }> {
  let head = '';
  while (head.length < sniffedLength) {
    const next = await text.next();
    if (next.done === true) return { head, isWhole: true };
    head += next.value;
  }
  return { head, isWhole: false };
}

async function* beginningWith(head: string, rest?: AsyncGenerator<string>): AsyncGenerator<string> {
  yield head;
  if (rest !== undefined) yield* rest;
}

function asTableError(error: unknown, linesBefore: number): unknown {
  if (!(error instanceof CsvError)) return error;
  const fault = csvFaults.get(error.code) ?? 'text that is none at line';
  const line = linesBefore + Number(error['lines']);
  return new TableError('csv-invalid', `expected a table; found ${fault} ${line}`, { row: line });
}

const csvFaults = new Map<string, string>([
  ['CSV_QUOTE_NOT_CLOSED', 'a quote that opens a field and is never closed, up to line'],
  ['CSV_MAX_RECORD_SIZE', 'a row too long to be one, or a quote never closed, before line'],
  ['INVALID_OPENING_QUOTE', 'a quote in the middle of a field on line'],
  ['CSV_INVALID_CLOSING_QUOTE', 'text behind the closing quote of a field on line'],
]);
