import { wrappedWords } from '@figures';
import type { ChartText } from '../chart-text';

const svgNamespace = 'http://www.w3.org/2000/svg';
const margin = 24;

/** What a chart's style sheet may set and a picture needs to carry by itself. */
const inlined = [
  'fill',
  'stroke',
  'stroke-width',
  'stroke-dasharray',
  'stroke-linejoin',
  'paint-order',
  'font-family',
  'font-size',
  'font-weight',
  'text-anchor',
] as const;

interface Line {
  readonly text: string;
  readonly size: number;
  readonly weight: number;
  readonly token: string;
}

function words(text: string, width: number, style: Omit<Line, 'text'>): Line[] {
  return wrappedWords(text, width, style.size).map((line) => ({ text: line, ...style }));
}

function leading(lines: readonly Line[]): number {
  return lines.reduce((sum, line) => sum + line.size * 1.4, 0);
}

function inline(from: Element, to: Element): void {
  const computed = getComputedStyle(from);
  for (const property of inlined) {
    const value = computed.getPropertyValue(property);
    if (value !== '') to.setAttribute(property, value);
  }
  for (const { name } of [...to.attributes])
    if (/^(class|style|id|role|tabindex|_ng|ng-|data-|aria-|kv)/.test(name))
      to.removeAttribute(name);
}

function withoutScreenParts(original: SVGSVGElement): SVGSVGElement {
  const copy = original.cloneNode(true) as SVGSVGElement;
  const originals = [original, ...original.querySelectorAll('*')];
  const copies = [copy, ...copy.querySelectorAll('*')];
  originals.forEach((element, index) => inline(element, copies[index]));
  originals.forEach((element, index) => {
    if (element.hasAttribute('data-screen-only')) copies[index].remove();
    // What follows a scrolled container goes back to its own place.
    if (element.hasAttribute('data-follows-scroll')) copies[index].removeAttribute('transform');
  });
  const comments = document.createNodeIterator(copy, NodeFilter.SHOW_COMMENT);
  for (let node = comments.nextNode(); node !== null; node = comments.nextNode())
    node.parentNode?.removeChild(node);
  return copy;
}

/**
 * The chart as a picture that needs no style sheet: computed colours and type written into it, title and caption
 * above, source below. It is drawn in the light colours whatever the screen shows, for it goes on paper and slides.
 */
export function standalonePicture(chart: SVGSVGElement, text: ChartText): SVGSVGElement {
  const before = chart.style.colorScheme;
  chart.style.colorScheme = 'light';
  try {
    return framed(chart, text);
  } finally {
    chart.style.colorScheme = before;
  }
}

function framed(chart: SVGSVGElement, text: ChartText): SVGSVGElement {
  const width = Number(chart.getAttribute('width'));
  const height = Number(chart.getAttribute('height'));
  const head = [
    ...words(text.title, width, { size: 16, weight: 500, token: '--kv-ink' }),
    ...words(text.caption, width, { size: 12, weight: 400, token: '--kv-soft-ink' }),
  ];
  const foot = words(text.source, width, { size: 11, weight: 400, token: '--kv-soft-ink' });
  const chartTop = margin + leading(head) + (head.length > 0 ? 12 : 0);
  const footTop = chartTop + height + 12;

  const picture = document.createElementNS(svgNamespace, 'svg');
  const outerWidth = width + 2 * margin;
  const outerHeight = footTop + leading(foot) + margin;
  picture.setAttribute('xmlns', svgNamespace);
  picture.setAttribute('width', String(outerWidth));
  picture.setAttribute('height', String(outerHeight));
  picture.setAttribute('viewBox', `0 0 ${outerWidth} ${outerHeight}`);
  const title = document.createElementNS(svgNamespace, 'title');
  title.textContent = text.title;
  const ground = document.createElementNS(svgNamespace, 'rect');
  ground.setAttribute('width', '100%');
  ground.setAttribute('height', '100%');
  ground.setAttribute('fill', tokenColor(chart, '--kv-paper'));
  const copy = withoutScreenParts(chart);
  copy.setAttribute('x', String(margin));
  copy.setAttribute('y', String(chartTop));
  copy.setAttribute('overflow', 'visible');
  picture.append(title, ground, ...placedLines(chart, head, margin), copy);
  picture.append(...placedLines(chart, foot, footTop));
  return picture;
}

function placedLines(chart: SVGSVGElement, lines: readonly Line[], top: number): SVGTextElement[] {
  let y = top;
  return lines.map(({ text, size, weight, token }) => {
    y += size * 1.4;
    const element = document.createElementNS(svgNamespace, 'text');
    element.setAttribute('x', String(margin));
    element.setAttribute('y', String(y - size * 0.4));
    element.setAttribute('font-family', 'Roboto, Arial, sans-serif');
    element.setAttribute('font-size', String(size));
    element.setAttribute('font-weight', String(weight));
    element.setAttribute('fill', tokenColor(chart, token));
    element.textContent = text;
    return element;
  });
}

/** A token's colour as the chart would show it: only a used property resolves the pair of light and dark. */
function tokenColor(chart: SVGSVGElement, token: string): string {
  const before = chart.style.color;
  chart.style.color = `var(${token})`;
  const color = getComputedStyle(chart).color;
  chart.style.color = before;
  return color;
}
