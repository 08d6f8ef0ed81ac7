import { parse as parseCsv } from 'csv-parse/sync';
import { parseArgs } from 'node:util';
import { covarianceNames, type Specification } from '../../backend/stats';
import { FitProblem } from './fit-problem';

/** What the command was asked for. */
export interface FitArguments {
  readonly panel: string;
  readonly company: string;
  readonly year: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string | null;
  readonly members: readonly string[] | undefined;
  readonly specification: Specification;
  readonly isEvidenceAsked: boolean;
}

const options = {
  panel: { type: 'string' },
  company: { type: 'string' },
  year: { type: 'string' },
  outcome: { type: 'string' },
  regressors: { type: 'string' },
  own: { type: 'string' },
  members: { type: 'string' },
  effects: { type: 'string', default: 'company' },
  form: { type: 'string', default: 'levels' },
  slopes: { type: 'string', default: 'cr2' },
  confidence: { type: 'string', default: '0.95' },
  seed: { type: 'string', default: '1' },
  lag: { type: 'string', default: '0' },
  evidence: { type: 'boolean', default: false },
} as const;

/**
 * Reads the command line.
 * @throws {FitProblem} 'bad-arguments'.
 */
export function readArguments(args: readonly string[]): FitArguments {
  const values = parseStrictly(args);
  const required = (name: 'panel' | 'company' | 'year' | 'outcome' | 'regressors'): string => {
    const value = values[name];
    if (value === undefined || value === '') throw badArguments(`expected --${name}; found none`);
    return value;
  };
  const slopes = choice(values, 'slopes', covarianceNames);
  const seed = seedOf(values.seed);
  const specification: Specification = {
    effects: choice(values, 'effects', ['company', 'company,year']),
    form: choice(values, 'form', ['levels', 'log']),
    lag: choice(values, 'lag', ['0', '1']) === '1' ? 1 : 0,
    slopes,
    confidence: confidenceOf(values.confidence),
    // Only the bootstrap draws: elsewhere a seed would decide nothing, and two seeds would make two fits of one.
    seed: slopes === 'wild' ? seed : null,
  };
  return {
    panel: required('panel'),
    company: required('company'),
    year: required('year'),
    outcome: required('outcome'),
    regressors: listOf('regressors', required('regressors')),
    own: values.own ?? null,
    members: values.members === undefined ? undefined : listOf('members', values.members),
    specification,
    isEvidenceAsked: values.evidence,
  };
}

type Values = ReturnType<typeof parseStrictly>;

function parseStrictly(
  args: readonly string[],
): ReturnType<typeof parseArgs<{ options: typeof options }>>['values'] {
  try {
    return parseArgs({ args: [...args], options, strict: true, allowPositionals: false }).values;
  } catch (error) {
    if (error instanceof TypeError) throw badArguments(error.message);
    throw error;
  }
}

function choice<Choice extends string>(
  values: Values,
  name: 'effects' | 'form' | 'slopes' | 'lag',
  offered: readonly Choice[],
): Choice {
  const value = values[name];
  const found = offered.find((one) => one === value);
  if (found !== undefined) return found;
  throw badArguments(`expected --${name} to be ${offered.join(', ')}; found ${value}`);
}

function confidenceOf(text: string): number {
  const value = text.trim() === '' ? NaN : Number(text);
  if (value > 0 && value < 1) return value;
  throw badArguments(`expected --confidence between 0 and 1, as 0.95; found ${text}`);
}

function seedOf(text: string): number {
  if (/^\d{1,15}$/u.test(text)) return Number(text);
  throw badArguments(`expected --seed to be a whole number; found ${text}`);
}

/** A list as one line of CSV, so that a name with a comma can stand in quotes. */
function listOf(name: string, text: string): string[] {
  let records: string[][];
  try {
    records = parseCsv(text, { trim: true });
  } catch {
    throw badArguments(
      `expected --${name} as A,B with names that hold commas in quotes; found ${text}`,
    );
  }
  const list = records.flat();
  if (list.length > 0 && list.every((entry) => entry !== '')) return list;
  throw badArguments(`expected --${name} as A,B; found “${text}”`);
}

function badArguments(detail: string): FitProblem {
  return new FitProblem('bad-arguments', 'The command line cannot be read', detail);
}
