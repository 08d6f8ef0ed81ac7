import type { Face } from './fonts';
import type { PageFlow } from './page-flow';
import { ink, paper } from './print-colours';

export interface Stroke {
  readonly colour: string;
  readonly width: number;
  readonly dash?: readonly [number, number];
}

/**
 * Draws a chart's layout, which counts in CSS pixels from its own corner, onto a page: vectors and real text, scaled to
 * the width that the page gives it.
 */
export class ChartPainter {
  readonly scale: number;

  constructor(
    private readonly flow: PageFlow,
    private readonly x: number,
    private readonly y: number,
    size: { readonly layoutWidth: number; readonly width: number },
  ) {
    this.scale = size.width / size.layoutWidth;
  }

  line(x1: number, y1: number, x2: number, y2: number, stroke: Stroke): void {
    this.#stroke(stroke).moveTo(this.#x(x1), this.#y(y1)).lineTo(this.#x(x2), this.#y(y2)).stroke();
  }

  /** A path in SVG's own words, moved to a point. */
  path(
    d: string,
    {
      fill,
      stroke,
      at = { x: 0, y: 0 },
    }: { fill?: string; stroke?: Stroke; at?: { x: number; y: number } },
  ): void {
    if (d === '') return;
    const { document } = this.flow;
    document.save();
    document.translate(this.#x(at.x), this.#y(at.y)).scale(this.scale);
    document.path(d);
    if (stroke !== undefined) {
      document.lineWidth(stroke.width).strokeColor(stroke.colour);
      if (stroke.dash === undefined) document.undash();
      else document.dash(stroke.dash[0], { space: stroke.dash[1] });
    }
    if (fill !== undefined && stroke !== undefined) document.fillAndStroke(fill, stroke.colour);
    else if (fill !== undefined) document.fill(fill);
    else document.stroke();
    document.restore();
  }

  circle(x: number, y: number, radius: number, fill: string, stroke: Stroke): void {
    this.#stroke(stroke)
      .circle(this.#x(x), this.#y(y), radius * this.scale)
      .fillAndStroke(fill, stroke.colour);
  }

  rect(x: number, y: number, width: number, height: number, fill: string): void {
    this.flow.document
      .rect(this.#x(x), this.#y(y), width * this.scale, height * this.scale)
      .fill(fill);
  }

  text(
    text: string,
    x: number,
    y: number,
    {
      face = 'words',
      size = 12,
      colour = ink,
      anchor = 'start',
    }: { face?: Face; size?: number; colour?: string; anchor?: 'start' | 'middle' | 'end' } = {},
  ): void {
    this.flow.line(text, this.#x(x), this.#y(y), { face, size: size * this.scale, colour, anchor });
  }

  /** Words that may cross a line: they stand on paper. */
  rimmed(
    text: string,
    {
      x,
      y,
      anchor,
    }: { readonly x: number; readonly y: number; readonly anchor: 'start' | 'middle' | 'end' },
    style: { face?: Face; colour?: string } = {},
  ): void {
    const size = 12;
    const width =
      this.flow.measure(text, { face: style.face, size: size * this.scale }) / this.scale;
    const left = x - (anchor === 'end' ? width : anchor === 'middle' ? width / 2 : 0);
    this.rect(left - 2, y - size + 1, width + 4, size + 3, paper);
    this.text(text, x, y, { ...style, anchor });
  }

  #stroke({ colour, width, dash }: Stroke): PDFKit.PDFDocument {
    const document = this.flow.document.lineWidth(width * this.scale).strokeColor(colour);
    return dash === undefined
      ? document.undash()
      : document.dash(dash[0] * this.scale, { space: dash[1] * this.scale });
  }

  #x(x: number): number {
    return this.x + x * this.scale;
  }

  #y(y: number): number {
    return this.y + y * this.scale;
  }
}
