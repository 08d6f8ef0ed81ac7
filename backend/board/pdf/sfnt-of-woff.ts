import { inflateSync } from 'node:zlib';

const woffHeader = 44;
const woffEntry = 20;
const sfntHeader = 12;
const sfntEntry = 16;

/**
 * The font inside a WOFF file with its tables inflated once, by zlib: the font reader inflates them anew for every
 * document, in JavaScript, which took most of the time of a PDF.
 *
 * @throws {Error} for bytes that are no WOFF.
 * @see W3C (2012), WOFF File Format 1.0, §3 to §5.
 */
export function sfntOfWoff(woff: Buffer): Buffer {
  if (woff.toString('latin1', 0, 4) !== 'wOFF') throw new Error('expected a WOFF file');
  const count = woff.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, index) => {
    const at = woffHeader + woffEntry * index;
    const [offset, packed, length] = [4, 8, 12].map((field) => woff.readUInt32BE(at + field));
    const bytes = woff.subarray(offset, offset + packed);
    return {
      tag: woff.subarray(at, at + 4),
      checksum: woff.subarray(at + 16, at + 20),
      bytes: packed < length ? inflateSync(bytes) : bytes,
    };
  });
  const directory = Buffer.alloc(sfntHeader + sfntEntry * count);
  woff.copy(directory, 0, 4, 8);
  const power = Math.floor(Math.log2(count));
  directory.writeUInt16BE(count, 4);
  directory.writeUInt16BE(16 * 2 ** power, 6);
  directory.writeUInt16BE(power, 8);
  directory.writeUInt16BE(16 * (count - 2 ** power), 10);
  let offset = directory.length;
  const padded = tables.map(({ tag, checksum, bytes }, index) => {
    const at = sfntHeader + sfntEntry * index;
    tag.copy(directory, at);
    checksum.copy(directory, at + 4);
    directory.writeUInt32BE(offset, at + 8);
    directory.writeUInt32BE(bytes.length, at + 12);
    const whole = Buffer.concat([bytes, Buffer.alloc((4 - (bytes.length % 4)) % 4)]);
    offset += whole.length;
    return whole;
  });
  return Buffer.concat([directory, ...padded]);
}
