import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { FitResult as FitResultReply } from '../contract';
import { fitPanel, type FitResult, type PanelColumns, type SlopeCovarianceName } from '../stats';
import { toFitResultReply } from './fit-replies';

function panel(): PanelColumns {
  const text = readFileSync(
    new URL('../stats/golden/grunfeld11_value_on_inv_capital.csv', import.meta.url),
    'utf8',
  );
  const lines = text.trim().split('\n').slice(1);
  const cells = lines.map((line) => line.split(','));
  const companies = [...new Set(cells.map(([company]) => company))];
  const column = (index: number) => Float64Array.from(cells, (row) => Number(row[index]));
  return {
    companies,
    company: Int32Array.from(cells, ([company]) => companies.indexOf(company)),
    year: Int32Array.from(cells, (row) => Number(row[1])),
    fileRow: Int32Array.from(cells, (_, index) => index + 2),
    outcome: { name: 'value', values: column(3) },
    regressors: [
      { name: 'inv', values: column(2) },
      { name: 'capital', values: column(4) },
    ],
  };
}

function fitted(slopes: SlopeCovarianceName, own: string | null): FitResult {
  return fitPanel(
    panel(),
    { effects: 'company', form: 'levels', lag: 0, slopes, confidence: 0.95, seed: null },
    own,
    undefined,
    { sha256: (text) => createHash('sha256').update(text).digest('hex') },
  );
}

describe('the contract’s fit result', () => {
  for (const slopes of ['cr2', 'cr1', 'cr0', 'classical'] as const)
    it(`takes every member of the engine’s and loses none (${slopes})`, () => {
      for (const own of ['C06', null]) {
        const sent: unknown = JSON.parse(JSON.stringify(toFitResultReply(fitted(slopes, own))));
        expect(FitResultReply.parse(sent)).toEqual(sent as FitResultReply);
      }
    });
});
