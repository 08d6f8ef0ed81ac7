import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { Role, SessionReply } from '@contract';
import { pageOpen, signedIn, toLanding } from './session-guards';

@Component({
  selector: 'kv-spec-page',
  template: 'page',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class SpecPage {}

function sessionWith(...roles: Role[]): SessionReply {
  return {
    session: {
      person: {
        id: '0198a1f0-0000-7000-8000-000000000001',
        name: 'Mira Oduya',
        email: 'mira@velmara.example',
      },
      workspace: { id: '0198a1f0-0000-7000-8000-000000000002', name: 'Velmara Cold Chain' },
      roles,
      preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
    },
  };
}

describe('session guards', () => {
  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([
          { path: '', pathMatch: 'full', canActivate: [signedIn, toLanding], children: [] },
          { path: 'fit', canActivate: [signedIn, pageOpen('fit')], component: SpecPage },
          { path: '**', component: SpecPage },
        ]),
      ],
    });
  });

  async function visit(
    address: string,
    answer: SessionReply | 'down',
  ): Promise<{ address: string; shown: string }> {
    const harness = await RouterTestingHarness.create();
    const router = TestBed.inject(Router);
    const visited = harness.navigateByUrl(address);
    await new Promise((resolve) => setTimeout(resolve));
    const call = TestBed.inject(HttpTestingController).expectOne('/api/session');
    if (answer === 'down') call.error(new ProgressEvent('error'));
    else call.flush(answer);
    await visited;
    const { finalUrl } = router.lastSuccessfulNavigation() ?? {};
    return { address: router.url, shown: finalUrl?.toString() ?? '' };
  }

  it('leads to signing in, and keeps the address that was wanted', async () => {
    const { address } = await visit('/fit?a=1', { session: null });
    expect(address).toBe('/sign-in?next=%2Ffit%3Fa%3D1');
  });

  it('opens a page to the roles of the access table', async () => {
    expect((await visit('/fit', sessionWith('cfo'))).address).toBe('/fit');
  });

  it('says under the same address that a page is not open to other roles', async () => {
    const { shown } = await visit('/fit', sessionWith('billing_admin'));
    expect(shown).toBe('/not-open');
  });

  it('starts each role on its own page', async () => {
    expect((await visit('/', sessionWith('reader'))).address).toBe('/board');
  });

  it('says that the server gave no answer', async () => {
    expect((await visit('/fit', 'down')).shown).toBe('/unreachable');
  });
});
