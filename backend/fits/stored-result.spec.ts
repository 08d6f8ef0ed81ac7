import { FitResult as FitResultReply } from '../contract';
import { type FitResult, fitPanel } from '../stats';
import { goldenPanel, plainSpecification, sha256 } from '../stats/testing/golden-panels';
import { toFitResult } from './stored-result';

/** As engine 1.0.1 wrote it: no word of what it did not know. */
function storedByFirstEngine(): object {
  const panel = goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']);
  const { smearing: _, ...result } = fitPanel(panel, plainSpecification, 'C06', undefined, {
    sha256,
  });
  return JSON.parse(JSON.stringify({ ...result, engine: '1.0.1' })) as object;
}

describe('a result of an earlier engine', () => {
  it('is read with what it lacks said to be none', () => {
    const stored = storedByFirstEngine();
    expect(toFitResult(stored)).toEqual(jasmine.objectContaining({ ...stored, smearing: null }));
  });

  it('passes the contract as an edition froze it', () => {
    const stored = storedByFirstEngine();
    expect(stored).not.toEqual(jasmine.objectContaining({ smearing: null }));
    expect(FitResultReply.parse(stored).smearing).toBeNull();
  });

  it('passes the contract with dropped rows that name no company and year', () => {
    const stored = storedByFirstEngine() as FitResult;
    const dropped = [{ row: 94, column: 'capital', reason: 'missing' as const }];
    const { sample } = FitResultReply.parse({ ...stored, sample: { ...stored.sample, dropped } });
    expect(sample.dropped).toEqual(dropped);
  });
});
