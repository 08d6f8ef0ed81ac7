import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, DeferBlockBehavior, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Bootstrap, EvidenceReply } from '@contract';
import { exampleFit } from '../testing/example-fit';
import { exampleNumbers } from '../testing/example-numbers';
import { EvidenceSection } from './evidence-section';
import { EvidenceStore } from './evidence-store';
import { exampleEvidence, judgedResult } from './testing/example-evidence';

describe('the evidence whose bootstrap can no longer be followed', () => {
  let fixture: ComponentFixture<EvidenceSection>;
  let http: HttpTestingController;
  const address = `/api/fits/${exampleFit.fit.id}/evidence`;
  const running: Bootstrap = { seed: 1, state: 'running', progress: null, failure: null };
  const ready = (bootstrap: Bootstrap): EvidenceReply => ({
    state: 'ready',
    evidence: exampleEvidence,
    bootstrap,
  });

  beforeEach(() => {
    TestBed.configureTestingModule({
      deferBlockBehavior: DeferBlockBehavior.Manual,
      providers: [
        EvidenceStore,
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([]),
      ],
    });
    exampleNumbers();
    jasmine.clock().install();
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(EvidenceSection);
    fixture.componentRef.setInput('reply', exampleFit);
    fixture.componentRef.setInput('result', judgedResult);
    TestBed.inject(EvidenceStore).show(exampleFit.fit.id);
  });

  afterEach(() => {
    fixture.destroy();
    jasmine.clock().uninstall();
    http.verify();
  });

  async function pass(ms: number): Promise<void> {
    jasmine.clock().tick(ms);
    for (let turn = 0; turn < 5; turn += 1) await Promise.resolve();
    fixture.detectChanges();
  }

  const alerts = (): HTMLElement[] => [
    ...(fixture.nativeElement as HTMLElement).querySelectorAll<HTMLElement>('[role="alert"]'),
  ];
  const verdict = (): string | undefined =>
    (fixture.nativeElement as HTMLElement)
      .querySelector('kv-verdict-summary')
      ?.textContent?.replace(/\s+/g, ' ');

  it('keeps its place, says what broke, and goes on when that is tried again', async () => {
    await pass(0);
    http.expectOne(address).flush(ready(running));
    await pass(400);
    expect(alerts()).toEqual([]);
    http
      .expectOne(`${address}/state`)
      .flush({ title: 'Broken' }, { status: 500, statusText: 'Broken' });
    await pass(0);
    expect(verdict()).toContain(exampleEvidence.verdict.sentence);
    expect(alerts().length).toBe(1);
    const retry = [...alerts()[0].querySelectorAll('button')].find(
      (each) => each.textContent?.trim() === 'Try again',
    );
    retry?.click();
    await pass(0);
    expect(alerts()).toEqual([]);
    http.expectOne(address).flush(ready({ ...running, state: 'done' }));
    await pass(0);
    expect(verdict()).toContain(exampleEvidence.verdict.sentence);
    expect(TestBed.inject(EvidenceStore).view()).toEqual({
      kind: 'ready',
      evidence: exampleEvidence,
      bootstrap: { ...running, state: 'done' },
    });
  });
});
