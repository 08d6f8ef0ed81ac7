import { type DateOrder, orderIn } from './parse-date';

/** The order of day and month in a column, and whether the column itself says so. */
export interface ColumnDateOrder {
  readonly order: DateOrder;
  /** Whether dates of the column can be read both ways and none of them decides. */
  readonly isAmbiguous: boolean;
}

/**
 * Decides by the dates that are possible one way only; the more frequent way where there are both, the day first where
 * there are none.
 *
 * @param texts  the different texts of the column.
 */
export function dateOrder(texts: Iterable<string>): ColumnDateOrder {
  let dayFirst = 0;
  let monthFirst = 0;
  let either = 0;
  for (const text of texts) {
    const order = orderIn(text.trim());
    if (order === 'day-first') dayFirst += 1;
    else if (order === 'month-first') monthFirst += 1;
    else if (order === 'either') either += 1;
  }
  return {
    order: monthFirst > dayFirst ? 'month-first' : 'day-first',
    isAmbiguous: dayFirst === 0 && monthFirst === 0 && either > 0,
  };
}
