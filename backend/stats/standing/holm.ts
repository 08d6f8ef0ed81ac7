/**
 * Holm's step-down correction: hypotheses that may be rejected together at family-wise error α.
 *
 * @param pValues  one a hypothesis.
 * @returns one a hypothesis: whether it is rejected. The (r + 1)-th smallest is while p ≤ α/(m − r).
 * @see Holm (1979), Scandinavian Journal of Statistics 6, 65–70.
 */
export function holmRejections(pValues: readonly number[], alpha: number): boolean[] {
  const order = pValues
    .map((_, index) => index)
    .sort((left, right) => pValues[left] - pValues[right]);
  const isRejected = pValues.map(() => false);
  for (let rejected = 0; rejected < order.length; rejected += 1) {
    if (!(pValues[order[rejected]] <= alpha / (order.length - rejected))) break;
    isRejected[order[rejected]] = true;
  }
  return isRejected;
}
