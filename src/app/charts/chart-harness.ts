import type { TestKey } from '@angular/cdk/testing';
import { ComponentHarness, HarnessPredicate } from '@angular/cdk/testing';

/** Any chart, through what a person can do with it: read its points, walk them, see them as a table. */
export class ChartHarness extends ComponentHarness {
  static hostSelector = 'kv-chart-frame';

  static with(options: { title: string | RegExp }): HarnessPredicate<ChartHarness> {
    return new HarnessPredicate(ChartHarness, {}).addOption(
      'title',
      options.title,
      (chart, title) => HarnessPredicate.stringMatches(chart.title(), title),
    );
  }

  readonly #figure = this.locatorFor('figure');
  readonly #buttons = this.locatorForAll('.actions button');
  readonly #points = this.locatorForAll('[role="button"][tabindex], g[role="img"][tabindex]');
  readonly #tabStops = this.locatorForAll('svg [tabindex="0"]');
  readonly #headers = this.locatorForAll('thead th');
  readonly #rows = this.locatorForAll('tbody tr');
  readonly #cells = this.locatorForAll('tbody th, tbody td');

  /** The grid of a map, which takes keys for all its cells. */
  readonly grid = this.locatorFor('[role="grid"]');

  /** The plot of a cloud of points, which takes keys for all of them. */
  readonly cloud = this.locatorFor('svg[role="listbox"]');

  readonly #option = this.locatorForOptional('[role="option"]');

  async title(): Promise<string | null> {
    return (await this.#figure()).getAttribute('aria-label');
  }

  /** What each point says, in the order of the arrow keys. */
  async points(): Promise<(string | null)[]> {
    return Promise.all((await this.#points()).map((point) => point.getAttribute('aria-label')));
  }

  async tabStops(): Promise<(string | null)[]> {
    return Promise.all((await this.#tabStops()).map((point) => point.getAttribute('aria-label')));
  }

  /** Sends the key to the point that Tab reaches. */
  async press(...keys: (TestKey | string)[]): Promise<void> {
    for (const key of keys) await (await this.#tabStops())[0].sendKeys(key);
  }

  /** What the point with the focus says; null where none has it. */
  async focusedPoint(): Promise<string | null> {
    for (const point of await this.#points())
      if (await point.isFocused()) return point.getAttribute('aria-label');
    return null;
  }

  /** What the point of a cloud says that the keys stand on; null in an empty one. */
  async cloudPoint(): Promise<string | null> {
    const option = await this.#option();
    return option === null ? null : option.getAttribute('aria-label');
  }

  async clickPoint(label: string | RegExp): Promise<void> {
    for (const point of await this.#points()) {
      const matches = HarnessPredicate.stringMatches(point.getAttribute('aria-label'), label);
      if (await matches) return point.dispatchEvent('click');
    }
    throw new Error(`expected a point ${String(label)}; found ${String(await this.points())}`);
  }

  /** Shows the table, or the chart again. */
  async toggle(): Promise<void> {
    await (await this.#buttons())[0].click();
  }

  async headers(): Promise<string[]> {
    return Promise.all((await this.#headers()).map((cell) => cell.text()));
  }

  /** The table's cells, row by row; empty while the chart is shown. */
  async table(): Promise<string[][]> {
    const cells = await Promise.all((await this.#cells()).map((cell) => cell.text()));
    const width = (await this.#headers()).length;
    return (await this.#rows()).map((_, row) => cells.slice(row * width, (row + 1) * width));
  }
}
