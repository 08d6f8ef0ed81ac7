import { createHash } from 'node:crypto';

/** SHA-256 of an edition's frozen text, in hexadecimal. */
export function contentHash(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}
