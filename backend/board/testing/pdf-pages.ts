import { extractText } from 'unpdf';

/** The text of each page of a PDF, in the order it was written. */
export async function pdfPages(bytes: Buffer): Promise<readonly string[]> {
  const { text } = await extractText(new Uint8Array(bytes), { mergePages: false });
  return text;
}
