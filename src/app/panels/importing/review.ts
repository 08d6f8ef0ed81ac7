import type { ImportCheck, ImportFinding, ReviewRow } from '@contract';

/** A finding with the place of its cell among the row's, where it has one. */
export interface PlacedFinding {
  readonly finding: ImportFinding;
  /** Position among the table's headers; null where the cell stands elsewhere in the file. */
  readonly column: number | null;
}

export interface ReviewedRow {
  /** Its line, and which of the line's rows it is: stays the same through a check. */
  readonly key: string;
  readonly row: ReviewRow;
  readonly findings: readonly PlacedFinding[];
}

export interface Review {
  readonly rows: readonly ReviewedRow[];
  /** Findings that stand in none of the rows, as those of another sheet. */
  readonly elsewhere: readonly ImportFinding[];
}

/**
 * Puts each finding to its row. In a wide sheet one line of the file holds many rows: the one whose year the column
 * names has it, else the first.
 *
 * @param yearColumn  position of the year among `headers`.
 */
export function reviewOf(
  { findings, reviewRows }: Pick<ImportCheck, 'findings' | 'reviewRows'>,
  headers: readonly string[],
  yearColumn: number,
): Review {
  const byLine = new Map<number, ReviewRow[]>();
  for (const row of reviewRows) {
    const known = byLine.get(row.row);
    if (known === undefined) byLine.set(row.row, [row]);
    else known.push(row);
  }
  const placed = new Map<ReviewRow, PlacedFinding[]>();
  const elsewhere: ImportFinding[] = [];
  for (const finding of findings) {
    const rows = byLine.get(finding.row) ?? [];
    const row = rows.length < 2 ? rows.at(0) : (ofYear(rows, finding, yearColumn) ?? rows[0]);
    if (row === undefined) {
      elsewhere.push(finding);
      continue;
    }
    const column = columnOf(finding, headers);
    placed.set(row, [...(placed.get(row) ?? []), { finding, column }]);
  }
  // Of a line with many rows those that nothing is said of are not worth a look, unless the line can be taken back.
  const rows = reviewRows.flatMap((row) => {
    const ofLine = byLine.get(row.row) ?? [];
    const own = placed.get(row) ?? [];
    const isForLine = ofLine[0] === row && ofLine.every((one) => !placed.has(one));
    if (own.length === 0 && !isForLine) return [];
    return [{ key: `${row.row}/${ofLine.indexOf(row)}`, row, findings: own }];
  });
  return { rows, elsewhere };
}

function ofYear(
  rows: readonly ReviewRow[],
  { column }: ImportFinding,
  yearColumn: number,
): ReviewRow | undefined {
  return rows.find(({ cells }) => {
    const year = cells[yearColumn] ?? '';
    return year !== '' && column.includes(year);
  });
}

/** The header itself, else the longest one that the file's own header begins or ends with. */
function columnOf({ column }: ImportFinding, headers: readonly string[]): number | null {
  const exact = headers.indexOf(column);
  if (exact >= 0) return exact;
  const near = headers.filter((header) => column.startsWith(header) || column.endsWith(header));
  near.sort((left, right) => right.length - left.length);
  return near.length === 0 ? null : headers.indexOf(near[0]);
}

type Code = ImportFinding['code'];

/** What a finding is, in the words of the list; the order is that of the list. */
export const findingKinds: Readonly<Record<Code, string>> = {
  'not-a-number': 'Not a number',
  'ambiguous-number': 'A number that can be read two ways',
  duplicate: 'A company and year twice',
  'no-company': 'No company',
  year: 'Not a year',
  currency: 'Not a currency',
  'other-currency': 'Another currency',
  'no-rate': 'No rate',
  'no-price-index': 'No price index',
  sum: 'A company, or a sum of others',
  spelling: 'Two spellings of one name',
  missing: 'Empty cell',
  formula: 'A formula',
  mending: 'A mend that finds no cell',
};

export interface KindCount {
  readonly code: Code;
  readonly title: string;
  readonly count: number;
  readonly isBlocking: boolean;
}

/** The kinds that occur, those that keep the file out first. */
export function kindCounts(findings: readonly ImportFinding[]): readonly KindCount[] {
  return (Object.keys(findingKinds) as Code[])
    .map((code) => {
      const own = findings.filter((finding) => finding.code === code);
      return {
        code,
        title: findingKinds[code],
        count: own.length,
        isBlocking: own.some(({ isBlocking }) => isBlocking),
      };
    })
    .filter(({ count }) => count > 0)
    .sort((left, right) => Number(right.isBlocking) - Number(left.isBlocking));
}
