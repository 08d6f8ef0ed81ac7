import { isUtf8 } from 'node:buffer';
import type { TextEncoding } from '../file-recipe';
import { utf16Of } from './utf16';

/**
 * How the text of a file is written: UTF-16 by its mark or its zeros; else UTF-8 where its bytes are that; else
 * Windows-1252, unless it holds a byte that is no character there. What is nothing of these counts as UTF-8, to be
 * refused with its line.
 */
export function textEncodingOf(bytes: Uint8Array): TextEncoding {
  if (utf16Of(bytes) !== undefined) return 'utf-16';
  return isUtf8(bytes) || hasUtf8Mark(bytes) || bytes.some(isNoText) ? 'utf-8' : 'windows-1252';
}

function hasUtf8Mark([first, second, third]: Uint8Array): boolean {
  return first === 0xef && second === 0xbb && third === 0xbf;
}

/** The bytes that Windows-1252 leaves open. */
const noText: ReadonlySet<number> = new Set([0x81, 0x8d, 0x8f, 0x90, 0x9d]);

function isNoText(byte: number): boolean {
  return noText.has(byte);
}
