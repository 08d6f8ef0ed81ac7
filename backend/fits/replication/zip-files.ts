import { Readable } from 'node:stream';
import { setImmediate } from 'node:timers/promises';
import { ZipFile } from 'yazl';
import type { PackFile } from './replication-pack';

/** The earliest date that the format knows, on the local clock, which is what it stores: the same bytes anywhere. */
const noDate = new Date(1980, 0, 1);

/** One zip of the files, as a stream; other work goes on between the parts of a text. */
export function zipFiles(files: readonly PackFile[]): Readable {
  const zip = new ZipFile();
  for (const { name, text } of files) {
    const options = { mtime: noDate, forceDosTimestamp: true, mode: 0o100644 };
    if (typeof text === 'string') zip.addBuffer(Buffer.from(text, 'utf8'), name, options);
    else zip.addReadStream(Readable.from(inTurns(text), { objectMode: false }), name, options);
  }
  zip.end();
  return zip.outputStream as Readable;
}

async function* inTurns(parts: Iterable<string>): AsyncGenerator<Buffer> {
  for (const part of parts) {
    yield Buffer.from(part, 'utf8');
    await setImmediate();
  }
}
