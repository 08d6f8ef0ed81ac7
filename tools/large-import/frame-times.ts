import type { Page } from '@playwright/test';

/** Milliseconds between the frames that a page drew. */
export interface FrameTimes {
  readonly frames: number;
  readonly median: number;
  readonly p95: number;
  readonly worst: number;
  /** Share of the frames that took longer than two of a screen with 60 a second. */
  readonly late: number;
}

const lateMs = 33.4;

/** Has the page note when it draws, while something is done to it. */
export async function framesWhile(page: Page, act: () => Promise<void>): Promise<FrameTimes> {
  const noting = await page.evaluateHandle(() => {
    const times: number[] = [];
    const state = { times, isOver: false };
    const note = (time: number): void => {
      times.push(time);
      if (!state.isOver) requestAnimationFrame(note);
    };
    requestAnimationFrame(note);
    return state;
  });
  await act();
  const times = await noting.evaluate((state) => {
    state.isOver = true;
    return state.times;
  });
  await noting.dispose();
  return frameTimes(times);
}

function frameTimes(times: readonly number[]): FrameTimes {
  const gaps = times.slice(1).map((time, index) => time - times[index]);
  if (gaps.length === 0) throw new Error('expected frames; the page drew none');
  const sorted = gaps.toSorted((one, other) => one - other);
  const at = (share: number): number => sorted[Math.floor((sorted.length - 1) * share)];
  return {
    frames: gaps.length,
    median: at(0.5),
    p95: at(0.95),
    worst: at(1),
    late: gaps.filter((gap) => gap > lateMs).length / gaps.length,
  };
}

export function inWords({ frames, median, p95, worst, late }: FrameTimes): string {
  const [middle, high, most] = [median, p95, worst].map((time) => `${time.toFixed(1)} ms`);
  return `${frames} frames, median ${middle}, p95 ${high}, worst ${most}, ${(100 * late).toFixed(1)} % over 33 ms`;
}
