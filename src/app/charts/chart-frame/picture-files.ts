import { bundledFaces } from './bundled-faces';

const pixelsPerPoint = 2;

/** An image starts reading the faces inside it when it is first drawn, and does not say when it has. */
const facesMs = 250;

/** The picture as an SVG file, the faces of its words inside. */
export async function svgFile(picture: SVGSVGElement): Promise<Blob> {
  const faces = await bundledFaces();
  const markup = new XMLSerializer().serializeToString(picture);
  const end = markup.indexOf('>') + 1;
  const style = faces === '' ? '' : `<defs><style>${faces}</style></defs>`;
  return new Blob([markup.slice(0, end), style, markup.slice(end)], { type: 'image/svg+xml' });
}

/** The picture as a PNG file, two pixels a point, so that it stays sharp on slides and paper. */
export async function pngFile(picture: SVGSVGElement): Promise<Blob> {
  const url = URL.createObjectURL(await svgFile(picture));
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = Math.ceil(Number(picture.getAttribute('width')) * pixelsPerPoint);
    canvas.height = Math.ceil(Number(picture.getAttribute('height')) * pixelsPerPoint);
    const context = canvas.getContext('2d');
    if (context === null) throw new Error('expected a canvas to draw on; found none');
    const draw = () => {
      context.clearRect(0, 0, canvas.width, canvas.height);
      context.drawImage(image, 0, 0, canvas.width, canvas.height);
    };
    draw();
    await new Promise((resolve) => setTimeout(resolve, facesMs));
    draw();
    return await new Promise((resolve, reject) => {
      canvas.toBlob((blob) => {
        if (blob === null) reject(new Error('expected a PNG of the canvas; found none'));
        else resolve(blob);
      }, 'image/png');
    });
  } finally {
    URL.revokeObjectURL(url);
  }
}

/** Hands a file to the person's browser to keep. */
export function saveFile(file: Blob, name: string): void {
  const url = URL.createObjectURL(file);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  setTimeout(() => {
    URL.revokeObjectURL(url);
  }, 10_000);
}

/** A file name from a title: letters and digits, joined by hyphens. */
export function fileNameOf(title: string, ending: string): string {
  const name = title
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-|-$/g, '')
    .slice(0, 80);
  return `${name === '' ? 'chart' : name}.${ending}`;
}
