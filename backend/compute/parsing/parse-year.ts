import { isMissing } from './missing-cell';

/**
 * Reads a fiscal year: `2023`, `2023.0`, `FY2023`, `FY 2023`, `GJ 2023`.
 *
 * @returns the year, NaN where it is missing, undefined for any other text.
 */
export function parseYear(text: string): number | undefined {
  if (isMissing(text)) return NaN;
  const label = /^(?:(?:FY|GJ)[\s_-]?)?(\d{1,4})(?:[.,]0+)?$/iu.exec(text.trim());
  return label === null ? undefined : Number(label[1]);
}
