import { parseHeaderValue } from 'nodemailer/lib/mime-funcs';

/** What a reader's program would show of a mail. */
export interface ReadMail {
  readonly subject: string;
  readonly from: string;
  readonly to: string;
  readonly messageId: string;
  readonly text: string;
  readonly html: string;
}

interface Part {
  readonly headers: ReadonlyMap<string, string>;
  readonly body: string;
}

/**
 * Reads a mail as one mailing package composes it (RFC 2045 to 2047): text, HTML or both as alternatives, in UTF-8.
 *
 * @param source  headers and body, a character a byte.
 */
export function readMail(source: string): ReadMail {
  const whole = readPart(source);
  const parts = leaves(whole);
  const header = (name: string): string => decodeWords(whole.headers.get(name) ?? '');
  return {
    subject: header('subject'),
    from: header('from'),
    to: header('to'),
    messageId: header('message-id'),
    text: bodyOf(parts, 'text/plain'),
    html: bodyOf(parts, 'text/html'),
  };
}

function readPart(source: string): Part {
  const [head, ...rest] = source.split('\r\n\r\n');
  const lines = head.replace(/\r\n[ \t]+/g, ' ').split('\r\n');
  const headers = lines.map((line): [string, string] => {
    const colon = line.indexOf(':');
    return [line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim()];
  });
  return { headers: new Map(headers), body: rest.join('\r\n\r\n') };
}

function typeOf({ headers }: Part): { readonly value: string; readonly boundary?: string } {
  const { value, params } = parseHeaderValue(headers.get('content-type') ?? 'text/plain');
  return { value: value.toLowerCase(), boundary: params['boundary'] };
}

function leaves(part: Part): readonly Part[] {
  const { boundary } = typeOf(part);
  if (boundary === undefined) return [part];
  const inner = `\r\n${part.body}`.split(`\r\n--${boundary}`).slice(1, -1);
  return inner.flatMap((text) => leaves(readPart(text.replace(/^\r\n/, ''))));
}

function bodyOf(parts: readonly Part[], type: string): string {
  const part = parts.find((candidate) => typeOf(candidate).value === type);
  if (part === undefined) return '';
  const encoding = part.headers.get('content-transfer-encoding')?.toLowerCase();
  const bytes =
    encoding === 'base64'
      ? Buffer.from(part.body, 'base64')
      : encoding === 'quoted-printable'
        ? quotedPrintable(part.body.replace(/=\r\n/g, ''))
        : Buffer.from(part.body, 'latin1');
  return bytes.toString('utf8').replaceAll('\r\n', '\n');
}

function quotedPrintable(text: string): Buffer {
  const bytes = text.replace(/=([0-9A-F]{2})/gi, (_, hex: string) =>
    String.fromCharCode(Number.parseInt(hex, 16)),
  );
  return Buffer.from(bytes, 'latin1');
}

function decodeWords(header: string): string {
  return header
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, kind: string, word: string) =>
      kind.toLowerCase() === 'b'
        ? Buffer.from(word, 'base64').toString('utf8')
        : quotedPrintable(word.replaceAll('_', ' ')).toString('utf8'),
    );
}
