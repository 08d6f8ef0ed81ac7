import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { type InvitationView, type SessionReply, problemType } from '@contract';
import { SessionStore } from '../api/session-store';
import { routes } from './account.routes';

const session: SessionReply = {
  session: {
    person: { id: id(1), name: 'Ena Torvald', email: 'ena@velmara.example' },
    workspace: { id: id(2), name: 'Velmara' },
    roles: ['cfo'],
    preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
  },
};

const invitation: InvitationView = {
  workspaceName: 'Velmara',
  email: 'ena@velmara.example',
  roles: ['cfo', 'reader'],
  expiresAt: '2026-03-04T12:00:00.000Z',
  hasAccount: false,
};

function id(last: number): string {
  return `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a000${last}`;
}

describe('signing in, signing up and joining', () => {
  let http: HttpTestingController;
  let harness: RouterTestingHarness;

  async function open(address: string): Promise<void> {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([...routes, { path: '**', children: [] }], withComponentInputBinding()),
      ],
    });
    TestBed.inject(SessionStore).accept({ session: null });
    http = TestBed.inject(HttpTestingController);
    harness = await RouterTestingHarness.create();
    await harness.navigateByUrl(address);
  }

  afterEach(() => {
    http.verify();
  });

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await harness.fixture.whenStable();
  }

  function page(): HTMLElement {
    return harness.fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  function type(selector: string, text: string): void {
    const input = page().querySelector<HTMLInputElement>(selector);
    if (input === null) throw new Error(`expected an input ${selector}; found none`);
    input.value = text;
    input.dispatchEvent(new Event('input'));
  }

  async function submit(): Promise<void> {
    page().querySelector<HTMLButtonElement>('button[type=submit]')?.click();
    await settled();
  }

  it('sends nothing while a field is wrong, says so beside it and above, and goes to it', async () => {
    await open('/sign-in');
    type('input[type=email]', 'ena');
    await submit();
    const errors = [...page().querySelectorAll('mat-error')].map((each) => each.textContent.trim());
    expect(errors).toEqual(['Expected an e-mail address', 'Expected your password']);
    expect(page().querySelector('[role=alert]')?.textContent).toContain(
      'E-mail address: expected an e-mail address',
    );
    expect(document.activeElement).toBe(page().querySelector('input[type=email]'));
  });

  it('lets password managers fill the fields', async () => {
    await open('/sign-in');
    const kinds = [...page().querySelectorAll('input')].map((each) => each.autocomplete);
    expect(kinds).toEqual(['username', 'current-password']);
  });

  for (const { next, leadsTo } of [
    { next: '/panel/7?row=17', leadsTo: '/panel/7?row=17' },
    { next: '//elsewhere.example', leadsTo: '/board' },
  ])
    it(`leads from next=${next} to ${leadsTo}`, async () => {
      await open(`/sign-in?next=${encodeURIComponent(next)}`);
      type('input[type=email]', 'ena@velmara.example');
      type('input[type=password]', 'a long enough password');
      await submit();
      http.expectOne({ method: 'POST', url: '/api/session' }).flush(session);
      await settled();
      expect(TestBed.inject(Router).url).toBe(leadsTo);
      expect(TestBed.inject(SessionStore).person()?.name).toBe('Ena Torvald');
    });

  it('says of wrong credentials in both places, and keeps what was typed', async () => {
    await open('/sign-in');
    type('input[type=email]', 'ena@velmara.example');
    type('input[type=password]', 'not the password');
    await submit();
    http.expectOne('/api/session').flush(
      {
        type: problemType('wrong-credentials'),
        title: 'E-mail address or password is wrong',
        status: 401,
        detail: 'No account has this e-mail address and password together.',
        instance: 'request-1',
      },
      { status: 401, statusText: 'Unauthorized' },
    );
    await settled();
    expect(page().querySelector('mat-error')?.textContent).toContain('Does not go with this');
    expect(page().querySelector('[role=alert]')?.textContent).toContain('No account has');
    expect(words()).not.toContain('request-1');
    expect(page().querySelector<HTMLInputElement>('input[type=password]')?.value).toBe(
      'not the password',
    );
  });

  it('creates a workspace, and puts what the server finds beside the field', async () => {
    await open('/sign-up');
    type('input[name=organization]', 'Velmara');
    type('input[name=name]', 'Ena Torvald');
    type('input[type=email]', 'ena@velmara.example');
    type('input[type=password]', 'short');
    await submit();
    expect(page().querySelector('mat-error')?.textContent).toContain(
      'Expected at least 12 characters; found 5',
    );
    type('input[type=password]', 'a long enough password');
    await submit();
    http.expectOne({ method: 'POST', url: '/api/accounts' }).flush(
      {
        type: problemType('bad-request'),
        title: 'The request is not as expected',
        status: 400,
        errors: [{ pointer: '/workspaceName', detail: 'expected one line' }],
      },
      { status: 400, statusText: 'Bad Request' },
    );
    await settled();
    expect(page().querySelector('mat-error')?.textContent).toContain('Expected one line');
  });

  it('sends a link’s secret in a body only, and takes it out of the address', async () => {
    await open('/join#a-secret');
    const asked = http.expectOne('/api/invitations/view');
    expect(asked.request.urlWithParams).toBe('/api/invitations/view');
    expect(asked.request.body).toEqual({ token: 'a-secret' });
    expect(location.href).not.toContain('a-secret');
    asked.flush(invitation);
    await settled();
    expect(words()).toContain('Join Velmara');
    expect(words()).toContain('CFO: you read the whole model');
    type('input[name=name]', 'Ena Torvald');
    type('input[type=password]', 'a long enough password');
    await submit();
    const joined = http.expectOne('/api/invitations/accept');
    expect(joined.request.body).toEqual({
      token: 'a-secret',
      name: 'Ena Torvald',
      password: 'a long enough password',
    });
    joined.flush(session);
    await settled();
    expect(TestBed.inject(Router).url).toBe('/board');
  });

  it('asks an existing account for its password alone', async () => {
    await open('/join#a-secret');
    http.expectOne('/api/invitations/view').flush({ ...invitation, hasAccount: true });
    await settled();
    expect(page().querySelector('input[name=name]')).toBeNull();
    type('input[type=password]', 'a long enough password');
    await submit();
    expect(http.expectOne('/api/invitations/accept').request.body).toEqual({
      token: 'a-secret',
      password: 'a long enough password',
    });
  });

  it('says plainly that a used or expired link opens nothing', async () => {
    await open('/join#a-secret');
    http
      .expectOne('/api/invitations/view')
      .flush(
        { type: problemType('gone'), title: 'No longer valid', status: 410 },
        { status: 410, statusText: 'Gone' },
      );
    await settled();
    expect(page().querySelector('h1')?.textContent).toBe('This link opens nothing any more');
    expect(page().querySelector('form')).toBeNull();
  });

  it('says that the end of the link is missing', async () => {
    await open('/join');
    await settled();
    expect(page().querySelector('h1')?.textContent).toBe('Open your link again');
  });
});
