import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { create, type Font } from 'fontkit';
import { sfntOfWoff } from './sfnt-of-woff';

describe('sfntOfWoff', () => {
  const path = createRequire(import.meta.url).resolve(
    '@fontsource/roboto/files/roboto-latin-400-normal.woff',
  );

  it('gives the same font as the reader makes of the WOFF itself', () => {
    const packed = create(readFileSync(path)) as Font;
    const plain = create(sfntOfWoff(readFileSync(path))) as Font;
    expect(plain.postscriptName).toBe(packed.postscriptName);
    expect(plain.numGlyphs).toBe(packed.numGlyphs);
    const text = 'Standing −2,407 (1,275 to 3,539)';
    expect(plain.layout(text).advanceWidth).toBe(packed.layout(text).advanceWidth);
  });

  it('refuses what is no WOFF', () => {
    expect(() => sfntOfWoff(Buffer.from('no font at all'))).toThrowError('expected a WOFF file');
  });
});
