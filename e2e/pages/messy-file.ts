import { csvLines, inventedRows } from './invented-figures';
import { type GivenFile, csvFile } from './import-page';

const companies = ['Aldersee', 'Brimholt', 'Corvane', 'Dunmarch', 'Eskerton', 'Fallowby'];
const years = 10;
const firstYear = 2014;

/** Figures without a flaw: what the faults below take the place of. */
export const soundRows = inventedRows(companies, firstYear, years);

export function soundRow(company: string, year: number) {
  const row = soundRows.find((each) => each.company === company && each.year === year);
  if (row === undefined) throw new Error(`there is no row of ${company} in ${year}`);
  return row;
}

/** Line of the file in which a row stands. */
export function lineOf(company: string, year: number): number {
  const line = messyLines().findIndex((text) => text.startsWith(`${company},${year},`));
  return line + 1;
}

/** A file with one fault of each kind. */
export function messyFile(): GivenFile {
  return csvFile('messy.csv', messyLines());
}

/** The last line repeats the row of Dunmarch in 2015. */
function messyLines(): string[] {
  const spoilt = soundRows
    .filter(({ company, year }) => !(company === 'Aldersee' && year === 2018)) // a year without a row
    .map((row) => {
      switch (`${row.company} ${row.year}`) {
        case 'Dunmarch 2018':
          return { ...row, capex: -row.capex };
        case 'Eskerton 2019':
          return { ...row, marketValue: row.marketValue * 4 };
        case 'Fallowby 2017':
          return { ...row, bookEquity: row.bookEquity / 1000 };
        case 'Brimholt 2020':
          return { ...row, bookEquity: soundRow('Brimholt', 2019).bookEquity };
        default:
          return row;
      }
    });
  const lines = csvLines(spoilt).map((line) => {
    if (line.startsWith('Aldersee,2015,')) return withCapex(line, '');
    if (line.startsWith('Brimholt,2016,')) return withCapex(line, 'see note 4');
    return line.replace(/^Corvane,(202[1-3]),/, 'Corvanne,$1,');
  });
  return [...lines, ...lines.filter((line) => line.startsWith('Dunmarch,2015,'))];
}

function withCapex(line: string, text: string): string {
  const cells = line.split(',');
  return [...cells.slice(0, 3), text, ...cells.slice(4)].join(',');
}
