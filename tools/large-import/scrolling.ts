import type { Locator, Page } from '@playwright/test';

/** One way to scroll the grid, for so long. */
export interface Scrolling {
  readonly name: string;
  readonly scroll: (page: Page, grid: Locator) => Promise<void>;
}

const rowHeight = 32;
const wheelEveryMs = 16;

/** From the top to the bottom, about ten seconds together. */
export function scrollings(rows: number): readonly Scrolling[] {
  const whole = rows * rowHeight;
  return [
    { name: 'wheel, 60 rows a second', scroll: wheel(60 * rowHeight, 3000) },
    { name: 'wheel, 600 rows a second', scroll: wheel(600 * rowHeight, 2000) },
    { name: 'Page Down held', scroll: keys('PageDown', 2000) },
    { name: 'wheel, to the bottom', scroll: wheel(whole / 3, 3500) },
  ];
}

function wheel(pixelsPerSecond: number, forMs: number): Scrolling['scroll'] {
  return async (page, grid) => {
    const box = await grid.boundingBox();
    if (box === null) throw new Error('expected a grid on the screen');
    await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
    const began = performance.now();
    let told = began;
    while (told - began < forMs) {
      await page.waitForTimeout(wheelEveryMs);
      const now = performance.now();
      await page.mouse.wheel(0, ((now - told) / 1000) * pixelsPerSecond);
      told = now;
    }
  };
}

function keys(key: string, forMs: number): Scrolling['scroll'] {
  return async (page, grid) => {
    await grid.getByRole('gridcell').first().click();
    const began = performance.now();
    while (performance.now() - began < forMs)
      await page.keyboard.press(key, { delay: wheelEveryMs });
  };
}
