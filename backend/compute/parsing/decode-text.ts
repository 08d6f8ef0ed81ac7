import { TextDecoder } from 'node:util';
import type { TextEncoding } from '../file-recipe';
import { TableError } from './table-error';
import { utf16Of } from './utf16';

/**
 * Decodes a byte stream; the byte order mark is taken off, and every line end becomes a line feed.
 *
 * @param encoding  where it is left out, UTF-16 where the byte order mark or zeros say so, and else UTF-8.
 * @throws {TableError} 'csv-invalid' for bytes that are no text, or a NUL character, with its line.
 */
export async function* decodeText(
  source: AsyncIterable<Uint8Array> | Iterable<Uint8Array>,
  encoding?: TextEncoding,
): AsyncGenerator<string> {
  let decoder: TextDecoder | undefined;
  let head: Uint8Array = new Uint8Array(0);
  let line = 1;
  let heldBack = '';
  const decode = (by: TextDecoder, bytes?: Uint8Array): string => {
    const text = heldBack + decodeStrictly(by, bytes, line);
    // A carriage return at the end of a chunk may be half of a line end.
    heldBack = bytes !== undefined && text.endsWith('\r') ? '\r' : '';
    const part = text.slice(0, text.length - heldBack.length);
    const whole = part.includes('\r') ? part.replace(/\r\n?/gu, '\n') : part;
    line = refuseNul(whole, line);
    return whole;
  };
  for await (const chunk of source) {
    if (decoder === undefined) {
      head = Buffer.concat([head, chunk]);
      if (head.length < 3) continue;
      decoder = decoderFor(head, encoding);
      yield decode(decoder, head);
    } else {
      yield decode(decoder, chunk);
    }
  }
  if (decoder === undefined) {
    decoder = decoderFor(head, encoding);
    yield decode(decoder, head);
  }
  yield decode(decoder);
}

function decoderFor(head: Uint8Array, encoding?: TextEncoding): TextDecoder {
  const name = encoding === 'utf-16' ? (utf16Of(head) ?? 'utf-16le') : encoding;
  return new TextDecoder(name ?? utf16Of(head) ?? 'utf-8', { fatal: true });
}

function decodeStrictly(decoder: TextDecoder, bytes: Uint8Array | undefined, line: number): string {
  try {
    return bytes === undefined ? decoder.decode() : decoder.decode(bytes, { stream: true });
  } catch (error) {
    if (!(error instanceof TypeError)) throw error;
    const message = `expected text in ${decoder.encoding.toUpperCase()}; found other bytes after line ${line}. Choose the encoding that it has, or save the file as “CSV UTF-8” and try again`;
    throw new TableError('csv-invalid', message, { row: line });
  }
}

/** @returns the line after the text. */
function refuseNul(text: string, line: number): number {
  const place = text.indexOf('\0');
  const end = place === -1 ? text.length : place;
  let lines = line;
  for (
    let index = text.indexOf('\n');
    index !== -1 && index < end;
    index = text.indexOf('\n', index + 1)
  ) {
    lines += 1;
  }
  if (place === -1) return lines;
  throw new TableError(
    'csv-invalid',
    `expected a text file; found a NUL character on line ${lines}`,
    {
      row: lines,
    },
  );
}
