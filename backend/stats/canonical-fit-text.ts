import { engineVersion } from './engine-version';
import type { FitRequest } from './fit-parts';
import type { Specification } from './fit-result';
import { heldValues } from './held-values';
import type { PanelSample } from './panel/panel-sample';
import { mostEnumerated } from './slopes/bootstrap/sign-draws';

/**
 * The text whose digest identifies a fit: canonical JSON (sorted keys, shortest round-trip numbers) of the rows used,
 * members, own company, specification and engine version. The order of rows in the file, its name, rows of other
 * companies and the numbers of its lines are no part of it. With a lag the own company's last values, which no row of
 * the fit has read yet but every plan starts from, are `held`. The seed is null where nothing is drawn by it: a bootstrap
 * of so few companies looks at every sign vector.
 */
export function canonicalFitText(
  sample: PanelSample,
  request: Pick<FitRequest, 'data' | 'specification' | 'own'>,
): string {
  const { own } = request;
  const head = canonicalJson({
    engine: engineVersion,
    ...heldOf(sample, request),
    members: sample.members,
    outcome: sample.outcomeName,
    own,
    regressors: sample.regressorNames,
  });
  const tail = canonicalJson({
    specification: { ...withSeedInUse(sample, request.specification) },
  });
  return `${head.slice(0, -1)},"rows":[${rowsUsed(sample)}],${tail.slice(1)}`;
}

function heldOf(
  { companies, starts, year }: PanelSample,
  { data, specification, own }: Pick<FitRequest, 'data' | 'specification' | 'own'>,
): { readonly held?: readonly number[] | null } {
  const index = own === null ? -1 : companies.indexOf(own);
  if (specification.lag === 0 || index === -1) return {};
  const last = year[starts[index + 1] - 1];
  return { held: heldValues({ data, form: specification.form }, companies[index], last) };
}

function withSeedInUse({ companies }: PanelSample, specification: Specification): Specification {
  return companies.length <= mostEnumerated ? { ...specification, seed: null } : specification;
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
