import type { Draws } from './normal-draws';

/** AR(1) with unit variance, from its stationary distribution on. */
export function autoregression(rho: number, length: number, { normal }: Draws): Float64Array {
  const path = new Float64Array(length);
  const innovation = Math.sqrt(1 - rho * rho);
  path[0] = normal();
  for (let year = 1; year < length; year += 1) {
    path[year] = rho * path[year - 1] + innovation * normal();
  }
  return path;
}
