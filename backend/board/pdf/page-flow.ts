import PDFDocument from 'pdfkit';
import { type Face, type FontRun, Fonts } from './fonts';
import { ink } from './print-colours';

export type Paper = 'a4' | 'letter';

export interface TextStyle {
  readonly face?: Face;
  readonly size?: number;
  readonly colour?: string;
}

const margin = 54;
const headSpace = 30;
const footSpace = 42;
const usualSize = 9.5;
const leading = 1.38;
const mostKeptLines = 5;
const measuredSize = 100;

const fonts = new Fonts();

/**
 * A document that is written from top to bottom, in PDF points. Text is broken into lines and pages here, with the
 * product's own fonts; what repeats on every page is drawn at the end, when their number is known.
 */
export class PageFlow {
  readonly document: PDFKit.PDFDocument;
  readonly left = margin;
  readonly right: number;
  readonly top = margin + headSpace;
  readonly bottom: number;
  y: number;
  readonly #registered = new Set<string>();
  readonly #widths = new Map<string, number>();

  constructor(paper: Paper, info: PDFKit.DocumentInfo) {
    this.document = new PDFDocument({
      size: paper === 'a4' ? 'A4' : 'LETTER',
      margin: 0,
      bufferPages: true,
      autoFirstPage: true,
      info,
      lang: 'en',
      tagged: true,
      pdfVersion: '1.7',
      displayTitle: true,
      // None of the viewer's own fonts: every text names one of ours.
      font: '',
    });
    this.right = this.document.page.width - margin;
    this.bottom = this.document.page.height - margin - footSpace;
    this.y = this.top;
  }

  get width(): number {
    return this.right - this.left;
  }

  /** Goes to the next page where fewer points are left than wanted. */
  need(points: number): void {
    if (this.y + points > this.bottom) this.newPage();
  }

  newPage(): void {
    this.document.addPage();
    this.y = this.top;
  }

  space(points: number): void {
    this.y = Math.min(this.y + points, this.bottom);
  }

  /** Width of a text in points. */
  measure(text: string, { face = 'words', size = usualSize }: TextStyle = {}): number {
    return fonts.runs(face, text).reduce((sum, run) => sum + this.#width(run) * size, 0);
  }

  /** Width at a size of one point: laying text out is what a document costs, and its words come again and again. */
  #width({ font, text }: FontRun): number {
    const key = `${font} ${text}`;
    const known = this.#widths.get(key);
    if (known !== undefined) return known;
    const width = this.#with(font, measuredSize).widthOfString(text) / measuredSize;
    this.#widths.set(key, width);
    return width;
  }

  /** One line of text; `anchor` says which of its ends stands at x, y is its baseline. */
  line(
    text: string,
    x: number,
    y: number,
    {
      face = 'words',
      size = usualSize,
      colour = ink,
      anchor = 'start',
    }: TextStyle & { anchor?: 'start' | 'middle' | 'end' } = {},
  ): void {
    const length = anchor === 'start' ? 0 : this.measure(text, { face, size });
    let at = x - (anchor === 'end' ? length : anchor === 'middle' ? length / 2 : 0);
    const runs = fonts.runs(face, text);
    for (const [index, run] of runs.entries()) {
      this.#with(run.font, size)
        .fillColor(colour)
        .text(run.text, at, y, { lineBreak: false, baseline: 'alphabetic' });
      if (index < runs.length - 1) at += this.#width(run) * size;
    }
  }

  /**
   * A paragraph, broken into lines. A short one stays together; a long one goes on over pages.
   *
   * @param onPlaced  is told where its first line stands, once the page is known.
   */
  paragraph(
    text: string,
    style: TextStyle & { readonly indent?: number } = {},
    onPlaced?: (y: number) => void,
  ): void {
    const { size = usualSize, indent = 0 } = style;
    const lines = this.wrap(text, this.width - indent, style);
    this.need(Math.min(lines.length, mostKeptLines) * size * leading);
    onPlaced?.(this.y);
    for (const line of lines) {
      this.need(size * leading);
      this.line(line, this.left + indent, this.y + size, style);
      this.y += size * leading;
    }
  }

  /** The text in lines no longer than a width; a word that is longer is broken. */
  wrap(text: string, width: number, style: TextStyle = {}): readonly string[] {
    return text.split('\n').flatMap((part) => this.#wrapOne(part, width, style));
  }

  /** By the widths of words and spaces: kerning across a space is nothing that a line's end hangs on. */
  #wrapOne(text: string, width: number, style: TextStyle): readonly string[] {
    const lines: string[] = [];
    const space = this.measure(' ', style);
    let line = '';
    let taken = 0;
    for (const word of text.split(' ')) {
      const wide = this.measure(word, style);
      if (line !== '' && taken + space + wide <= width) {
        line += ` ${word}`;
        taken += space + wide;
        continue;
      }
      if (line !== '') lines.push(line);
      [line, taken] = [word, wide];
      while (taken > width && line.length > 1) {
        const fits = this.#lettersThatFit(line, width, style);
        lines.push(line.slice(0, fits));
        line = line.slice(fits);
        taken = this.measure(line, style);
      }
    }
    lines.push(line);
    return lines;
  }

  #lettersThatFit(word: string, width: number, style: TextStyle): number {
    let fits = 1;
    while (fits < word.length && this.measure(word.slice(0, fits + 1), style) <= width) fits += 1;
    return fits;
  }

  rule(colour: string, thickness = 0.5): void {
    this.document
      .moveTo(this.left, this.y)
      .lineTo(this.right, this.y)
      .lineWidth(thickness)
      .undash()
      .strokeColor(colour)
      .stroke();
  }

  /** Draws on every page, told its number and how many there are; then ends the document. @returns its bytes. */
  async finish(onEachPage: (page: number, pages: number) => void): Promise<Buffer> {
    const { count } = this.document.bufferedPageRange();
    for (let page = 0; page < count; page += 1) {
      this.document.switchToPage(page);
      onEachPage(page + 1, count);
    }
    const chunks: Buffer[] = [];
    this.document.on('data', (chunk: Buffer) => chunks.push(chunk));
    const ended = new Promise<void>((resolve, reject) => {
      this.document.on('end', resolve).on('error', reject);
    });
    this.document.end();
    await ended;
    return Buffer.concat(chunks);
  }

  #with(font: string, size: number): PDFKit.PDFDocument {
    if (!this.#registered.has(font)) {
      const face = (['words', 'strong', 'figures', 'figures-strong'] as const).flatMap((each) =>
        fonts.files(each).filter(({ name }) => name === font),
      );
      this.document.registerFont(font, face[0].bytes);
      this.#registered.add(font);
    }
    return this.document.font(font).fontSize(size);
  }
}
