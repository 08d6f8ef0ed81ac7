import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { FitResultView } from './fit-result-view';
import { exampleLogFit, exampleLogResult } from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('a fit in logs with year effects, the year before and the bootstrap', () => {
  let page: HTMLElement;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    exampleNumbers().unit.set('billions');
    const fixture = TestBed.createComponent(FitResultView);
    fixture.componentRef.setInput('reply', exampleLogFit);
    fixture.componentRef.setInput('result', exampleLogResult);
    await fixture.whenStable();
    page = fixture.nativeElement as HTMLElement;
  });

  function words(element: Element | null): string {
    return (element?.textContent ?? '').replace(/\s+/g, ' ').trim();
  }

  function region(name: string): HTMLElement {
    const found = page.querySelector<HTMLElement>(`[role=region][aria-label="${name}"]`);
    if (found === null) throw new Error(`expected a region ${name} on the page; found none`);
    return found;
  }

  function cells(table: HTMLElement): string[][] {
    return [...table.querySelectorAll('tbody tr')].map((row) => [...row.children].map(words));
  }

  it('puts no figure under a unit of money', () => {
    expect(words(page)).not.toContain('EUR');
  });

  it('gives standing, drift and gap path in percent and levels in logs', () => {
    expect(words(page)).toContain('34.2 % (12.0 to 60.3 %)');
    expect(words(page)).toContain('Drift of the gap a year, percent');
    expect(words(page)).toContain('2.0 % (0.5 to 3.6 %)');
    expect(words(page.querySelector('kv-gap-path'))).toContain('49.2 %');
    expect(words(page)).toContain(
      'Company levels in logs, capex and book equity of the year before',
    );
  });

  it('has levels in logs and differences in percent in the table of companies', () => {
    const table = region('Companies, table');
    expect(words(table)).toContain('Levels in natural logs, differences in percent');
    const kesdrin = cells(table).find(([company]) => company === 'Kesdrin');
    expect(kesdrin?.slice(1, 5)).toEqual(['1.000', '0.500 to 1.500', '64.9 %', '22.1 to 122.6 %']);
  });

  it('leaves no gap where the bootstrap has no degrees of freedom and no upper end', () => {
    const table = region('Slopes, table');
    expect(words(table)).toContain('Percent of market value that go with 1 % more of each');
    expect(cells(table)[1]).toEqual([
      'book equity of the year before equity',
      '0.3000',
      '0.0500 and up',
      '0.2000',
      '1.500',
      'n/a',
      '0.040',
    ]);
  });

  it('lists year effects with their unit, and names the R² that both effects are taken out of', () => {
    const years = page.querySelector('kv-year-effects-table');
    expect(words(years?.querySelector('summary') ?? null)).toBe(
      'From −9.5 % in FY2010 to 10.5 % in FY2011, percent',
    );
    expect(cells(region('Year effects, table'))).toEqual([
      ['FY2010', '−9.5 %'],
      ['FY2011', '+10.5 %'],
    ]);
    const goodness = words(page.querySelector('kv-goodness-list'));
    expect(goodness).toContain('R² within, both effects taken out');
    expect(goodness).toContain('Residual standard error, natural logs0.2100');
  });

  it('says of which year a missing cell is', () => {
    expect(words(page.querySelector('kv-sample-notes'))).toContain(
      'Kesdrin FY2016: capex of the year before missing',
    );
  });
});
