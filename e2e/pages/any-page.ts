import { CheckedPage, expect, expectAccessible } from './checked-page';

export const sizes = [
  { width: 1440, height: 900 },
  { width: 1024, height: 768 },
  { width: 360, height: 740 },
] as const;

export const schemes = ['light', 'dark'] as const;

/** Whatever stands at an address, looked at in every size and scheme. */
export class AnyPage extends CheckedPage {
  async visit(path: string): Promise<void> {
    await this.page.goto(path);
    await expect(this.heading.first()).toBeVisible();
    await this.page.waitForLoadState('networkidle');
  }

  /** Holds the page to WCAG and to the width of its window; goes on after a breach, so that all are named. */
  async holdInEverySize(): Promise<void> {
    for (const size of sizes)
      for (const colorScheme of schemes) {
        await this.page.setViewportSize(size);
        await this.page.emulateMedia({ colorScheme });
        await this.#settle();
        const name = `${this.page.url()} at ${size.width}, ${colorScheme}`;
        expect.soft(await this.#overflow(), `${name}: pixels beyond the window`).toBeLessThan(2);
        await expectAccessible(this.page, expect.soft, name);
      }
  }

  /** Charts draw themselves anew a moment after a change of size. */
  async #settle(): Promise<void> {
    await this.page.evaluate(async () => {
      for (let frame = 0; frame < 3; frame += 1) await new Promise(requestAnimationFrame);
    });
  }

  #overflow(): Promise<number> {
    return this.page.evaluate(() => {
      const { scrollWidth, clientWidth } = document.scrollingElement ?? document.documentElement;
      return scrollWidth - clientWidth;
    });
  }
}
