import type { Point } from './figure-types';

/** The own company's mark, `radius` from centre to corner, around the origin. */
export function diamondPath(radius: number): string {
  return `M0,${-radius}L${radius},0L0,${radius}L${-radius},0Z`;
}

/** Marks that tell plans apart without colour: circle, square, triangle, triangle on its tip, and again. */
export function planMarkPath(place: number, radius = 4): string {
  const r = radius;
  switch (place % 4) {
    case 0:
      return `M${-r},0A${r},${r} 0 1 1 ${r},0A${r},${r} 0 1 1 ${-r},0Z`;
    case 1:
      return `M${-r},${-r}H${r}V${r}H${-r}Z`;
    case 2:
      return `M0,${-r * 1.2}L${r * 1.1},${r * 0.9}H${-r * 1.1}Z`;
    default:
      return `M0,${r * 1.2}L${r * 1.1},${-r * 0.9}H${-r * 1.1}Z`;
  }
}

/** The own company's mark around a place, for many in one path. */
export function diamondAt({ x, y }: Point, radius: number): string {
  return `M${rounded(x)},${rounded(y - radius)}l${radius},${radius}l${-radius},${radius}l${-radius},${-radius}Z`;
}

/** A peer's mark around a place, for many in one path. */
export function circleAt({ x, y }: Point, radius: number): string {
  const arc = `a${radius},${radius} 0 1 1`;
  return `M${rounded(x - radius)},${rounded(y)}${arc} ${2 * radius},0${arc} ${-2 * radius},0Z`;
}

/** The mark of what stands outside, around a place, for many in one path. */
export function crossAt({ x, y }: Point, radius: number): string {
  const across = 2 * radius;
  return `M${rounded(x - radius)},${rounded(y - radius)}l${across},${across}M${rounded(x + radius)},${rounded(y - radius)}l${-across},${across}`;
}

/** A tenth of a pixel is finer than anyone sees, and keeps a path of thousands of marks short. */
function rounded(pixels: number): number {
  return Math.round(pixels * 10) / 10;
}
