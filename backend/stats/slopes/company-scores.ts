import type { SlopeGround } from './slope-ground';

/** Each company's score on the slopes' columns, N × K row-major. */
export function companyScores({ fit, products }: SlopeGround): Float64Array {
  const size = fit.slopes.length;
  const scores = new Float64Array(products.length * size);
  products.forEach((product, company) => {
    for (let k = 0; k < size; k += 1) {
      scores[company * size + k] = product.scoreOn(fit.yearColumns + k);
    }
  });
  return scores;
}
