/** Newton's steps before bisection takes over: where they converge at all, they are done long before. */
const mostNewtonSteps = 60;

/** A step below this share of the place is rounding. */
const rounding = 2 ** -52;

/**
 * Places in (low, high) where a polynomial changes sign, ascending. Between the places where its derivative does it is
 * monotone and has one change at most, which is bracketed and closed in on to the last digit.
 *
 * @param coefficients  of 1, x, x², …; a degree of 0 has no place.
 */
export function signChanges(coefficients: readonly number[], low: number, high: number): number[] {
  if (coefficients.length === 1) return [];
  const derivative = coefficients.slice(1).map((value, power) => (power + 1) * value);
  const bound = Math.min(high, rootBound(coefficients));
  const from = Math.max(low, -bound);
  const turns = [from, ...signChanges(derivative, from, bound), bound];
  const places: number[] = [];
  for (let index = 1; index < turns.length; index += 1) {
    const place = changeBetween(coefficients, turns[index - 1], turns[index]);
    if (place !== null) places.push(place);
  }
  return places;
}

/** The polynomial’s value; coefficients of 1, x, x², … */
export function polynomialAt(coefficients: readonly number[], x: number): number {
  let value = 0;
  for (let power = coefficients.length - 1; power >= 0; power -= 1) {
    value = value * x + coefficients[power];
  }
  return value;
}

/**
 * No root lies further out than 2·max|c_(n−k)/c_n|^(1/k).
 * @see Fujiwara (1916), Tôhoku Mathematical Journal 10, 167–171.
 */
function rootBound(coefficients: readonly number[]): number {
  const degree = coefficients.length - 1;
  let bound = 0;
  for (let power = 0; power < degree; power += 1) {
    const ratio = Math.abs(coefficients[power] / coefficients[degree]);
    if (ratio > 0) bound = Math.max(bound, ratio ** (1 / (degree - power)));
    if (Number.isNaN(ratio)) return Infinity;
  }
  return 2 * bound;
}

/** Where a monotone stretch changes sign, zero counting as positive; null where both ends are on one side. */
function changeBetween(coefficients: readonly number[], from: number, to: number): number | null {
  const isPositive = polynomialAt(coefficients, from) >= 0;
  if (isPositive === polynomialAt(coefficients, to) >= 0) return null;
  let low = from;
  let high = to;
  let place = low + (high - low) / 2;
  for (let step = 0; place > low && place < high; step += 1) {
    const { value, slope } = valueAndSlope(coefficients, place);
    if (value >= 0 === isPositive) low = place;
    else high = place;
    const newton = step < mostNewtonSteps ? place - value / slope : NaN;
    if (Math.abs(newton - place) <= rounding * Math.abs(place)) return place;
    place = newton > low && newton < high ? newton : low + (high - low) / 2;
  }
  return place;
}

function valueAndSlope(
  coefficients: readonly number[],
  x: number,
): { readonly value: number; readonly slope: number } {
  let value = 0;
  let slope = 0;
  for (let power = coefficients.length - 1; power >= 0; power -= 1) {
    slope = slope * x + value;
    value = value * x + coefficients[power];
  }
  return { value, slope };
}
