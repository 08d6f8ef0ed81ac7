import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { PageContext } from '../ui/page-context';
import { EditionSheet } from './edition-sheet';
import { logEditionContent } from './testing/edition-content';

describe('an edition on a fit in logs with year effects and the year before', () => {
  let page: HTMLElement;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    TestBed.inject(PageContext).show({ currency: 'EUR', unit: 'millions' });
    const fixture = TestBed.createComponent(EditionSheet);
    fixture.componentRef.setInput('content', logEditionContent);
    await fixture.whenStable();
    page = fixture.nativeElement as HTMLElement;
  });

  function words(selector?: string): string {
    const element = selector === undefined ? page : page.querySelector(selector);
    return (element?.textContent ?? '').replace(/\s+/g, ' ').trim();
  }

  it('names the model, and gives the standing in percent', () => {
    expect(words('.facts')).toContain('34.0 % (12.0 to 60.0 %)');
    expect(words('.facts')).toContain(
      'in logs, year effects taken out, regressors of the year before',
    );
  });

  it('reads slopes as percent for percent', () => {
    expect(words('.evidence')).toContain('What 1 % more goes with');
    expect(words('.evidence')).toContain(
      '1 % more capex of the year before goes with 0.4200 (0.1000 to 0.7000) % of market value',
    );
  });

  it('has levels in logs and the gap in percent, neither under a unit of money', () => {
    const levels = words('kv-edition-levels');
    expect(levels).not.toContain('EUR');
    expect(levels).toContain('Company levels in logs');
    expect(levels).toContain('50.0 %');
  });

  it('says what its plans take for granted, names the mean and gives differences in percent', () => {
    const assumptions = words('kv-plan-assumptions');
    expect(assumptions).toContain('this year’s plan acts next year');
    expect(assumptions).toContain('that of FY2025, the last observed');
    expect(words('kv-plan-table')).toContain('Expected value, mean');
    expect(words('kv-plan-table')).toContain('+10.0 % (5.0 to 15.0 %)');
    expect(words()).not.toContain('NaN');
  });
});
