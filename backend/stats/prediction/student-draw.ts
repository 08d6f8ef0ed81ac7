/**
 * A draw of Student's t from two independent uniform numbers u, v in (0, 1): √(ν(u^(−2/ν) − 1))·cos(2πv), exact for any
 * ν > 0.
 *
 * @see Bailey (1994), Mathematics of Computation 62, 779–781.
 */
export function studentDraw(degreesOfFreedom: number, u: number, v: number): number {
  const square = degreesOfFreedom * Math.expm1((-2 / degreesOfFreedom) * Math.log(u));
  return Math.sqrt(square) * Math.cos(2 * Math.PI * v);
}
