import { moneyHint } from './money-hint';

describe('what a header says of its money', () => {
  for (const [header, hint] of [
    ['Capex (USD m)', { currency: 'USD', unit: 'millions' }],
    ['Market value [EUR bn]', { currency: 'EUR', unit: 'billions' }],
    ['Investitionen in TEUR', { currency: 'EUR', unit: 'thousands' }],
    ['Umsatz in Mio. €', { currency: 'EUR', unit: 'millions' }],
    ['capex_usd_k', { currency: 'USD', unit: 'thousands' }],
    ['Book equity (in thousands)', { unit: 'thousands' }],
    ['Market value, $ millions', { currency: 'USD', unit: 'millions' }],
    ['Figures in millions of CHF', { currency: 'CHF', unit: 'millions' }],
    ['Book equity EURm', { currency: 'EUR', unit: 'millions' }],
    ['Capex (GBP)', { currency: 'GBP' }],
    ['Capex', {}],
    ['M and A volume', {}],
    ['TOP 20 PEERS', {}],
    ['Market value', {}],
  ] as const) {
    it(`is read from ${header}`, () => {
      expect(moneyHint(header)).toEqual(hint);
    });
  }
});
