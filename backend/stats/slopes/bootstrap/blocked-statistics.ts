import { dot, type SquareMatrix, timesVector } from '../../linear-algebra/square-matrix';
import { drawWidth, type SlopeScores } from './draw-statistics';
import type { SignDraws } from './sign-draws';

/** Companies whose 2⁸ signed sums are written out once and then looked up by every draw. */
const blockSize = 8;

/** A share c₂/Σκ² below this is rounding: the draw's error does not depend on the imposed value. */
const roundingShare = 1e-12;

/**
 * The same as `drawStatistics`, for many companies and draws: with M = Σq_iq_i' and the sums G = Σv_ig_i, H = Σv_iq_i,
 * A = Σv_iα_iq_i, B = Σv_iκ_iq_i, the square of the error is Σα² − 2A'G + G'MG + … in τ, and the sums come from tables of
 * eight companies each.
 *
 * @returns n₀, n₁, c₀, c₁, c₂ of each draw; cost draws · (N · P/2 + 2P²) and 9,999 · (4P + N/64) numbers of memory.
 */
export function blockedStatistics(
  scores: SlopeScores,
  draws: SignDraws,
  onProgress: (share: number) => void,
): Float64Array {
  const companies = scores.alpha.length;
  const blocks = Math.ceil(companies / blockSize);
  const width = 4 * scores.size + 2;
  const codes = blockCodes(companies, draws);
  const sums = new Float64Array(draws.count * width);
  const table = new Float64Array(2 ** blockSize * width);
  for (let block = 0; block < blocks; block += 1) {
    fillTable(table, scores, block * blockSize);
    for (let draw = 0; draw < draws.count; draw += 1) {
      const from = codes[block * draws.count + draw] * width;
      const to = draw * width;
      for (let index = 0; index < width; index += 1) sums[to + index] += table[from + index];
    }
    onProgress((block + 1) / (blocks + 1));
  }
  return statisticsOf(scores, sums);
}

/** Signs of each block of companies as bits, 1 for −1; blocks × draws. */
function blockCodes(companies: number, draws: SignDraws): Uint8Array {
  const codes = new Uint8Array(Math.ceil(companies / blockSize) * draws.count);
  const signs = new Int8Array(companies);
  for (let draw = 0; draw < draws.count; draw += 1) {
    draws.next(signs);
    for (let company = 0; company < companies; company += 1) {
      if (signs[company] > 0) continue;
      const block = Math.floor(company / blockSize);
      codes[block * draws.count + draw] |= 1 << (company % blockSize);
    }
  }
  return codes;
}

/** Signed sums of the rows g, q, α·q, κ·q, α, κ of up to eight companies, by the bits of their signs. */
function fillTable(table: Float64Array, scores: SlopeScores, first: number): void {
  const width = 4 * scores.size + 2;
  const rows = Array.from(
    { length: Math.min(blockSize, scores.alpha.length - first) },
    (_, offset) => companyRow(scores, first + offset),
  );
  table.fill(0, 0, width);
  for (const row of rows) {
    for (let index = 0; index < width; index += 1) table[index] += row[index];
  }
  for (let code = 1; code < 2 ** rows.length; code += 1) {
    const company = 31 - Math.clz32(code);
    const rest = (code - 2 ** company) * width;
    const row = rows[company];
    for (let index = 0; index < width; index += 1) {
      table[code * width + index] = table[rest + index] - 2 * row[index];
    }
  }
}

function companyRow({ size, g, q, alpha, kappa }: SlopeScores, company: number): Float64Array {
  const row = new Float64Array(4 * size + 2);
  for (let k = 0; k < size; k += 1) {
    const shared = q[company * size + k];
    row[k] = g[company * size + k];
    row[size + k] = shared;
    row[2 * size + k] = alpha[company] * shared;
    row[3 * size + k] = kappa[company] * shared;
  }
  row[4 * size] = alpha[company];
  row[4 * size + 1] = kappa[company];
  return row;
}

function statisticsOf(scores: SlopeScores, sums: Float64Array): Float64Array {
  const { size, alpha, kappa } = scores;
  const width = 4 * size + 2;
  const products = sharedProducts(scores);
  const alphaSquares = dot(alpha, alpha);
  const alphaKappa = dot(alpha, kappa);
  const kappaSquares = dot(kappa, kappa);
  const statistics = new Float64Array((sums.length / width) * drawWidth);
  for (let draw = 0; draw * width < sums.length; draw += 1) {
    const own = sums.subarray(draw * width, (draw + 1) * width);
    const g = own.subarray(0, size);
    const h = own.subarray(size, 2 * size);
    const a = own.subarray(2 * size, 3 * size);
    const b = own.subarray(3 * size, 4 * size);
    const pressedG = timesVector(products, g);
    const pressedH = timesVector(products, h);
    const constant = alphaSquares - 2 * dot(a, g) + dot(g, pressedG);
    const linear = 2 * (alphaKappa - dot(a, h) - dot(b, g) + dot(h, pressedG));
    const square = kappaSquares - 2 * dot(b, h) + dot(h, pressedH);
    const isConstant = square < roundingShare * kappaSquares;
    const target = draw * drawWidth;
    statistics[target] = own[4 * size];
    statistics[target + 1] = own[4 * size + 1];
    statistics[target + 2] = Math.max(0, constant);
    statistics[target + 3] = isConstant ? 0 : linear;
    statistics[target + 4] = isConstant ? 0 : square;
  }
  return statistics;
}

/** M = Σq_iq_i', P × P. */
function sharedProducts({ size, q }: SlopeScores): SquareMatrix {
  const products = new Float64Array(size * size);
  for (let at = 0; at < q.length; at += size) {
    for (let k = 0; k < size; k += 1) {
      for (let l = 0; l < size; l += 1) products[k * size + l] += q[at + k] * q[at + l];
    }
  }
  return products;
}
