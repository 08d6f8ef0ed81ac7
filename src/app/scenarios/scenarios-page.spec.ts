import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { ScenarioReply } from '@contract';
import { SessionStore } from '../api/session-store';
import { routes } from './scenarios.routes';
import {
  deskReply,
  fitId,
  fitReply,
  heldReading,
  sessionOf,
  storedYears,
} from './testing/scenario-replies';

@Component({
  selector: 'kv-elsewhere',
  template: 'elsewhere',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Elsewhere {}

const plan = [{ year: 2026, values: [110, 1000] }];
const stored: ScenarioReply = {
  id: '00000000-0000-4000-8000-000000000009',
  fitId,
  name: 'Build-out',
  note: '',
  version: 1,
  ...heldReading,
  plan,
  years: storedYears(plan),
  copiedFrom: null,
  createdBy: 'M. Oduya',
  updatedBy: 'M. Oduya',
  updatedAt: '2026-11-14T09:00:00.000Z',
};

describe('the page of a new plan', () => {
  let http: HttpTestingController;
  let harness: RouterTestingHarness;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([
          { path: 'scenarios', children: routes },
          { path: 'elsewhere', component: Elsewhere },
        ]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(SessionStore).accept(sessionOf('analyst'));
    harness = await RouterTestingHarness.create('/scenarios');
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    http.expectOne(`/api/fits/${fitId}/scenarios`).flush({ scenarios: [] });
    http.expectOne(`/api/fits/${fitId}/draft`).flush({ draft: null });
    await harness.fixture.whenStable();
  });

  async function saveAs(name: string): Promise<void> {
    const page = harness.routeNativeElement!;
    const box = page.querySelector<HTMLInputElement>('kv-scenario-name input')!;
    box.value = name;
    box.dispatchEvent(new Event('input'));
    const buttons = [...page.querySelectorAll('button')];
    buttons.find(({ textContent }) => textContent.trim() === 'Save scenario')!.click();
    await harness.fixture.whenStable();
  }

  /** Answers, and lets the page do what follows from it. */
  async function answerSave(): Promise<void> {
    http.expectOne('/api/scenarios').flush(stored);
    await new Promise((resolve) => setTimeout(resolve, 20));
    await harness.fixture.whenStable();
  }

  it('goes to the scenario once it is saved', async () => {
    await saveAs('Build-out');
    await answerSave();
    expect(TestBed.inject(Router).url).toBe(`/scenarios/${stored.id}`);
  });

  it('leaves the person where they have gone when the reply comes late', async () => {
    await saveAs('Build-out');
    await harness.navigateByUrl('/elsewhere', Elsewhere);
    await answerSave();
    expect(TestBed.inject(Router).url).toBe('/elsewhere');
  });
});
