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
  const head = canonicalJson({
    engine: engineVersion,
    members: sample.members,
    outcome: sample.outcomeName,
    own,
    regressors: sample.regressorNames,
  });
  const tail = canonicalJson({ specification: { ...specification } });
  return `${head.slice(0, -1)},"rows":[${rowsUsed(sample)}],${tail.slice(1)}`;
}

/** [company, year, outcome, regressors …] in the panel's measure, by company and year; the single rows last; numbers as JSON writes them. */
function rowsUsed(sample: PanelSample): string {
  const { levels } = sample;
  const parts: string[] = [];
  sample.companies.forEach((company, index) => {
    const name = JSON.stringify(company);
    let text = '';
    for (let row = sample.starts[index]; row < sample.starts[index + 1]; row += 1) {
      text += `${text === '' ? '' : ','}[${name},${sample.year[row]},${levels.outcome[row]}`;
      for (const column of levels.regressors) text += `,${column[row]}`;
      text += ']';
    }
    parts.push(text);
  });
  for (const { company, year, levels: single } of sample.singles) {
    const values = [year, single.outcome, ...single.regressors];
    parts.push(`[${JSON.stringify(company)},${values.join(',')}]`);
  }
  return parts.join(',');
}

type Json = string | number | null | readonly Json[] | { readonly [key: string]: Json };

/** JSON with sorted keys; JSON.stringify writes a number in its shortest form that reads back the same. */
function canonicalJson(value: Json): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  const entries = Object.entries(value).sort(([left], [right]) => (left < right ? -1 : 1));
  return `{${entries.map(([key, entry]) => `${JSON.stringify(key)}:${canonicalJson(entry)}`).join(',')}}`;
}
