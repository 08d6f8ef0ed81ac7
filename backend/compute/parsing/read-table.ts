import { CsvError, type Info, parse, type Parser } from 'csv-parse';
import { decodeText } from './decode-text';
import { sniffDelimiter } from './sniff-delimiter';
import { type Table, type TableLimits, tableLimits } from './table';
import { TableBuilder } from './table-builder';
import { TableError } from './table-error';

/** Characters of the file's beginning that the delimiter is read from. */
const sniffedLength = 65_536;

/** A record longer than this is a quote that was never closed. */
const longestRecord = 4_194_304;

/**
 * Reads a CSV file: comma, semicolon or tab, quoted fields, UTF-8 or UTF-16, as a stream.
 *
 * @param source  the file's bytes, or a stream of them.
 * @throws {TableError} 'csv-invalid' with the line, or 'table-too-large' as soon as a limit is passed.
 */
export async function readTable(
  source: Uint8Array | AsyncIterable<Uint8Array>,
  limits: TableLimits = tableLimits,
): Promise<Table> {
  const text = decodeText(source instanceof Uint8Array ? [source] : source);
  const { head, isWhole } = await readHead(text);
  const delimiter = sniffDelimiter(head);
  const parser = parse({
    delimiter,
    info: true,
    relax_column_count: true,
    record_delimiter: '\n',
    max_record_size: longestRecord,
  });
  const builder = new TableBuilder(limits);
  const feeding = feed(parser, head, isWhole ? null : text);
  try {
    for await (const { record, info } of parser as AsyncIterable<ParsedRecord>) {
      builder.add(record, info.lines);
    }
  } catch (error) {
    parser.destroy();
    await feeding.catch(() => undefined);
    throw asTableError(error, builder.lastLine);
  }
  await feeding;
  return builder.finish(delimiter);
}

interface ParsedRecord {
  readonly record: string[];
  readonly info: Info;
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

/** Writes the text into the parser at the parser's own pace; a failure of the source reaches its reader. */
async function feed(
  parser: Parser,
  head: string,
  rest: AsyncGenerator<string> | null,
): Promise<void> {
  try {
    await write(parser, head);
    if (rest !== null) {
      for await (const chunk of rest) {
        if (parser.destroyed) return;
        await write(parser, chunk);
      }
    }
    parser.end();
  } catch (error) {
    parser.destroy(error as Error);
  }
}

async function write(parser: Parser, chunk: string): Promise<void> {
  if (chunk === '' || parser.write(chunk)) return;
  await new Promise<void>((resolve) => {
    parser.once('drain', resolve);
    parser.once('close', resolve);
  });
}

/** @param lastLine  line of the last row that could be read. */
function asTableError(error: unknown, lastLine: number): unknown {
  if (!(error instanceof CsvError)) return error;
  const found = csvFaults.get(error.code) ?? 'text that is none';
  const message = `expected a table; found ${found}, after line ${lastLine}`;
  return new TableError('csv-invalid', message, { row: lastLine + 1 });
}

const csvFaults = new Map<string, string>([
  ['CSV_QUOTE_NOT_CLOSED', 'a quote that is never closed'],
  ['CSV_MAX_RECORD_SIZE', 'a row that is too long, or a quote that is never closed'],
  ['INVALID_OPENING_QUOTE', 'a quote in the middle of a field that does not begin with one'],
  ['CSV_INVALID_CLOSING_QUOTE', 'text behind the closing quote of a field'],
]);
