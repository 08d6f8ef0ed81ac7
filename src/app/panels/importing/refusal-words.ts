import type { ApiProblem } from '../../api/api-problem';
import { sentence } from '../../ui/phrases';
import type { ShownProblem } from '../../ui/problem';

const megabyte = 1024 * 1024;
export const mostMegabytes = { csv: 40, xlsx: 10 } as const;

/**
 * What to do about a file that the server does not take, by the code in its answer. Of a workbook with macros, links or
 * a password the answer itself says what to save instead.
 */
const advice: Readonly<Record<string, string>> = {
  type_not_allowed:
    'Save the table as CSV or as an Excel workbook (.xlsx) and choose that file. Older workbooks (.xls) and those with macros (.xlsm) are not taken.',
  too_large: `A CSV file may have ${mostMegabytes.csv} MB, a workbook ${mostMegabytes.xlsx} MB. Leave out sheets and columns that the panel does not need, or save the sheet as CSV.`,
  zip_limit:
    'The workbook unpacks to more than is read. Save the one sheet that is needed as a workbook of its own, or as CSV.',
  sheet_limit:
    'A table may have 200,000 rows and 200 columns. Bring it in in parts, or leave out columns that the panel does not need.',
  csv_invalid:
    'Save the table as CSV, in UTF-8 best, with one delimiter and quotes around texts that hold it, and choose it again.',
  parse_timeout: 'Reading took too long. Save the one sheet that is needed as CSV and choose that.',
  parse_memory:
    'Reading took too much memory. Save the one sheet that is needed as CSV and choose that.',
  quota: 'Discard imports that wait on the Panel page, or wait for one that is under way.',
};

/** The problem in the reader's terms, with what to do. */
export function refusalWords(problem: ApiProblem): ShownProblem {
  const code = codeOf(problem);
  const whatToDo = Object.hasOwn(advice, code) ? advice[code] : undefined;
  const { detail, ...shown } = problem.shown;
  return {
    ...shown,
    ...(detail === undefined
      ? {}
      : { detail: sentence(detail.charAt(0).toUpperCase() + detail.slice(1)) }),
    ...(whatToDo === undefined ? {} : { whatToDo }),
  };
}

/** Why a file is not sent at all; null for one that is. */
export function refusedHere({ name, size }: Pick<File, 'name' | 'size'>): ShownProblem | null {
  const isWorkbook = /\.xlsx$/i.test(name);
  if (!isWorkbook && !/\.(csv|tsv|txt)$/i.test(name))
    return {
      title: 'This kind of file is not read',
      detail: `Expected a .csv or an .xlsx file; found ${name}.`,
      whatToDo: advice['type_not_allowed'],
    };
  const most = isWorkbook ? mostMegabytes.xlsx : mostMegabytes.csv;
  if (size <= most * megabyte) return null;
  return {
    title: 'The file is too large',
    detail: `Expected at most ${most} MB; ${name} has ${(size / megabyte).toFixed(1)} MB.`,
    whatToDo: advice['too_large'],
  };
}

/** The server's own code, else the one that the kind of problem stands for. */
function codeOf({ slug, problem }: ApiProblem): string {
  const code = problem['code'];
  if (typeof code === 'string') return code;
  if (slug === 'too-large') return 'too_large';
  if (slug === 'type-not-allowed') return 'type_not_allowed';
  return slug === 'storage-full' ? 'quota' : '';
}
