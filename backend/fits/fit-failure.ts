import type { Refusal } from '../compute/messages';
import type { FitFailure } from './fit-view';

/** The engine's refusal as it is kept: with columns, companies or rows that are concerned. */
export function failureOf({ code, detail, data }: Refusal): FitFailure {
  const { rows = [], columns = [], companies = [] } = data;
  return {
    code,
    detail,
    subjects: [...columns, ...companies, ...rows.slice(0, 50).map(({ row }) => `row ${row}`)],
  };
}
