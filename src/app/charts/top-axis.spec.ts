import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { TopAxis } from './top-axis';

@Component({
  selector: 'kv-drawn',
  imports: [TopAxis],
  template: `<svg><g kvTopAxis [chart]="chart()" [lines]="lines()" /></svg>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Drawn {
  readonly chart = signal<ReturnType<TopAxis['chart']>>({
    plot: { top: 28, bottom: 100 },
    ticks: [
      { value: 0, position: 50, label: '0' },
      { value: 10, position: 90, label: '10' },
    ],
    zeroX: 50,
  });
  readonly lines = signal<'grid' | 'hairline'>('grid');
}

describe('the axis above rows', () => {
  function drawn() {
    const fixture = TestBed.createComponent(Drawn);
    fixture.detectChanges();
    const page = fixture.nativeElement as HTMLElement;
    const linesOf = (kind: string) =>
      [...page.querySelectorAll(`line.${kind}`)].map((line) =>
        ['x1', 'x2', 'y1', 'y2'].map((name) => Number(line.getAttribute(name))),
      );
    return { fixture, page, linesOf };
  }

  it('writes each mark above its line, from just above the rows to their end', () => {
    const { page, linesOf } = drawn();
    const words = [...page.querySelectorAll('text')];
    expect(words.map((word) => [word.textContent?.trim(), word.getAttribute('x')])).toEqual([
      ['0', '50'],
      ['10', '90'],
    ]);
    expect(linesOf('grid')).toEqual([
      [50, 50, 24, 100],
      [90, 90, 24, 100],
    ]);
    expect(getComputedStyle(page.querySelector('line.grid')!).strokeDasharray).toBe('1px, 4px');
  });

  it('draws zero where it is in sight alone', () => {
    const { fixture, linesOf } = drawn();
    expect(linesOf('zero')).toEqual([[50, 50, 24, 100]]);
    fixture.componentInstance.chart.update((chart) => ({ ...chart, zeroX: null }));
    fixture.detectChanges();
    expect(linesOf('zero')).toEqual([]);
  });

  it('draws its lines whole where a chart wants hairlines', () => {
    const { fixture, page, linesOf } = drawn();
    fixture.componentInstance.lines.set('hairline');
    fixture.detectChanges();
    expect(linesOf('hairline').length).toBe(2);
    expect(getComputedStyle(page.querySelector('line.hairline')!).strokeDasharray).toBe('none');
  });
});
