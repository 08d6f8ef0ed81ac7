import { productOverRows } from '../linear-algebra/row-range';
import { dot, type SquareMatrix, times, timesVector } from '../linear-algebra/square-matrix';
import { type SymmetricPower, symmetricPower } from '../linear-algebra/symmetric-power';
import type { WithinFit } from '../regression/within-fit';

/** Eigenvalues of I − H_ii below this are dropped: the company alone determines that direction. */
const eigenvalueFloor = 1e-10;

/**
 * What a company adds to every cluster-robust figure, in the orthonormal basis U of the demeaned design.
 * P × P products of its T_i rows take the place of its T_i × T_i block of the hat matrix.
 */
export interface CompanyProduct {
  /** S_i = U_i'U_i; the S_i add up to the identity. */
  readonly cross: SquareMatrix;
  /** g_i = U_i'e_i. */
  readonly score: Float64Array;
  /** One number of g_i: on column k of U. */
  scoreOn(k: number): number;
  /** W_i = (I − S_i)^(−½), pseudo-inverse: A_i·U_i = U_i·W_i with A_i = (I − H_ii)^(−½). */
  readonly adjustment: SquareMatrix;
  /** W_i·W_i·(I − S_i): the projector onto what the other companies determine; null where that is everything. */
  readonly determined: SquareMatrix | null;
  /** Whether without this company the slopes are still determined; effects of years that it alone has need not be. */
  readonly isDispensable: boolean;
}

/** Every company's products; those that cost n·P² or, for eigenvalues, N·P³ are computed when first asked for, and once. */
export function companyProducts(fit: WithinFit): CompanyProduct[] {
  const scores = scoresOf(fit);
  return fit.sample.companies.map((_, company) => new LazyProduct(fit, company, scores));
}

/** g_i of every company, N × P row-major. */
function scoresOf({ sample, basis, residuals }: WithinFit): Float64Array {
  const { starts } = sample;
  const companies = starts.length - 1;
  const size = basis.length;
  const scores = new Float64Array(companies * size);
  for (let k = 0; k < size; k += 1) {
    for (let company = 0; company < companies; company += 1) {
      const rows = { from: starts[company], to: starts[company + 1] };
      scores[company * size + k] = productOverRows(basis[k], residuals, rows);
    }
  }
  return scores;
}

function crossProducts({ sample, basis }: WithinFit, company: number): SquareMatrix {
  const size = basis.length;
  const cross = new Float64Array(size * size);
  const rows = { from: sample.starts[company], to: sample.starts[company + 1] };
  for (let k = 0; k < size; k += 1) {
    for (let l = 0; l <= k; l += 1) {
      const product = productOverRows(basis[k], basis[l], rows);
      cross[k * size + l] = product;
      cross[l * size + k] = product;
    }
  }
  return cross;
}

class LazyProduct implements CompanyProduct {
  #score: Float64Array | undefined;
  #cross: SquareMatrix | undefined;
  #power: SymmetricPower | undefined;

  constructor(
    private readonly fit: WithinFit,
    private readonly company: number,
    private readonly scores: Float64Array,
  ) {}

  scoreOn(k: number): number {
    return this.scores[this.company * this.fit.basis.length + k];
  }

  get score(): Float64Array {
    const size = this.#size;
    this.#score ??= this.scores.subarray(this.company * size, (this.company + 1) * size);
    return this.#score;
  }

  get cross(): SquareMatrix {
    this.#cross ??= crossProducts(this.fit, this.company);
    return this.#cross;
  }

  get adjustment(): SquareMatrix {
    return this.#adjusted().matrix;
  }

  get determined(): SquareMatrix | null {
    const { matrix, dropped } = this.#adjusted();
    const size = this.#size;
    return dropped === 0 ? null : times(times(matrix, matrix, size), this.#rest(), size);
  }

  get isDispensable(): boolean {
    return (
      this.#adjusted().dropped === 0 ||
      areSlopesDetermined(this.#rest(), this.#size, this.fit.yearColumns)
    );
  }

  get #size(): number {
    return this.fit.basis.length;
  }

  #adjusted(): SymmetricPower {
    this.#power ??= symmetricPower(this.#rest(), this.#size, -0.5, eigenvalueFloor);
    return this.#power;
  }

  /** I − S_i. */
  #rest(): SquareMatrix {
    const size = this.#size;
    return this.cross.map((value, index) => (index % (size + 1) === 0 ? 1 : 0) - value);
  }
}

/**
 * Whether I − S_i has full rank in the slopes once the year columns, which come first, are taken out of them: its Schur
 * complement has. A direction that only years of this company's own span drops out with them.
 */
function areSlopesDetermined(rest: SquareMatrix, size: number, years: number): boolean {
  const slopes = size - years;
  if (years === 0) return false;
  const block = (rows: number, from: number, columns: number, start: number): Float64Array =>
    Float64Array.from(
      { length: rows * columns },
      (_, index) => rest[(from + Math.floor(index / columns)) * size + start + (index % columns)],
    );
  const ofYears = symmetricPower(block(years, 0, years, 0), years, -1, eigenvalueFloor).matrix;
  const complement = block(slopes, years, slopes, years);
  const shared = Array.from({ length: slopes }, (_, k) => block(1, years + k, years, 0));
  const taken = shared.map((one) => timesVector(ofYears, one));
  for (let k = 0; k < slopes; k += 1) {
    for (let l = 0; l < slopes; l += 1) {
      complement[k * slopes + l] -= (dot(shared[k], taken[l]) + dot(shared[l], taken[k])) / 2;
    }
  }
  return symmetricPower(complement, slopes, -1, eigenvalueFloor).dropped === 0;
}
