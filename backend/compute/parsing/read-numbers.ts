import type { NamedColumn } from '../../stats';
import { decimalSigns } from './decimal-signs';
import { type CellRemark, findingAt, type FindingList } from './finding-list';
import { type DecimalSign, parseNumber } from '../../panel-data/numbers/parse-number';
import type { ReadingTerms } from './reading-terms';
import type { Table } from './table';

/**
 * The numbers of the placed rows; NaN stands for a missing cell or a text. A text where a number belongs is found in
 * every row, also in one that names no company or year: it may be the sign of a shifted line. A gap is found in placed
 * rows only. A number that is stored as one is taken as it is; the decimal sign is for texts.
 *
 * @param placed  rows of the table that stand in the panel, ascending.
 * @param indices  columns of the table.
 */
export function readNumbers(
  table: Table,
  placed: Int32Array,
  indices: readonly number[],
  terms: Pick<ReadingTerms, 'decimalSign'>,
  findings: FindingList,
): NamedColumn[] {
  const signs = columnSigns(table, indices, terms, findings);
  const { rows, isNumber } = table;
  const values = indices.map(() => new Float64Array(placed.length));
  let next = 0;
  // Row by row, as the cells lie in memory.
  for (let row = 0; row < rows.length; row++) {
    const isPlaced = placed[next] === row;
    for (let k = 0; k < indices.length; k++) {
      const text = rows[row][indices[k]];
      const isStored = isNumber?.(row, indices[k]) === true;
      const value = isStored ? Number(text) : parseNumber(text, signs[k]);
      if (value === undefined)
        findings.add(findingAt(table, row, indices[k], noNumber[terms.decimalSign][signs[k]]));
      else if (isPlaced && Number.isNaN(value))
        findings.add(findingAt(table, row, indices[k], noValue));
      if (isPlaced) values[k][next] = value ?? NaN;
    }
    if (isPlaced) next += 1;
  }
  return indices.map((index, k): NamedColumn => ({ name: table.header[index], values: values[k] }));
}

function columnSigns(
  table: Table,
  indices: readonly number[],
  { decimalSign }: Pick<ReadingTerms, 'decimalSign'>,
  findings: FindingList,
): DecimalSign[] {
  if (decimalSign !== 'as-found') return indices.map(() => decimalSign);
  return decimalSigns(table, indices).map((column, k) => {
    if (column.ambiguousAt !== null) {
      const text = table.rows[column.ambiguousAt][indices[k]];
      const remark = ambiguousNumber(text, column.decimalSign);
      findings.add(findingAt(table, column.ambiguousAt, indices[k], remark));
    }
    return column.decimalSign;
  });
}

function ambiguousNumber(text: string, decimalSign: DecimalSign): CellRemark {
  const value = String(parseNumber(text, decimalSign));
  const wording = decimalSign === ',' ? 'comma' : 'point';
  return {
    code: 'ambiguous-number',
    detail: `Nothing in this column says whether the sign in it parts thousands or decimals: with a decimal ${wording} this is ${value}. Choose the decimal sign if that is not meant.`,
    isBlocking: false,
  };
}

const noValue: CellRemark = {
  code: 'missing',
  detail: 'No value: the row counts in no fit that uses this column.',
  isBlocking: false,
};

const asFound: Readonly<Record<DecimalSign, CellRemark>> = {
  '.': notANumber('decimal point, as the rest of the column has'),
  ',': notANumber('decimal comma, as the rest of the column has'),
};
const asChosen: Readonly<Record<DecimalSign, CellRemark>> = {
  '.': notANumber('decimal point, as chosen for the file'),
  ',': notANumber('decimal comma, as chosen for the file'),
};
const noNumber = { 'as-found': asFound, '.': asChosen, ',': asChosen };

function notANumber(wording: string): CellRemark {
  return { code: 'not-a-number', detail: `Expected a number with a ${wording}.`, isBlocking: true };
}
