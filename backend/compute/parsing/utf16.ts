const bytesLookedAt = 4096;

/**
 * Whether text is UTF-16, and in which order of bytes: by its byte order mark, or without one by zeros in every other
 * place, as letters, digits and delimiters have them.
 */
export function utf16Of(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | undefined {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  const pairs = Math.floor(Math.min(bytes.length, bytesLookedAt) / 2);
  const zeros = [0, 0];
  for (let index = 0; index < 2 * pairs; index += 1) if (bytes[index] === 0) zeros[index % 2] += 1;
  const [even, odd] = zeros;
  if (even === 0 && odd > 0.7 * pairs) return 'utf-16le';
  if (odd === 0 && even > 0.7 * pairs) return 'utf-16be';
  return undefined;
}
