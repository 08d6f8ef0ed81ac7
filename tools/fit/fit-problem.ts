import { StatsError } from '../../backend/stats';
import type { TableFinding } from '../../backend/compute/parsing/table-finding';
import { TableError } from '../../backend/compute/parsing/table-error';

/** Why the command did nothing: a stable type for programs, words for people, and what is concerned. */
export class FitProblem extends Error {
  override readonly name = 'FitProblem';

  constructor(
    readonly slug: string,
    readonly title: string,
    detail: string,
    readonly concerned: Readonly<Record<string, unknown>> = {},
  ) {
    super(detail);
  }

  /** The problem object of RFC 9457. */
  toJson(): Record<string, unknown> {
    return {
      type: `https://kinvale.example/problems/${this.slug}`,
      title: this.title,
      detail: this.message,
      ...this.concerned,
    };
  }
}

/** The problem behind an error that bad input causes; undefined for any other error. */
export function problemOf(error: unknown): FitProblem | undefined {
  if (error instanceof FitProblem) return error;
  if (error instanceof StatsError) {
    return new FitProblem(error.code, titles[error.code], error.message, { ...error.data });
  }
  if (error instanceof TableError) {
    return new FitProblem(error.code, tableTitles[error.code], error.message, { ...error.data });
  }
  return undefined;
}

/** One problem for all cells that make the panel unusable; its type is that of the first kind found. */
export function cellsProblem(findings: readonly TableFinding[]): FitProblem {
  const kinds = cellKinds.filter(({ code }) => findings.some((finding) => finding.code === code));
  const [first] = kinds;
  const rows = findings.map(({ row, column, found, code, detail }) => {
    const kind = cellKinds.find((known) => known.code === code) ?? first;
    return { row, column, found, problem: kind.slug, detail };
  });
  const counted = kinds.map(({ code, words }) => {
    const count = findings.filter((finding) => finding.code === code).length;
    return `${count} × ${words}`;
  });
  const lines = [...new Set(rows.map(({ row }) => row))];
  const shown = lines.slice(0, 10).join(', ') + (lines.length > 10 ? ' and more' : '');
  const detail = `found ${counted.join(', ')}: line ${shown}`;
  return new FitProblem(first.slug, first.title, detail, { rows });
}

const cellKinds = [
  {
    code: 'year',
    slug: 'year-not-whole',
    title: 'A year is not a whole number',
    words: 'a year that is not a whole number',
  },
  {
    code: 'not-a-number',
    slug: 'not-a-number',
    title: 'A number cannot be read',
    words: 'text where a number belongs',
  },
  {
    code: 'duplicate',
    slug: 'duplicate-rows',
    title: 'A company has a year twice',
    words: 'a row that shares company and year with another',
  },
] as const;

const titles: Readonly<Record<StatsError['code'], string>> = {
  shape: 'The columns do not fit together',
  specification: 'The specification is not offered',
  'non-finite': 'A number is too large or too small',
  'duplicate-rows': 'A company has a year twice',
  'unknown-company': 'A company has no rows with a year',
  'too-many-years': 'Too many different years',
  'too-few-companies': 'Too few companies with two rows',
  'outcome-constant': 'The outcome never varies within a company',
  'constant-within-companies': 'A regressor never varies within a company',
  'collinear-regressors': 'Regressors move together exactly',
  'same-for-all-companies': 'A regressor moves alike in every company',
  'not-positive': 'A number is zero or less in log form',
  'disconnected-years': 'The years fall into groups without a common company',
  'no-residual-degrees-of-freedom': 'No residual degrees of freedom',
};

const tableTitles: Readonly<Record<TableError['code'], string>> = {
  'csv-invalid': 'The file is no table',
  'table-too-large': 'The file is too large',
  'missing-column': 'A column is not in the file',
  'ambiguous-column': 'A column is named twice',
};
