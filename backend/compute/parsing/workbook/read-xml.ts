import { TextDecoder } from 'node:util';
import { SaxesParser } from 'saxes';
import { FileRefusal } from '../file-refusal';

/** What a part's XML says, name prefixes taken off. */
export interface XmlHandler {
  readonly open?: (name: string, attributes: Readonly<Record<string, string>>) => void;
  readonly text?: (text: string) => void;
  readonly close?: (name: string) => void;
}

/**
 * Reads one XML part as it is unpacked. Entities other than XML's own five are never resolved.
 *
 * @throws {FileRefusal} 'xlsx_active_content' for a document type definition, 'type_not_allowed' for no XML.
 */
export async function readXml(
  path: string,
  chunks: AsyncIterable<Uint8Array>,
  handler: XmlHandler = {},
): Promise<void> {
  const parser = new SaxesParser<{ readonly xmlns?: false; readonly position: boolean }>({
    position: false,
  });
  parser.on('doctype', () => {
    throw new FileRefusal(
      'xlsx_active_content',
      `expected a workbook without document type definitions; found one in ${path}. Save a copy that holds values only and choose that file`,
    );
  });
  parser.on('error', (error) => {
    throw notXml(path, error);
  });
  const { open, text, close } = handler;
  if (open)
    parser.on('opentag', (tag) => {
      open(localName(tag.name), tag.attributes);
    });
  if (text) {
    parser.on('text', text);
    parser.on('cdata', text);
  }
  if (close)
    parser.on('closetag', (tag) => {
      close(localName(tag.name));
    });

  let decoder: TextDecoder | undefined;
  for await (const chunk of chunks) {
    decoder ??= new TextDecoder(encodingOf(chunk), { fatal: true });
    parser.write(decode(path, decoder, chunk));
  }
  parser.write(decoder === undefined ? '' : decode(path, decoder));
  parser.close();
}

/** An attribute by its local name: `r:id` and `rel:id` are the same one. */
export function attributeNamed(
  attributes: Readonly<Record<string, string>>,
  name: string,
): string | undefined {
  const key = Object.keys(attributes).find((found) => localName(found) === name);
  return key === undefined ? undefined : attributes[key];
}

function localName(name: string): string {
  const colon = name.indexOf(':');
  return colon === -1 ? name : name.slice(colon + 1);
}

function encodingOf(head: Uint8Array): string {
  if (head[0] === 0xff && head[1] === 0xfe) return 'utf-16le';
  if (head[0] === 0xfe && head[1] === 0xff) return 'utf-16be';
  return 'utf-8';
}

function decode(path: string, decoder: TextDecoder, chunk?: Uint8Array): string {
  try {
    return chunk === undefined ? decoder.decode() : decoder.decode(chunk, { stream: true });
  } catch (error) {
    if (!(error instanceof TypeError)) throw error;
    throw notXml(path, error);
  }
}

function notXml(path: string, error: Error): FileRefusal {
  return new FileRefusal(
    'type_not_allowed',
    `expected a whole .xlsx workbook; ${path} is not XML as it ought to be (${error.message})`,
  );
}
