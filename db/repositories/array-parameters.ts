/** Type oids of PostgreSQL. */
const int4 = 23;
const text = 25;
const float8 = 701;

/** Dimensions, whether there are nulls, type; then the one dimension's length and its first index. */
const headBytes = 20;
const lengthBytes = 4;
/** In place of an element's length. */
const isNull = -1;

/**
 * Parameters of `integer[]`, `double precision[]` and `text[]` as PostgreSQL's array_recv reads them, most significant
 * byte first; the driver sends a Buffer in binary. Against array literals, writing 200,000 rows of three figures took
 * half the time of this process and nobody reads or prints a decimal number.
 */
export function int4Array(values: Int32Array): Buffer {
  const width = lengthBytes + 4;
  const bytes = begin(int4, values.length, values.length * width);
  values.forEach((value, index) => {
    const at = headBytes + index * width;
    bytes.writeInt32BE(4, at);
    bytes.writeInt32BE(value, at + lengthBytes);
  });
  return bytes;
}

/** NaN becomes null. */
export function float8Array(values: Float64Array): Buffer {
  const bytes = begin(float8, values.length, values.length * (lengthBytes + 8));
  let at = headBytes;
  for (const value of values) {
    if (Number.isNaN(value)) at = bytes.writeInt32BE(isNull, at);
    else at = bytes.writeDoubleBE(value, bytes.writeInt32BE(8, at));
  }
  return bytes.subarray(0, at);
}

/** Texts, or their bytes in UTF-8. */
export function textArray(values: readonly (string | Buffer)[]): Buffer {
  const texts = values.map((value) => (typeof value === 'string' ? Buffer.from(value) : value));
  const size = texts.reduce((sum, bytes) => sum + lengthBytes + bytes.length, 0);
  const array = begin(text, texts.length, size);
  let at = headBytes;
  for (const bytes of texts) {
    at = array.writeInt32BE(bytes.length, at);
    at += bytes.copy(array, at);
  }
  return array;
}

/** PostgreSQL counts the elements itself and looks at no more than the type; it lets an array say that it has nulls. */
function begin(type: number, length: number, size: number): Buffer {
  const bytes = Buffer.allocUnsafe(headBytes + size);
  [1, 1, type, length, 1].forEach((word, index) => bytes.writeInt32BE(word, index * 4));
  return bytes;
}
