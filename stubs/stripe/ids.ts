import { randomInt } from 'node:crypto';

const alphabet = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

function randomText(characters: string, length: number): string {
  return Array.from({ length }, () => characters[randomInt(characters.length)]).join('');
}

/** Short ids such as `cus_`, `si_`, `req_`: the prefix and 14 characters of base62. */
export function shortId(prefix: string): string {
  return prefix + randomText(alphabet, 14);
}

/** Long ids such as `sub_`, `in_`, `il_`, `pm_`: the prefix, a `1` and 23 characters of base62. */
export function longId(prefix: string): string {
  return `${prefix}1${randomText(alphabet, 23)}`;
}

/** The eight capitals and digits that start every invoice number of one customer. */
export function invoicePrefix(): string {
  return randomText('0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ', 8);
}
