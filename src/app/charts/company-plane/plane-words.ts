import type { PlaneSide } from '@figures';

export const sideWords: Readonly<Record<PlaneSide, string>> = {
  own: 'own company',
  in: 'in',
  out: 'out',
};

/** What one axis of the plane shows, and how its values are written. */
export interface PlaneMeasure {
  /** With its unit: `market value, EUR m`. */
  readonly title: string;
  /** Values above 0 whose ratios matter. */
  readonly isLog: boolean;
  /** In words: `1,234`, `6.2 %`. */
  readonly text: (value: number) => string;
  /** With every digit in the same unit, for a file. */
  readonly exact: (value: number) => number | null;
  readonly tick: (value: number, step: number) => string;
}

/** A company of the plane, with what else is said of it. */
export interface PlaneRow {
  readonly company: string;
  readonly side: PlaneSide;
  readonly x: number;
  readonly y: number;
  /** `1.85`; empty where there is none. */
  readonly distance: string;
  /** With every digit; null where there is none. */
  readonly exactDistance: number | null;
}
