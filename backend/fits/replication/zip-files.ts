import type { Readable } from 'node:stream';
import { ZipFile } from 'yazl';
import type { PackFile } from './replication-pack';

/** The earliest date that the format knows, on the local clock, which is what it stores: the same bytes anywhere. */
const noDate = new Date(1980, 0, 1);

/** One zip of the files, as a stream. */
export function zipFiles(files: readonly PackFile[]): Readable {
  const zip = new ZipFile();
  for (const { name, text } of files)
    zip.addBuffer(Buffer.from(text, 'utf8'), name, {
      mtime: noDate,
      forceDosTimestamp: true,
      mode: 0o100644,
    });
  zip.end();
  return zip.outputStream as Readable;
}
