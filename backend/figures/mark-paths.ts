/** The own company's mark, `radius` from centre to corner, around the origin. */
export function diamondPath(radius: number): string {
  return `M0,${-radius}L${radius},0L0,${radius}L${-radius},0Z`;
}

/** Marks that tell plans apart without colour: circle, square, triangle, and again. */
export function planMarkPath(place: number, radius = 4): string {
  const r = radius;
  switch (place % 3) {
    case 0:
      return `M${-r},0A${r},${r} 0 1 1 ${r},0A${r},${r} 0 1 1 ${-r},0Z`;
    case 1:
      return `M${-r},${-r}H${r}V${r}H${-r}Z`;
    default:
      return `M0,${-r * 1.2}L${r * 1.1},${r * 0.9}H${-r * 1.1}Z`;
  }
}
