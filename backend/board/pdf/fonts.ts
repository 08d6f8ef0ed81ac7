import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { create } from 'fontkit';
import { sfntOfWoff } from './sfnt-of-woff';

export type Face = 'words' | 'strong' | 'figures' | 'figures-strong';

/** A stretch of text that one font file can write. */
export interface FontRun {
  readonly font: string;
  readonly text: string;
}

const faces: Readonly<
  Record<Face, { readonly family: 'roboto' | 'roboto-mono'; readonly weight: 400 | 500 }>
> = {
  words: { family: 'roboto', weight: 400 },
  strong: { family: 'roboto', weight: 500 },
  figures: { family: 'roboto-mono', weight: 400 },
  'figures-strong': { family: 'roboto-mono', weight: 500 },
};

/** The files a font is split into, the usual one first. */
const subsets = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese', 'cyrillic-ext'] as const;

interface FontFile {
  readonly name: string;
  readonly bytes: Buffer;
  readonly has: (codePoint: number) => boolean;
}

const require = createRequire(import.meta.url);

/** The product's own fonts, embedded into every document; each is read once. */
export class Fonts {
  readonly #files = new Map<Face, readonly FontFile[]>();

  /** The files of a face, by the name under which a document registers them. */
  files(face: Face): readonly FontFile[] {
    const known = this.#files.get(face);
    if (known !== undefined) return known;
    const read = subsets.map((subset) => fontFile(face, subset));
    this.#files.set(face, read);
    return read;
  }

  /** The text in stretches, each with the font that has its letters; what no font has is written by the usual one. */
  runs(face: Face, text: string): readonly FontRun[] {
    const files = this.files(face);
    const runs: { font: string; text: string }[] = [];
    for (const letter of text) {
      const codePoint = letter.codePointAt(0) ?? 0;
      const { name } = files.find(({ has }) => has(codePoint)) ?? files[0];
      const last = runs.at(-1);
      if (last?.font === name) last.text += letter;
      else runs.push({ font: name, text: letter });
    }
    return runs;
  }
}

function pathOf(face: Face, subset: string): string {
  const { family, weight } = faces[face];
  return require.resolve(`@fontsource/${family}/files/${family}-${subset}-${weight}-normal.woff`);
}

function fontFile(face: Face, subset: string): FontFile {
  const path = pathOf(face, subset);
  const bytes = sfntOfWoff(readFileSync(path));
  const font = create(bytes);
  if (!('hasGlyphForCodePoint' in font)) throw new Error(`${path} holds no single font`);
  return {
    name: `${face}-${subset}`,
    bytes,
    has: (codePoint) => font.hasGlyphForCodePoint(codePoint),
  };
}
