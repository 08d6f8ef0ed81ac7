import { fitOf, goldenPanel } from '../stats/testing/golden-panels';
import { accountFor } from './figure-accounts';

const panel = goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']);

describe('the account of a figure', () => {
  it('says of a plain model no more than its formula', () => {
    const account = accountFor(fitOf(panel, 'C06'), 'intercept.0');
    expect(account?.isMoney).toBeTrue();
    expect(account?.formula).not.toContain('logarithm');
  });

  it('calls logarithms no money, and what is turned back from them money', () => {
    const result = fitOf(panel, 'C06', { form: 'log' });
    for (const figure of ['standing', 'intercept.0', 'pair.0', 'gap.1940', 'drift']) {
      const account = accountFor(result, figure);
      expect(account?.isMoney).withContext(figure).toBeFalse();
      expect(account?.inputs.some(({ isMoney }) => isMoney))
        .withContext(figure)
        .toBeFalse();
      expect(account?.formula).withContext(figure).toContain('natural logarithms');
    }
    expect(accountFor(result, 'fitted.1940')?.isMoney).toBeTrue();
    expect(accountFor(result, 'fitted.1940')?.formula).toContain('smearing factor');
  });

  it('says which effects are taken out and which year the regressors are of', () => {
    const result = fitOf(panel, 'C06', { effects: 'company,year', lag: 1 });
    const formula = accountFor(result, 'slope.0')?.formula;
    expect(formula).toContain('effects of the years');
    expect(formula).toContain('fiscal year before');
  });
});
