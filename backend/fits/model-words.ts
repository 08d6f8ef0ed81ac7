import type { Specification } from '../stats';
import type { FigureAccount } from './figure-text';

/** Figures that stand in the panel's measure even where the model takes logarithms. */
const turnedBack = new Set(['fitted', 'expected', 'difference']);

/** An account in the words of its model: what logarithms, year effects and a lag change of it. */
export function inModelWords(
  account: FigureAccount,
  kind: string,
  { form, effects, lag }: Pick<Specification, 'form' | 'effects' | 'lag'>,
): FigureAccount {
  const isLog = form === 'log';
  const isTurnedBack = turnedBack.has(kind);
  const notes = [
    isLog && isTurnedBack
      ? 'All of it in natural logarithms; their sum is turned back into an amount and multiplied by the smearing factor.'
      : undefined,
    isLog && !isTurnedBack ? 'All amounts are natural logarithms.' : undefined,
    effects === 'company,year' ? 'The effects of the years are taken out as well.' : undefined,
    lag === 1 ? 'Every regressor is that of the fiscal year before.' : undefined,
  ].filter((note) => note !== undefined);
  if (notes.length === 0) return account;
  const worded = { ...account, formula: [account.formula, ...notes].join(' ') };
  if (!isLog || isTurnedBack) return worded;
  return {
    ...worded,
    isMoney: false,
    inputs: account.inputs.map((input) => ({ ...input, isMoney: false })),
  };
}
