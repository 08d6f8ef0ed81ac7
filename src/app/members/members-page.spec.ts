import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient } from '@angular/common/http';
import {
  HttpTestingController,
  type TestRequest,
  provideHttpClientTesting,
} from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { Router, provideRouter } from '@angular/router';
import { type MembersReply, type Role, apiRoutes, problemType } from '@contract';
import { SessionStore } from '../api/session-store';
import { MembersPage } from './members-page';

const you = '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0001';
const other = '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0002';
const invitationId = '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0003';

const reply: MembersReply = {
  members: [
    {
      personId: you,
      name: 'Ilvo Brenn',
      email: 'ilvo@velmara.example',
      roles: ['analyst', 'billing_admin'],
      joinedAt: '2026-03-04T12:00:00.000Z',
      isYou: true,
    },
    {
      personId: other,
      name: 'Sera Quillon',
      email: 'sera@velmara.example',
      roles: ['cfo'],
      joinedAt: '2026-03-05T12:00:00.000Z',
      isYou: false,
    },
  ],
  invitations: [
    {
      id: invitationId,
      email: 'tomas@velmara.example',
      roles: ['reader'],
      createdAt: '2026-03-05T12:00:00.000Z',
      expiresAt: '2026-03-08T12:00:00.000Z',
      isExpired: false,
    },
  ],
};

