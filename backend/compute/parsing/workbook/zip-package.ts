import { type Entry, fromBufferPromise, type ZipFile } from 'yauzl';
import { FileRefusal } from '../file-refusal';

/** How much a workbook's zip may unpack to, in entries and bytes. */
export const zipLimits = {
  entries: 200,
  totalBytes: 100 * 1024 * 1024,
  entryBytes: 60 * 1024 * 1024,
  /** Unpacked to packed bytes of one entry. */
  ratio: 100,
} as const;

/** The parts of a workbook's zip, by path. Sizes are held to the limits twice: as declared, and as unpacked. */
export class ZipPackage {
  #unpacked = 0;

  private constructor(
    private readonly zip: ZipFile,
    private readonly entries: ReadonlyMap<string, Entry>,
  ) {}

  /**
   * Reads the list of parts and unpacks none.
   *
   * @throws {FileRefusal} 'zip_limit', 'xlsx_active_content' for encrypted parts, 'type_not_allowed' for a damaged zip.
   */
  static async open(bytes: Uint8Array): Promise<ZipPackage> {
    const entries = new Map<string, Entry>();
    try {
      const buffer = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
      // Sizes are counted here, against limits of our own; the library's check would end in an error without a code.
      const zip = await fromBufferPromise(buffer, {
        lazyEntries: true,
        autoClose: false,
        validateEntrySizes: false,
      });
      if (zip.entryCount > zipLimits.entries) throw tooManyEntries(zip.entryCount);
      let total = 0;
      for await (const entry of zip.eachEntry()) {
        total += entry.uncompressedSize;
        refuseDeclared(entry, total);
        if (entries.has(entry.fileName)) throw damaged(`two parts named ${entry.fileName}`);
        entries.set(entry.fileName, entry);
        if (entries.size > zipLimits.entries) throw tooManyEntries(entries.size);
      }
      return new ZipPackage(zip, entries);
    } catch (error) {
      throw asRefusal(error);
    }
  }

  get paths(): readonly string[] {
    return [...this.entries.keys()];
  }

  has(path: string): boolean {
    return this.entries.has(path);
  }

  /**
   * Unpacks one part, chunk by chunk, and stops at the limits whatever sizes it declares.
   *
   * @throws {FileRefusal} 'zip_limit', or 'type_not_allowed' for a part that is missing or damaged.
   */
  async *unpack(path: string): AsyncGenerator<Uint8Array> {
    const entry = this.entries.get(path);
    if (entry === undefined) throw damaged(`no part ${path}`);
    const mostBytes = Math.min(zipLimits.entryBytes, zipLimits.ratio * entry.compressedSize);
    let unpacked = 0;
    try {
      const stream = await this.zip.openReadStreamPromise(entry);
      for await (const chunk of stream as AsyncIterable<Uint8Array>) {
        unpacked += chunk.length;
        this.#unpacked += chunk.length;
        if (unpacked > mostBytes) throw tooLarge(path, `more than ${inMegabytes(mostBytes)}`);
        if (this.#unpacked > zipLimits.totalBytes)
          throw tooLarge('the whole file', `more than ${inMegabytes(zipLimits.totalBytes)}`);
        yield chunk;
      }
    } catch (error) {
      throw asRefusal(error);
    }
  }
}

function refuseDeclared(entry: Entry, total: number): void {
  const { fileName, uncompressedSize, compressedSize } = entry;
  if (entry.isEncrypted())
    throw new FileRefusal(
      'xlsx_active_content',
      'expected a workbook without a password; found encrypted parts. Save a copy without one and choose that file',
    );
  if (uncompressedSize > zipLimits.entryBytes)
    throw tooLarge(fileName, inMegabytes(uncompressedSize));
  if (total > zipLimits.totalBytes)
    throw tooLarge('the whole file', `more than ${inMegabytes(zipLimits.totalBytes)}`);
  if (uncompressedSize > zipLimits.ratio * compressedSize)
    throw tooLarge(fileName, `more than ${zipLimits.ratio} times its packed size`);
}

function tooManyEntries(count: number): FileRefusal {
  return new FileRefusal(
    'zip_limit',
    `expected a workbook of at most ${zipLimits.entries} parts; found ${count}`,
  );
}

function tooLarge(what: string, size: string): FileRefusal {
  return new FileRefusal(
    'zip_limit',
    `expected a workbook that unpacks to at most ${inMegabytes(zipLimits.totalBytes)}, ${inMegabytes(zipLimits.entryBytes)} a part; ${what} would take ${size}`,
  );
}

function damaged(found: string): FileRefusal {
  return new FileRefusal('type_not_allowed', `expected a whole .xlsx workbook; found ${found}`);
}

function inMegabytes(bytes: number): string {
  return `${Number((bytes / (1024 * 1024)).toPrecision(3))} MB`;
}

/** The zip library and zlib throw plain errors for a damaged file: all they can say of bytes in memory. */
function asRefusal(error: unknown): unknown {
  if (error instanceof FileRefusal || !(error instanceof Error)) return error;
  return damaged(`a damaged zip (${error.message})`);
}
