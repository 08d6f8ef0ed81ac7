import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { TableScroll } from './table-scroll';

@Component({
  selector: 'kv-spec-table',
  imports: [TableScroll],
  template: `
    <div kvTableScroll [style]="{ width: '200px', overflow: 'auto' }">
      <table [style.width.px]="width()">
        <tbody>
          <tr>
            <td>1</td>
          </tr>
        </tbody>
      </table>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class SpecTable {
  readonly width = signal(600);
}

describe('the region of a wide table', () => {
  it('says on which sides the table goes on', async () => {
    const fixture = TestBed.createComponent(SpecTable);
    const region = (fixture.nativeElement as HTMLElement).querySelector('div')!;
    const isSaid = async (sides: string | null): Promise<string | null> => {
      for (let turn = 0; turn < 50 && region.getAttribute('data-more') !== sides; turn += 1) {
        await new Promise((resolve) => setTimeout(resolve, 10));
        await fixture.whenStable();
      }
      return region.getAttribute('data-more');
    };
    expect(await isSaid('end')).toBe('end');
    region.scrollLeft = 200;
    expect(await isSaid('start end')).toBe('start end');
    region.scrollLeft = 400;
    expect(await isSaid('start')).toBe('start');
    fixture.componentInstance.width.set(200);
    expect(await isSaid(null)).toBeNull();
  });
});
