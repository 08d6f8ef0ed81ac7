const families = ['Roboto', 'Roboto Mono'];
const weights = ['400', '500'];

/** Ranges of Unicode beside the basic one are left out: they would more than double each file. */
const basicLatin = /U\+0{0,4}-0*FF\b/i;

let faces: Promise<string> | undefined;

/**
 * The product's own faces as `@font-face` rules with the font inside, for pictures that leave the page: an image has
 * no access to the page's fonts. Read once from the page's own style sheets; empty where there are none.
 */
export function bundledFaces(): Promise<string> {
  faces ??= readFaces().catch((error: unknown) => {
    faces = undefined; // a lost connection: the next export tries again
    throw error;
  });
  return faces;
}

async function readFaces(): Promise<string> {
  const rules = [...document.styleSheets].flatMap((sheet) =>
    [...sheet.cssRules].flatMap((rule) => (rule instanceof CSSFontFaceRule ? [rule] : [])),
  );
  const wanted = rules.filter(({ style }) => {
    const range = style.getPropertyValue('unicode-range');
    return (
      families.includes(style.getPropertyValue('font-family').replaceAll(/["']/g, '')) &&
      weights.includes(style.getPropertyValue('font-weight')) &&
      (range === '' || basicLatin.test(range))
    );
  });
  return (await Promise.all(wanted.map(embedded))).join('');
}

async function embedded({ style, parentStyleSheet }: CSSFontFaceRule): Promise<string> {
  const address = /url\(["']?([^"')]+\.woff2[^"')]*)["']?\)/.exec(
    style.getPropertyValue('src'),
  )?.[1];
  if (address === undefined) return '';
  const reply = await fetch(new URL(address, parentStyleSheet?.href ?? document.baseURI));
  if (!reply.ok) throw new Error(`expected a font at ${address}; found status ${reply.status}`);
  const bytes = new Uint8Array(await reply.arrayBuffer());
  let text = '';
  for (const byte of bytes) text += String.fromCharCode(byte);
  const family = style.getPropertyValue('font-family');
  const weight = style.getPropertyValue('font-weight');
  const source = `url(data:font/woff2;base64,${btoa(text)}) format("woff2")`;
  return `@font-face{font-family:${family};font-weight:${weight};src:${source}}`;
}
