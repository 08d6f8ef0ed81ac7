import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { FitResult } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { GapPath } from './gap-path';

const years = [
  { year: 2022, gap: 1100, peers: 13 },
  { year: 2023, gap: null, peers: 0 },
  { year: 2024, gap: -300, peers: 12 },
  { year: 2025, gap: 1250, peers: 13 },
] satisfies FitResult['gapPath'];
const standing = {
  company: 'Velmara',
  estimate: 700,
  standardError: 100,
  low: 500,
  high: 900,
  calibration: 8,
  cosines: 8,
  persistence: 0.5,
  ownPersistence: 0.4,
  rank: 2,
  rankSet: [1, 4],
} satisfies FitResult['standing'];

describe('gap path', () => {
  async function shown() {
    TestBed.inject(NumberFormat).panelUnit.set('millions');
    const fixture = TestBed.createComponent(GapPath);
    fixture.componentRef.setInput('text', { title: 'No drift', caption: 'EUR m', source: '' });
    fixture.componentRef.setInput('years', years);
    fixture.componentRef.setInput('standing', standing);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { fixture, chart, page: fixture.nativeElement as HTMLElement };
  }

  it('leaves a missing year out of the line and its points, and says n/a in the table', async () => {
    const { chart, page } = await shown();
    expect(await chart.points()).toEqual([
      '2022, gap to 13 peers 1,100',
      '2024, gap to 12 peers \u2212300',
      '2025, gap to 13 peers 1,250',
    ]);
    expect(page.querySelector('.own-line')?.getAttribute('d')?.match(/M/g)?.length).toBe(2);
    await chart.toggle();
    expect(await chart.table()).toEqual([
      ['2022', '1,100', '13'],
      ['2023', 'n/a', '0'],
      ['2024', '\u2212300', '12'],
      ['2025', '1,250', '13'],
    ]);
  });

  it('says the standing with its interval beside the path', async () => {
    const { page } = await shown();
    const words = [...page.querySelectorAll('svg text')].map((word) => word.textContent.trim());
    expect(words).toContain('standing 700 (500 to 900)');
    expect(page.querySelector('p.kv-visually-hidden')?.textContent).toContain(
      'Standing 700 (500 to 900).',
    );
  });

  it('tells which year was chosen, and shows the value of the one with the focus until Escape', async () => {
    const { fixture, chart, page } = await shown();
    const chosen: number[] = [];
    fixture.componentInstance.yearSelected.subscribe((year) => chosen.push(year));
    await chart.press(TestKey.RIGHT_ARROW);
    const asked = () => page.querySelector('text[data-screen-only]')?.textContent;
    expect(asked()).toContain('\u2212300');
    await chart.press(TestKey.ENTER);
    expect(chosen).toEqual([2024]);
    await chart.press(TestKey.ESCAPE);
    expect(asked()).toBeUndefined();
  });
});
