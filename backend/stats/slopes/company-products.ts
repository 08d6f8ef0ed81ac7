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
  /** W_i = (I − S_i)^(−½), pseudo-inverse: A_i·U_i = U_i·W_i with A_i = (I − H_ii)^(−½). */
  readonly adjustment: SquareMatrix;
  /** W_i·W_i·(I − S_i): the projector onto what the other companies determine; null where that is everything. */
  readonly determined: SquareMatrix | null;
  /** Whether without this company the slopes are still determined; effects of years that it alone has need not be. */
  readonly isDispensable: boolean;
}

/** Cross-products of every company, cost n·P²; what needs eigenvalues, N·P³, is computed when first asked for. */
export function companyProducts(fit: WithinFit): CompanyProduct[] {
  return fit.sample.companies.map((_, company) => companyProduct(fit, company));
}

function companyProduct(fit: WithinFit, company: number): CompanyProduct {
  const size = fit.basis.length;
  const from = fit.sample.starts[company];
  const to = fit.sample.starts[company + 1];
  const cross = new Float64Array(size * size);
  const score = new Float64Array(size);
  for (let k = 0; k < size; k += 1) {
    const left = fit.basis[k];
    for (let row = from; row < to; row += 1) score[k] += left[row] * fit.residuals[row];
    for (let l = 0; l <= k; l += 1) {
      const right = fit.basis[l];
      let sum = 0;
      for (let row = from; row < to; row += 1) sum += left[row] * right[row];
      cross[k * size + l] = sum;
      cross[l * size + k] = sum;
    }
  }
  return new LazyProduct(cross, score, fit.yearColumns);
}

/** Eigenvalues are computed when first asked for, and once. */
class LazyProduct implements CompanyProduct {
  #power: SymmetricPower | undefined;

  constructor(
    readonly cross: SquareMatrix,
    readonly score: Float64Array,
    private readonly yearColumns: number,
  ) {}

  get adjustment(): SquareMatrix {
    return this.#adjusted().matrix;
  }

  get determined(): SquareMatrix | null {
    const { matrix, dropped } = this.#adjusted();
    const size = this.score.length;
    return dropped === 0 ? null : times(times(matrix, matrix, size), this.#rest(), size);
  }

  get isDispensable(): boolean {
    return (
      this.#adjusted().dropped === 0 ||
      areSlopesDetermined(this.#rest(), this.score.length, this.yearColumns)
    );
  }

  #adjusted(): SymmetricPower {
    this.#power ??= symmetricPower(this.#rest(), this.score.length, -0.5, eigenvalueFloor);
    return this.#power;
  }

  /** I − S_i. */
  #rest(): SquareMatrix {
    const size = this.score.length;
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
