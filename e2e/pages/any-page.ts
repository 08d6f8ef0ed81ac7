import { CheckedPage, breachesOfWcag, colourRules, expect } from './checked-page';

const sizes = [
  { width: 1440, height: 900 },
  { width: 1024, height: 768 },
  { width: 360, height: 740 },
] as const;

/** Whatever stands at an address, looked at in every size and scheme. */
export class AnyPage extends CheckedPage {
  async visit(path: string): Promise<void> {
    await this.page.goto(path);
    await expect(this.heading.first()).toBeVisible();
    await this.page.waitForLoadState('networkidle');
  }

  /** Holds the page to WCAG and to the width of its window; goes on after a breach, so that all are named. */
  async holdInEverySize(): Promise<void> {
    for (const size of sizes) {
      await this.#show(size, 'light');
      const name = `${this.page.url()} at ${size.width}`;
      const { beyond, height } = await this.#measure();
      expect.soft(beyond, `${name}: pixels beyond the window`).toBeLessThan(2);
      // So tall that the bar at the foot of a phone covers nothing that can be scrolled clear of it.
      const tall = { ...size, height: Math.max(size.height, height + 100) };
      await this.#show(tall, 'light');
      expect.soft(await breachesOfWcag(this.page), `axe on ${name}, light`).toEqual([]);
      await this.#show(tall, 'dark');
      const inDark = await breachesOfWcag(this.page, colourRules);
      expect.soft(inDark, `axe on ${name}, dark`).toEqual([]);
    }
  }

  /** Charts draw themselves anew a moment after a change of size. */
  async #show(
    size: { readonly width: number; readonly height: number },
    colorScheme: 'light' | 'dark',
  ): Promise<void> {
    await this.page.setViewportSize(size);
    await this.page.emulateMedia({ colorScheme });
    await this.page.evaluate(async () => {
      for (let frame = 0; frame < 3; frame += 1) await new Promise(requestAnimationFrame);
    });
  }

  #measure(): Promise<{ readonly beyond: number; readonly height: number }> {
    return this.page.evaluate(() => {
      const element = document.scrollingElement ?? document.documentElement;
      return { beyond: element.scrollWidth - element.clientWidth, height: element.scrollHeight };
    });
  }
}
