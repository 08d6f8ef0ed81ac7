import type { Page } from '@playwright/test';

/** Milliseconds from a pointer's move to the frame that shows it, one a move that changed the plan. */
export async function sliderRedraws(page: Page, label: string, moves: number): Promise<number[]> {
  await page.evaluate(watchRedraws);
  const slider = page.getByRole('slider', { name: label, exact: true });
  await slider.scrollIntoViewIfNeeded();
  const box = await slider.boundingBox();
  if (box === null) throw new Error(`expected a slider ${label} on the page; found none`);
  const middle = box.y + box.height / 2;
  await page.mouse.move(box.x + box.width * 0.2, middle);
  await page.mouse.down();
  for (let move = 1; move <= moves; move += 1) {
    const share = 0.2 + 0.6 * Math.abs((((2 * move) / moves) % 2) - 1);
    await page.mouse.move(box.x + box.width * share, middle);
    await page.waitForTimeout(25);
  }
  await page.mouse.up();
  return page.evaluate<number[]>('window.redraws');
}

/** Runs in the page: the pointer's own time stamp, then the first task after the frame that follows. */
const watchRedraws = `(() => {
  window.redraws = [];
  let movedAt = 0;
  const note = (event) => { movedAt = event.timeStamp; };
  document.addEventListener('pointermove', note, true);
  document.addEventListener('input', () => {
    const began = movedAt;
    requestAnimationFrame(() => {
      const channel = new MessageChannel();
      channel.port1.onmessage = () => window.redraws.push(performance.now() - began);
      channel.port2.postMessage(null);
    });
  }, true);
})()`;