describe('the Members page', () => {
  let fixture: ComponentFixture<MembersPage>;
  let http: HttpTestingController;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([]),
        { provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(MembersPage);
    await settled();
    await list(reply);
  });
  afterEach(async () => {
    for (const dialog of await root().getAllHarnesses(MatDialogHarness)) await dialog.close();
    http.verify();
  });

  function root() {
    return TestbedHarnessEnvironment.documentRootLoader(fixture);
  }

  /** An answer passes through promises before a signal shows it. */
  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  async function list(body: MembersReply): Promise<void> {
    expectCall('GET', apiRoutes.listMembers.path).flush(body);
    await settled();
  }

  function expectCall(method: string, url: string): TestRequest {
    return http.expectOne({ method, url });
  }

  async function press(text: string): Promise<void> {
    const button = await root().getHarness(MatButtonHarness.with({ text }));
    await button.click();
  }

  async function pressLink(label: string): Promise<void> {
    const button = page().querySelector<HTMLButtonElement>(`button[aria-label="${label}"]`);
    expect(button).withContext(label).not.toBeNull();
    button?.click();
    await settled();
  }

  async function tick(within: Element, role: string): Promise<void> {
    const label = [...within.querySelectorAll('label')].find((each) =>
      each.textContent.includes(role),
    );
    label?.querySelector('input')?.click();
    await settled();
  }

  function dialog(): Element {
    const found = document.querySelector('mat-dialog-container');
    if (found === null) throw new Error('expected an open dialog; found none');
    return found;
  }

  function conflict(detail: string) {
    return {
      type: problemType('conflict'),
      title: 'Something changed meanwhile',
      status: 409,
      detail,
    };
  }

  function takeSession(roles: Role[]): SessionStore {
    const session = TestBed.inject(SessionStore);
    session.accept({
      session: {
        person: { id: you, name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: other, name: 'Velmara finance' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    return session;
  }

  it('lists members with their roles in words, and open invitations', () => {
    expect(page().querySelector('h1')?.textContent).toBe('2 members, 1 invited');
    const rows = [...page().querySelectorAll('kv-member-table tbody tr')].map((row) =>
      row.textContent.replace(/\s+/g, ' '),
    );
    expect(rows[0]).toContain('Ilvo Brenn (you)');
    expect(rows[0]).toContain('Analyst, billing admin');
    expect(rows[1]).toContain('CFO');
    const invitation = page().querySelector('kv-invitation-table tbody tr')?.textContent;
    expect(invitation).toContain('tomas@velmara.example');
    expect(invitation).toContain('8 Mar 2026');
  });

  it('offers to remove others and not oneself', () => {
    expect(page().querySelector('button[aria-label="Remove Sera Quillon"]')).not.toBeNull();
    expect(page().querySelector('button[aria-label="Remove Ilvo Brenn"]')).toBeNull();
  });

  it('sends no invitation without an address and a role, and says what is missing', async () => {
    await press('Invite a member');
    await press('Make the link');
    const form = page().querySelector('kv-invite-form');
    expect(form?.textContent).toContain('Enter an e-mail address');
    expect(form?.textContent).toContain('Choose at least one role.');
  });

  it('shows the link of a new invitation once, until it is closed', async () => {
    await press('Invite a member');
    const email = await root().getHarness(MatInputHarness);
    await email.setValue(' nela@velmara.example ');
    await tick(page(), 'Reader');
    await press('Make the link');
    const call = expectCall('POST', apiRoutes.inviteMember.path);
    expect(call.request.body).toEqual({ email: 'nela@velmara.example', roles: ['reader'] });
    call.flush({ id: invitationId, token: 'w.secret', expiresAt: '2026-03-08T12:00:00.000Z' });
    await settled();
    await list(reply);

    const link = page().querySelector<HTMLInputElement>('kv-new-link input');
    expect(link?.value).toBe(`${location.origin}/join#w.secret`);
    expect(page().querySelector('kv-new-link')?.textContent).toContain('it cannot be shown again');
    expect(page().querySelector('kv-invite-form')).toBeNull();

    await press('Done');
    expect(page().querySelector('kv-new-link')).toBeNull();
    expect(document.activeElement?.textContent.trim()).toBe('Invite a member');
  });

  it('keeps the form with the server’s reason when an invitation is refused', async () => {
    await press('Invite a member');
    await (await root().getHarness(MatInputHarness)).setValue('sera@velmara.example');
    await tick(page(), 'Analyst');
    await press('Make the link');
    expectCall('POST', apiRoutes.inviteMember.path).flush(
      conflict('sera@velmara.example is a member already. Change the roles there.'),
      { status: 409, statusText: 'Conflict' },
    );
    await settled();
    expect(page().querySelector('kv-invite-form [role="alert"]')?.textContent).toContain(
      'is a member already',
    );
    expect(page().querySelector('kv-new-link')).toBeNull();
  });

  it('changes the roles of a member and reads the list again', async () => {
    await pressLink('Change roles of Sera Quillon');
    await tick(dialog(), 'Reader');
    await press('Save roles');
    const call = expectCall('PUT', `/api/members/${other}/roles`);
    expect(call.request.body).toEqual({ roles: ['cfo', 'reader'] });
    call.flush(null);
    await settled();
    await list({ ...reply, invitations: [] });
    await settled();
    expect(page().querySelector('h1')?.textContent).toBe('2 members');
    expect(await root().getAllHarnesses(MatDialogHarness)).toEqual([]);
  });

  it('keeps the dialog with the reason when the last billing admin would go', async () => {
    takeSession(['analyst', 'billing_admin']);
    await pressLink('Change roles of Ilvo Brenn');
    await tick(dialog(), 'Billing admin');
    expect(dialog().textContent).toContain('this page closes for you');
    await press('Save roles');
    expectCall('PUT', `/api/members/${you}/roles`).flush(
      conflict('The last billing admin stays. Give the role to somebody else first.'),
      { status: 409, statusText: 'Conflict' },
    );
    await settled();
    const notice = dialog().querySelector('[role="alert"]')?.textContent;
    expect(notice).toContain('The roles were not changed');
    expect(notice).toContain('The last billing admin stays.');
    expect(TestBed.inject(SessionStore).roles()).toContain('billing_admin');
  });

  it('leaves for one’s first page when one gives up the billing admin role', async () => {
    const session = takeSession(['analyst', 'billing_admin']);
    const navigate = spyOn(TestBed.inject(Router), 'navigateByUrl').and.resolveTo(true);
    await pressLink('Change roles of Ilvo Brenn');
    await tick(dialog(), 'Billing admin');
    await press('Save roles');
    expectCall('PUT', `/api/members/${you}/roles`).flush(null);
    await settled();
    expect(session.roles()).toEqual(['analyst']);
    expect(navigate).toHaveBeenCalledOnceWith('/panel');
  });

  it('removes a member only after asking', async () => {
    await pressLink('Remove Sera Quillon');
    expect(dialog().textContent).toContain('They are signed out at once');
    await press('Remove member');
    expectCall('DELETE', `/api/members/${other}`).flush(null);
    await settled();
    await list({ members: reply.members.slice(0, 1), invitations: [] });
    await settled();
    expect(document.activeElement).toBe(page().querySelector('h1'));
    expect(page().querySelector('h1')?.textContent).toBe('1 member');
    expect(page().textContent).toContain('No invitation is open.');
  });

  it('withdraws an invitation only after asking', async () => {
    await pressLink('Withdraw the invitation to tomas@velmara.example');
    await press('Withdraw invitation');
    expectCall('DELETE', `/api/members/invitations/${invitationId}`).flush(null);
    await settled();
    await list({ ...reply, invitations: [] });
    expect(page().textContent).toContain('No invitation is open.');
  });

  it('marks an invitation that has expired, and does not count it', async () => {
    const [invitation] = reply.invitations;
    await pressLink('Withdraw the invitation to tomas@velmara.example');
    await press('Withdraw invitation');
    expectCall('DELETE', `/api/members/invitations/${invitationId}`).flush(null);
    await settled();
    await list({ ...reply, invitations: [{ ...invitation, isExpired: true }] });
    expect(page().querySelector('kv-invitation-table')?.textContent).toContain('expired');
    expect(page().querySelector('h1')?.textContent).toBe('2 members');
  });
});
