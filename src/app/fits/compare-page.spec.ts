import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { FitReply } from '@contract';
import { ComparePage } from './compare-page';
import {
  exampleFit,
  exampleLogFit,
  examplePanelVersion,
  exampleResult,
} from './testing/example-fit';

describe('two fits on one page', () => {
  let fixture: ComponentFixture<ComparePage>;
  let http: HttpTestingController;
  const other: FitReply = {
    ...exampleFit,
    fit: { ...exampleFit.fit, id: 'b', hash: '2c85db00' },
    panelVersion: { ...examplePanelVersion, unit: 'thousands' },
    result: {
      ...exampleResult,
      members: [...exampleResult.members, 'Zethorin'],
      slopes: [exampleResult.slopes[0]],
    },
  };

  async function open(a: string, b: string | undefined): Promise<void> {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(ComparePage);
    fixture.componentRef.setInput('a', a);
    fixture.componentRef.setInput('b', b);
    await settled();
  }

  async function settled(): Promise<void> {
    fixture.detectChanges();
    await new Promise((resolve) => setTimeout(resolve));
    fixture.detectChanges();
  }

  async function answer(second: FitReply): Promise<void> {
    http.expectOne('/api/fits/a').flush(exampleFit);
    http.expectOne('/api/fits/b').flush(second);
    await settled();
  }

  function words(): string {
    return ((fixture.nativeElement as HTMLElement).textContent ?? '').replace(/\s+/g, ' ');
  }

  function cells(label: string): string[] {
    const rows = [...(fixture.nativeElement as HTMLElement).querySelectorAll('tr')];
    const row = rows.find((each) => each.querySelector('th')?.textContent?.trim() === label);
    return [...(row?.querySelectorAll('td') ?? [])].map((cell) =>
      (cell.textContent ?? '').replace(/\s+/g, ' ').trim(),
    );
  }

  it('brings both onto the unit of the first, and shows a slope only one has', async () => {
    await open('a', 'b');
    await answer({ ...other, fit: { ...other.fit, id: exampleFit.fit.id } });
    expect(cells('Standing, EUR m')).toEqual(['1,811 (1,172 to 2,450)', '1.811 (1.172 to 2.450)']);
    expect(cells('Slope of book equity')).toEqual(['−0.5080 (−1.2000 to 0.1840)', 'n/a']);
    expect(cells('Regressors')).toEqual(['capex and book equity', 'capex', 'differs']);
    expect(words()).toMatch(/Only in 2c85db\s*Zethorin/);
    http.verify();
  });

  it('draws no scale for an amount and a percentage, and writes each in its own unit', async () => {
    await open('a', 'b');
    await answer(exampleLogFit);
    expect(words()).toContain('a percentage and an amount are not comparable');
    expect((fixture.nativeElement as HTMLElement).querySelector('kv-fit-comparison')).toBeNull();
    expect(cells('Standing, EUR m beside percent')).toEqual([
      '1,811 (1,172 to 2,450)',
      '34.2 % (12.0 to 60.3 %)',
    ]);
    expect(cells('Slope of book equity, amount for 1 beside percent for 1 %')).toEqual([
      '−0.5080 (−1.2000 to 0.1840)',
      '0.3000 (0.0500 and up)',
    ]);
    expect(cells('Residual standard error, EUR m beside natural logs')).toEqual([
      '325.2',
      '0.2100',
    ]);
    expect(words()).toContain('R² within, each fit’s own effects taken out');
  });

  it('asks for two fits with results', async () => {
    await open('a', undefined);
    expect(words()).toContain('Two fits with results are needed');
    http.verify();
  });

  it('does not compare a fit that has no result', async () => {
    await open('a', 'b');
    await answer({ ...exampleFit, result: null });
    expect(words()).toContain('Two fits with results are needed');
  });
});
