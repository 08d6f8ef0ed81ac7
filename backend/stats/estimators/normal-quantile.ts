import { normalUpperTail } from '../distributions/normal-tails';
import { tQuantile } from '../distributions/t-distribution';

/** Student's t of so many degrees of freedom is normal to about eight digits; Newton's steps bring the others. */
const nearlyNormal = 1e8;
const newtonSteps = 2;

/**
 * z(1 − α/2) of the standard normal distribution for intervals at `confidence` = 1 − α.
 * @see NIST Digital Library of Mathematical Functions, §7.17 for the inverse, §3.8 for Newton's rule.
 */
export function normalTwoSidedQuantile(confidence: number): number {
  const tail = (1 - confidence) / 2;
  let value = -tQuantile(tail, nearlyNormal);
  for (let step = 0; step < newtonSteps; step += 1) {
    const density = Math.exp((-value * value) / 2) / Math.sqrt(2 * Math.PI);
    value += (normalUpperTail(value) - tail) / density;
  }
  return value;
}
