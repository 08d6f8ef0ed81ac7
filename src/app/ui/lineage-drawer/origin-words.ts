import type { CellOrigin, LineageReply, Unit } from '@contract';
import { fullText } from '@figures';
import { listed, sentence } from '../phrases';

/** A cell that is other than the file has it: where it stands, and how it came to be so. */
export interface OriginLine {
  /** `Velmara FY2024 value`. */
  readonly place: string;
  /** `USD at 0.95, the year-end rate.` */
  readonly words: string;
}

/** The cells of the lineage that are other than the file has them, row by row. */
export function originLines({ cells, panelVersion }: LineageReply): readonly OriginLine[] {
  return cells.rows.flatMap(({ company, year, origins }) =>
    origins.flatMap((origin, index) => {
      const words = origin === null ? '' : originWords(origin, panelVersion.unit);
      return words === ''
        ? []
        : [{ place: `${company} FY${year} ${cells.columns[index].name}`, words }];
    }),
  );
}

function originWords({ corrected, conversion }: CellOrigin, panelUnit: Unit): string {
  if (corrected !== null) {
    const { by, reason, source, before } = corrected;
    const from = source === '' ? '' : ` Source: ${sentence(source)}`;
    return `Corrected from ${fullText(before)} by ${by}: ${sentence(reason)}${from}`;
  }
  if (conversion === null) return '';
  const { currency, rate, rateKind, unit, priceIndex } = conversion;
  const steps = [
    ...(currency === null || rate === null
      ? []
      : [`${currency} at ${rate}, ${rateWords(rateKind)}`]),
    ...(unit === null ? [] : [`${unit} into ${panelUnit}`]),
    ...(priceIndex === null
      ? []
      : [
          `prices at index ${priceIndex.year} into those of ${priceIndex.baseYear}, index ${priceIndex.base}`,
        ]),
  ];
  return steps.length === 0 ? '' : `Converted: ${sentence(listed(steps))}`;
}

function rateWords(kind: 'average' | 'year-end' | null): string {
  return kind === 'average' ? 'the year’s average rate' : 'the year-end rate';
}
