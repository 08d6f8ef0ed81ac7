import type { Page } from '@playwright/test';
import { PanelVersionReply, PanelVersionsReply } from '@contract';
import { expect, test } from '../../e2e/pages/checked-page';
import { invented } from '../../e2e/pages/demo-accounts';
import { EntryPage } from '../../e2e/pages/entry-page';
import { PanelDesk } from '../../e2e/pages/panel-desk';
import { framesWhile, inWords } from './frame-times';
import { firstCompany, largePanelFile, lastCompany, rows, unitSlips } from './large-panel';
import { scrollings } from './scrolling';
import { rowsShown } from './shown-progress';
import { countKept } from './workspace-rows';

test('a file of 200,000 rows comes in through the screen, and its grid scrolls', async ({
  page,
}) => {
  const before = await countKept();
  // The worker ends as soon as it has answered.
  const workers: string[] = [];
  page.on('worker', (worker) => workers.push(worker.url()));
  await new EntryPage(page).signUp(invented('Maive Orrund'), 'Orrund Works');
  const desk = new PanelDesk(page);
  const draft = await timed('sent and read', async () =>
    (await desk.openEmpty()).chooseFile(largePanelFile()),
  );
  await draft.giveMoney('EUR', 'millions');
  await draft.namePanel('Large');
  await timed('checked', () => draft.check());

  await test.step('cancelled in the middle, it leaves nothing', async () => {
    await draft.commit();
    const shown = await rowsShown(draft.progress, 1);
    await draft.cancelCommit();
    say(`Cancelled at ${inOrder(shown)} of ${rows} rows`);
    expect(shown.at(-1), 'rows written when it is cancelled').toBeLessThan(rows);
    expect(await countKept(), 'what lies in the database').toEqual(before);
    expect((await versions(page)).length, 'versions that the API lists').toBe(0);
  });

  await test.step('it comes in whole, with its progress in rows', async () => {
    const shown = await timed('brought in', async () => {
      await draft.commit();
      return rowsShown(draft.progress, rows);
    });
    say(`Rows written, as the page said: ${inOrder(shown)}`);
    expect(shown.filter((done) => done > 0).length, 'numbers of rows seen').toBeGreaterThan(1);
    expect(shown, 'rows in order').toEqual(shown.toSorted((one, other) => one - other));
    await timed('rows on the panel page', () => desk.rowAt(1).waitFor());
    await timed('page held to WCAG', () => desk.read());
    expect((await countKept()).rows - before.rows, 'rows in the database').toBe(rows);
    const [version] = await versions(page);
    expect(version.rows, 'rows of the version').toBe(rows);
    const reply = await timed('all rows through the API', () =>
      page.request.get(`/api/panel-versions/${version.id}`),
    );
    const { year } = PanelVersionReply.parse(await reply.json()).rows;
    expect(year.length, 'rows that the API gives').toBe(rows);
    await timed('all companies through the API', () =>
      page.request.get(`/api/panel-versions/${version.id}/companies`),
    );
  });

  await test.step('the flags are found, in a worker under the content policy of production', async () => {
    await timed('flags found', () => expect(desk.flags(/1,000/)).toContainText(String(unitSlips)));
    expect(workers, 'workers that the page started').toContainEqual(
      expect.stringMatching(/\/worker-\w+\.js$/),
    );
  });

  await test.step('the grid scrolls from top to bottom', async () => {
    await desk.rowsGrid.scrollIntoViewIfNeeded();
    await expect(desk.rowAt(1)).toContainText(firstCompany);
    for (const { name, scroll } of scrollings(rows))
      say(`${name}: ${inWords(await framesWhile(page, () => scroll(page, desk.rowsGrid)))}`);
    await expect(desk.rowAt(rows)).toContainText(lastCompany);
  });
});

async function versions(page: Page): Promise<PanelVersionsReply['versions']> {
  const reply = await page.request.get('/api/panel-versions');
  return PanelVersionsReply.parse(await reply.json()).versions;
}

async function timed<T>(what: string, work: () => Promise<T>): Promise<T> {
  const began = performance.now();
  const result = await work();
  say(`${what}: ${((performance.now() - began) / 1000).toFixed(1)} s`);
  return result;
}

function inOrder(counts: readonly number[]): string {
  return counts.map((count) => count.toLocaleString('en')).join(', ');
}

function say(line: string): void {
  process.stdout.write(`  ${line}\n`);
}
