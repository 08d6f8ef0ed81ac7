import { setTimeout as pause } from 'node:timers/promises';
import type { Locator } from '@playwright/test';

const lookEveryMs = 40;

/**
 * Reads `Writing rows: 60,000 of 200,000` off the page until it says so many rows, or is gone.
 *
 * @returns each different number of rows that stood there, in order.
 */
export async function rowsShown(line: Locator, until: number): Promise<readonly number[]> {
  const shown: number[] = [];
  await line.waitFor();
  for (;;) {
    const [text] = await line.allInnerTexts();
    if (text === undefined) return shown;
    const [done] = [...text.matchAll(/[\d,]+/g)].map(([digits]) =>
      Number(digits.replaceAll(',', '')),
    );
    if (done !== undefined && done !== shown.at(-1)) shown.push(done);
    if (done !== undefined && done >= until) return shown;
    await pause(lookEveryMs);
  }
}
