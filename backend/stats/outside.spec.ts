import type { Specification } from './fit-result';
import { openFit } from './open-fit';
import { goldenJson, goldenPanel, sha256 } from './testing/golden-panels';
import { engineFigures } from './testing/outside/engine-figures';
import { outsideDifference, type OutsideFigure } from './testing/outside/outside-difference';
import { toleranceOf } from './testing/outside/tolerances';

interface OutsideCase extends Pick<Specification, 'effects' | 'form' | 'lag' | 'confidence'> {
  readonly id: string;
  readonly file: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string;
  readonly plans: readonly (readonly number[])[];
  readonly figures: Readonly<Record<string, OutsideFigure>>;
}

// golden/outside.json: R 4.2.2 with plm, sandwich, clubSandwich, lmtest and car, and for what no package has R code from
// the full dummy regression; each figure names its call. `npm run check-outside -- --freeze` writes it.
const { cases } = goldenJson<{ readonly cases: readonly OutsideCase[] }>('outside.json');

function ours({ file, outcome, regressors, own, plans, ...rest }: OutsideCase) {
  const { effects, form, lag, confidence } = rest;
  const data = goldenPanel(file.replace(/^.*\//u, ''), outcome, regressors);
  const specification: Specification = {
    effects,
    form,
    lag,
    confidence,
    slopes: 'cr2',
    seed: null,
  };
  const open = openFit({ data, specification, own, members: undefined }, { sha256 });
  return engineFigures(open, plans);
}

describe('the engine beside R', () => {
  for (const outside of cases) {
    it(`gives every figure that R and the full dummy regression give (${outside.id})`, () => {
      const figures = ours(outside);
      for (const [name, expected] of Object.entries(outside.figures)) {
        expect(outsideDifference(figures[name] ?? [], expected))
          .withContext(`${name}, held to ${expected.call}`)
          .toBeLessThanOrEqual(toleranceOf(name));
      }
    });
  }
});

describe('outsideDifference', () => {
  const figure = { call: '', value: [2, null, 0], scale: [0, 0, 10] };

  it('is the largest one, relative to the larger of the outside number and its scale', () => {
    expect(outsideDifference([2.5, null, 1], figure)).toBe(0.25);
    expect(outsideDifference([2, null, 1], figure)).toBe(0.1);
    expect(outsideDifference([2, null, 1], { ...figure, scale: 4 })).toBe(0.25);
  });

  it('is infinite where one side has no number, or another count', () => {
    expect(outsideDifference([2, 1, 0], figure)).toBe(Infinity);
    expect(outsideDifference([null, null, 0], figure)).toBe(Infinity);
    expect(outsideDifference([NaN, null, 0], figure)).toBe(Infinity);
    expect(outsideDifference([2, null], figure)).toBe(Infinity);
  });
});
