import { max } from 'd3';
import {
  type CompanySeries,
  type MultiplesLine,
  type YearRows,
  labelGap,
  placedLine,
} from './company-multiples-lines';
import type { PlacedText } from './figure-types';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { snugScale } from './value-axis';
import { yearScale } from './year-axis';

export interface CompanyMultiplesData {
  /** Rows of the companies that are to be drawn. */
  readonly rows: readonly CompanySeries[];
  /** Names with their units: `capex, EUR m`. */
  readonly variables: readonly string[];
  readonly ownCompany: string | null;
  /** First and last year of every line, also where a company has fewer. */
  readonly years: readonly [number, number];
  /** Whether the lines of a variable share their scale; otherwise each has its own. */
  readonly scale: 'common' | 'own';
}

export interface MultiplesRow {
  readonly company: string;
  readonly isOwn: boolean;
  readonly name: PlacedText;
  readonly top: number;
  readonly lines: readonly MultiplesLine[];
}

export interface CompanyMultiplesLayout {
  readonly width: number;
  readonly height: number;
  readonly rowHeight: number;
  /** Names of the variables, above their lines. */
  readonly heads: readonly PlacedText[];
  /** First and last year, above each column of lines. */
  readonly ends: readonly PlacedText[];
  /** Own company first, the others in the order of the alphabet. */
  readonly rows: readonly MultiplesRow[];
}

const lineHeight = 40;
const inset = 9;
/** A company's name above its lines. */
const nameHeight = 24;
/** Above each line that stands under its company's name. */
const ownHead = 16;
const headHeight = 46;
/** Narrower than this the lines of a company stand under its name, one below the other. */
const leastSideBySide = 640;

/** A line a company and variable, all over the same years, with its first and last figure. */
export function companyMultiplesLayout(
  data: CompanyMultiplesData,
  {
    width,
    value,
  }: { readonly width: number; readonly value: (value: number, variable: number) => string },
): CompanyMultiplesLayout {
  const { variables } = data;
  const companies = seriesByCompany(data);
  const longest = max(companies, ({ company }) => wordsWidth(company, 13)) ?? 0;
  const isNameAbove = width < leastSideBySide;
  const columns = isNameAbove ? 1 : variables.length;
  const nameWidth = isNameAbove ? width - 20 : Math.min(longest + 4, width * 0.2);
  const left = isNameAbove ? 0 : 18 + nameWidth + 12;
  const columnWidth = (width - left) / columns;
  const labelWidth = widestLabel(data, value);
  const rowHeight = isNameAbove
    ? nameHeight + (ownHead + lineHeight) * variables.length
    : lineHeight;
  const head = isNameAbove ? 24 : headHeight;

  const span = (column: number): readonly [number, number] => {
    const start = left + column * columnWidth;
    return [
      start + labelWidth + labelGap + 4,
      Math.max(
        start + labelWidth + labelGap + 24,
        start + columnWidth - labelWidth - labelGap - 12,
      ),
    ];
  };
  const common = variables.map((_, variable) =>
    data.rows.map(({ values }) => values[variable] ?? null),
  );

  return {
    width,
    height: head + companies.length * rowHeight + 4,
    rowHeight,
    heads: isNameAbove
      ? []
      : variables.map((text, variable) => ({
          text: clippedWords(text, columnWidth - 12),
          x: span(variable)[0],
          y: 16,
          anchor: 'start',
        })),
    ends: Array.from({ length: columns }, (_, column) => {
      const [from, to] = span(column);
      const y = head - 8;
      return [
        { text: String(data.years[0]), x: from, y, anchor: 'start' as const },
        { text: String(data.years[1]), x: to, y, anchor: 'end' as const },
      ];
    }).flat(),
    rows: companies.map(({ company, ofYear }, place) => {
      const top = head + place * rowHeight;
      const isOwn = company === data.ownCompany;
      return {
        company,
        isOwn,
        name: {
          text: clippedWords(company, nameWidth, 13),
          x: 18,
          y: top + (isNameAbove ? 16 : lineHeight / 2 + 4),
          anchor: 'start',
        },
        top,
        lines: variables.map((_, variable) => {
          const [from, to] = span(isNameAbove ? 0 : variable);
          const above = isNameAbove ? nameHeight + variable * (ownHead + lineHeight) + ownHead : 0;
          const name: PlacedText = {
            text: variables[variable],
            x: 18,
            y: top + above - 2,
            anchor: 'start',
          };
          const values = data.scale === 'common' ? common[variable] : valuesOf(ofYear, variable);
          return placedLine(
            { variable, name: isNameAbove ? name : null, years: data.years, ofYear, isOwn },
            {
              x: yearScale([...data.years], [from, to]),
              y: snugScale(values, [top + above + lineHeight - inset, top + above + inset]),
              middle: top + above + lineHeight / 2,
              from,
              to,
              value,
            },
          );
        }),
      };
    }),
  };
}

function seriesByCompany({ rows, ownCompany }: CompanyMultiplesData) {
  const byCompany = new Map<string, Map<number, CompanySeries>>();
  for (const row of rows) {
    const known = byCompany.get(row.company);
    if (known === undefined) byCompany.set(row.company, new Map([[row.year, row]]));
    else known.set(row.year, row);
  }
  return [...byCompany]
    .map(([company, ofYear]) => ({ company, ofYear }))
    .sort(
      (a, b) =>
        Number(b.company === ownCompany) - Number(a.company === ownCompany) ||
        a.company.localeCompare(b.company, 'en'),
    );
}

function valuesOf(ofYear: YearRows, variable: number): (number | null)[] {
  return [...ofYear.values()].map(({ values }) => values[variable] ?? null);
}

function widestLabel(
  { rows, variables }: CompanyMultiplesData,
  value: (value: number, variable: number) => string,
): number {
  let widest = 0;
  for (const row of rows)
    for (let variable = 0; variable < variables.length; variable++) {
      const figure = row.values[variable];
      if (figure !== null) widest = Math.max(widest, figuresWidth(value(figure, variable)));
    }
  return widest;
}
