import { dot } from '../linear-algebra/square-matrix';
import type { CompanyForms } from './company-forms';
import type { Contrast } from './contrast';

/** λ_j of a contrast: h_j'e, for the first `cosines` cosines. */
export function lambdasOf(forms: CompanyForms, contrast: Contrast, cosines: number): number[] {
  return Array.from({ length: cosines }, (_, cosine) => {
    let sum = dot(contrast.slopePart, slice(forms.basisScore, cosine, forms.slopes));
    contrast.companies.forEach((company, index) => {
      sum += contrast.weights[index] * forms.meanScore[company * forms.cosines + cosine];
    });
    return sum;
  });
}

/** Σ_i g_i'R_ig_i, bilinear in two contrasts. */
export function varianceForm(forms: CompanyForms, left: Contrast, right: Contrast): number {
  const size = forms.slopes;
  let sum = form(forms.basisVariance, left.slopePart, right.slopePart);
  const cross = (contrast: Contrast, slopePart: Float64Array): void => {
    contrast.companies.forEach((company, index) => {
      sum += contrast.weights[index] * dot(slopePart, slice(forms.meanWithBasis, company, size));
    });
  };
  cross(left, right.slopePart);
  cross(right, left.slopePart);
  forShared(left, right, (company, product) => (sum += product * forms.meanVariance[company]));
  return sum;
}

/** mean_j Σ_i (Mh_j)_i'R_i(Mh_j)_i over the first `cosines` cosines, bilinear in two contrasts. */
export function residualForm(
  forms: CompanyForms,
  left: Contrast,
  right: Contrast,
  cosines: number,
): number {
  const double = 2 * forms.slopes;
  let sum = 0;
  for (let cosine = 0; cosine < cosines; cosine += 1) {
    const leftPart = residualPart(forms, left, cosine);
    const rightPart = left === right ? leftPart : residualPart(forms, right, cosine);
    sum += form(slice(forms.residualBasis, cosine, double * double), leftPart, rightPart);
    const cross = (contrast: Contrast, part: Float64Array): void => {
      contrast.companies.forEach((company, index) => {
        const place = company * forms.cosines + cosine;
        sum += contrast.weights[index] * dot(part, slice(forms.residualCross, place, double));
      });
    };
    cross(left, rightPart);
    cross(right, leftPart);
    forShared(left, right, (company, product) => {
      sum += product * forms.residualMean[company * forms.cosines + cosine];
    });
  }
  return sum / cosines;
}

/** [r, −U'h_j]: weights of the columns [B, U] in Mh_j. */
function residualPart(forms: CompanyForms, contrast: Contrast, cosine: number): Float64Array {
  const size = forms.slopes;
  const part = new Float64Array(2 * size);
  part.set(contrast.slopePart);
  for (let k = 0; k < size; k += 1) {
    part[size + k] = -dot(
      contrast.slopePart,
      slice(forms.basisProjection, cosine * size + k, size),
    );
  }
  contrast.companies.forEach((company, index) => {
    const place = company * forms.cosines + cosine;
    for (let k = 0; k < size; k += 1) {
      part[size + k] -= contrast.weights[index] * forms.meanProjection[place * size + k];
    }
  });
  return part;
}

function slice(values: Float64Array, index: number, length: number): Float64Array {
  return values.subarray(index * length, (index + 1) * length);
}

function form(matrix: Float64Array, left: Float64Array, right: Float64Array): number {
  let sum = 0;
  for (let row = 0; row < left.length; row += 1) {
    sum += left[row] * dot(slice(matrix, row, right.length), right);
  }
  return sum;
}

/** Visits the companies that both contrasts weigh; both list them in ascending order. */
function forShared(
  left: Contrast,
  right: Contrast,
  visit: (company: number, product: number) => void,
): void {
  let second = 0;
  left.companies.forEach((company, first) => {
    while (right.companies[second] < company) second += 1;
    if (right.companies[second] === company) {
      visit(company, left.weights[first] * right.weights[second]);
    }
  });
}
