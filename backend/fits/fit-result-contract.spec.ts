import { FitResult as FitResultReply } from '../contract';
import { type FitResult, fitPanel, type Specification } from '../stats';
import { goldenPanel, plainSpecification, sha256 } from '../stats/testing/golden-panels';
import { toFitResultReply } from './fit-replies';

const panel = goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']);

function fitted(specification: Specification, own: string | null): FitResult {
  return fitPanel(panel, specification, own, undefined, { sha256 });
}

const specifications: readonly Partial<Specification>[] = [
  ...(['cr2', 'cr1', 'cr0', 'classical', 'hc0', 'hc1', 'hc2', 'hc3'] as const).map((slopes) => ({
    slopes,
  })),
  { slopes: 'two-way' },
  { slopes: 'driscoll-kraay' },
  { slopes: 'wild', seed: 1 },
  { effects: 'company,year' },
  { form: 'log' },
  { lag: 1 },
  { effects: 'company,year', form: 'log', lag: 1 },
];

describe('the contract’s fit result', () => {
  for (const specification of specifications)
    it(`takes every member of the engine’s and loses none (${JSON.stringify(specification)})`, () => {
      for (const own of ['C06', null]) {
        const result = fitted({ ...plainSpecification, ...specification }, own);
        const sent: unknown = JSON.parse(JSON.stringify(toFitResultReply(result)));
        expect(FitResultReply.parse(sent)).toEqual(sent as FitResultReply);
      }
    });
});
