import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { shortCaution } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { panelCompany } from '../testing/panel-company';
import { PeerTable } from './peer-table';

describe('the table of peers', () => {
  let fixture: ComponentFixture<PeerTable>;

  async function shown(without: object | null): Promise<string> {
    const numbers = TestBed.inject(NumberFormat);
    numbers.unit.set('millions');
    numbers.currency.set('EUR');
    fixture = TestBed.createComponent(PeerTable);
    const company = panelCompany('Kesdrin');
    const row = { company, reason: 'Same customers', nearness: null, whyNone: '' };
    const inputs = { rows: [row], side: 'in', own: null, measures: [], without };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    return (fixture.nativeElement as HTMLElement).textContent.replace(/\s+/g, ' ');
  }

  it('says what the figures are not wherever it shows a standing, and nowhere else', async () => {
    const standing = { estimate: 1811e6, low: 1172e6, high: 2450e6 };
    const text = await shown({ fitName: '6f3a91', kind: 'money', standing });
    expect(text).toContain('1,811 (1,172 to 2,450) EUR m by fit 6f3a91');
    expect(text).toContain('Standing without it, EUR m');
    expect(text).toContain('the estimate alone, with no interval of its own');
    expect(text).toContain(shortCaution);
    expect(await shown(null)).not.toContain(shortCaution);
  });
});
