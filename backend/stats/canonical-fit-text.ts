import { engineVersion } from './engine-version';
import type { Specification } from './fit-result';
import type { PanelSample } from './panel/panel-sample';

/**
 * The text whose digest identifies a fit: canonical JSON (sorted keys, shortest round-trip numbers) of the rows used,
 * members, own company, specification and engine version. The order of rows in the file, its name, rows of other
 * companies and the numbers of its lines are no part of it.
 */
export function canonicalFitText(
  sample: PanelSample,
  specification: Specification,
  own: string | null,
): string {
  return canonicalJson({
    engine: engineVersion,
    members: sample.members,
    outcome: sample.outcomeName,
    own,
    regressors: sample.regressorNames,
    rows: rowsUsed(sample),
    specification: { ...specification },
  });
}

/** [company, year, outcome, regressors …] in the panel's measure, by company and year. */
function rowsUsed(sample: PanelSample): (string | number)[][] {
  const { levels } = sample;
  const rows = sample.companies.flatMap((company, index) => {
    const from = sample.starts[index];
    return Array.from({ length: sample.starts[index + 1] - from }, (_, offset) => {
      const row = from + offset;
      const regressors = levels.regressors.map((column) => column[row]);
      return [company, sample.year[row], levels.outcome[row], ...regressors];
    });
  });
  const singles = sample.singles.map(({ company, year, levels: { outcome, regressors } }) => [
    company,
    year,
    outcome,
    ...regressors,
  ]);
  return [...rows, ...singles];
}

type Json = string | number | null | readonly Json[] | { readonly [key: string]: Json };

/** JSON with sorted keys; JSON.stringify writes a number in its shortest form that reads back the same. */
function canonicalJson(value: Json): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  const entries = Object.entries(value).sort(([left], [right]) => (left < right ? -1 : 1));
  return `{${entries.map(([key, entry]) => `${JSON.stringify(key)}:${canonicalJson(entry)}`).join(',')}}`;
}
