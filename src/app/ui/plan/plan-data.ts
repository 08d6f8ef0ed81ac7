import type { DifferenceData, ExpectedPathData } from '@figures';
import type { IntervalEstimate, OwnYear, PredictionBasis } from '@prediction';
import { lagText } from '../phrases';
import { capitalised } from './plan-words';
import type { PlanReading, ReadYear } from './read-plan';

export interface DrawnPlan {
  readonly name: string;
  readonly years: readonly {
    readonly year: number;
    readonly expected: IntervalEstimate;
    /** Of the market value itself; missing where it was not stored. */
    readonly band?: { readonly low: number | null; readonly high: number | null };
  }[];
}

/**
 * What the chart of the expected value draws: history, the base held as long as the longest plan, and the plans.
 *
 * @param base  by year, or one that is the same in every year.
 */
export function expectedPathData(
  ownYears: readonly OwnYear[],
  base: PlanReading['bases'] | Pick<IntervalEstimate, 'estimate'>,
  plans: readonly DrawnPlan[],
): ExpectedPathData {
  const planned = new Set(plans.flatMap((plan) => plan.years.map(({ year }) => year)));
  const years = [...planned].sort((a, b) => a - b);
  return {
    ownYears,
    base:
      'estimate' in base
        ? years.map((year) => ({ year, estimate: base.estimate }))
        : base.filter(({ year }) => planned.has(year)),
    plans: plans.map((plan) => ({
      name: plan.name,
      years: plan.years.map(({ year, expected: { estimate, low, high }, band }) => ({
        year,
        estimate,
        low,
        high,
        ...(band === undefined ? {} : { bandLow: band.low, bandHigh: band.high }),
      })),
    })),
  };
}

/** What the bars of a year's difference to the base draw; their terms add up to its total, in log form as logs do. */
export function differenceData(
  year: ReadYear,
  labels: readonly string[],
  lag: PredictionBasis['lag'],
): DifferenceData {
  return {
    terms: year.parts.terms.map(({ estimate, low, high, intervalReason }, k) => ({
      name: capitalised(labels[k]) + lagText(lag),
      estimate,
      low,
      high,
      ...(intervalReason === undefined ? {} : { intervalReason }),
    })),
    total: year.difference,
  };
}
