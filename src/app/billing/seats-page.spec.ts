import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type SeatsReply, apiRoutes, problemType } from '@contract';
import { SeatsPage } from './seats-page';

const eur = (amount: number) => ({ amount, currency: 'EUR' });

const reply: SeatsReply = {
  plan: {
    status: 'trialing',
    interval: 'month',
    trialEndsAt: '2026-03-18T12:00:00.000Z',
    renewsAt: '2026-03-18T12:00:00.000Z',
    cancelsAt: null,
    hasPaymentMethod: false,
  },
  seats: [
    {
      kind: 'analyst',
      bought: 3,
      used: 1,
      invited: 1,
      free: 1,
      unitPrice: eur(8_900),
      interval: 'month',
    },
    {
      kind: 'reading',
      bought: 5,
      used: 2,
      invited: 0,
      free: 3,
      unitPrice: eur(1_900),
      interval: 'month',
    },
  ],
  nextInvoice: {
    dueAt: '2026-03-18T13:00:00.000Z',
    total: eur(36_200),
    lines: [
      { description: '3 × Analyst seat', amount: eur(26_700) },
      { description: '5 × Reading seat', amount: eur(9_500) },
    ],
  },
  invoices: [
    {
      id: 'in_1',
      number: 'K-0001',
      status: 'paid',
      createdAt: '2026-03-04T12:00:00.000Z',
      total: eur(0),
    },
  ],
  readAt: '2026-03-05T09:30:00.000Z',
};

describe('the Seats page', () => {
  let fixture: ComponentFixture<SeatsPage>;
  let http: HttpTestingController;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(SeatsPage);
    await settled();
  });
  afterEach(() => {
    http.verify();
  });

  async function answer(body: SeatsReply): Promise<void> {
    http.expectOne(apiRoutes.readSeats.path).flush(body);
    await settled();
  }

  /** An answer passes through promises before a signal shows it. */
  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  /** The cells of each row of a section's table, heads among them. */
  function table(label: string): string[][] {
    const region = page().querySelector(`[aria-label="${label}, table"]`);
    return [...(region?.querySelectorAll('tr') ?? [])].map((row) =>
      [...row.children].map((cell) => cell.textContent.trim()),
    );
  }

  it('opens with what is used, held and free, by kind and in all', async () => {
    await answer(reply);
    expect(page().querySelector('h1')?.textContent).toBe(
      '3 of 8 seats are used, 1 is held by an invitation, 4 are free',
    );
    expect(table('Seats by kind')).toEqual([
      ['Seats', 'Bought', 'Used', 'Invited', 'Free', 'One a month'],
      ['Analyst', '3', '1', '1', '1', '€89.00'],
      ['Reading', '5', '2', '–', '3', '€19.00'],
      ['All', '8', '3', '1', '4', ''],
    ]);
  });

  it('says until when the trial runs and what the next invoice would be', async () => {
    await answer(reply);
    expect(page().querySelector('kv-plan-status')?.textContent).toContain(
      'Trial until 18 Mar 2026',
    );
    expect(page().querySelector('kv-next-invoice p')?.textContent.trim()).toBe(
      '18 Mar 2026, as things stand and if a payment method is on file by then',
    );
    expect(table('Next invoice')).toEqual([
      ['For', 'Amount'],
      ['3 × Analyst seat', '€267.00'],
      ['5 × Reading seat', '€95.00'],
      ['Total', '€362.00'],
    ]);
    expect(table('Invoices')).toEqual([
      ['Number', 'Date', 'State', 'Total'],
      ['K-0001', '4 Mar 2026', 'paid', '€0.00'],
    ]);
  });

  it('says so where there is no further invoice and none before', async () => {
    await answer({
      ...reply,
      plan: { ...reply.plan, status: 'paused', trialEndsAt: null, renewsAt: null },
      nextInvoice: null,
      invoices: [],
    });
    expect(page().querySelector('kv-plan-status')?.textContent).toContain('Paused');
    expect(page().textContent).toContain('The payment provider expects no further invoice.');
    expect(page().textContent).toContain('There is no invoice yet.');
  });

  it('points out a kind of which more is taken than bought', async () => {
    const [analyst, reading] = reply.seats;
    await answer({ ...reply, seats: [{ ...analyst, used: 5, invited: 0, free: 0 }, reading] });
    expect(page().querySelector('kv-seat-table')?.textContent).toContain(
      '2 more analyst seats are taken than bought.',
    );
  });

  it('shows why billing cannot be read, and reads again on request', async () => {
    http.expectOne(apiRoutes.readSeats.path).flush(
      {
        type: problemType('billing-unavailable'),
        title: 'Billing cannot be reached just now',
        status: 503,
        detail: 'Billing is being set up. Try again in a moment.',
      },
      { status: 503, statusText: 'Service Unavailable' },
    );
    await settled();
    const notice = page().querySelector('[role="alert"]');
    expect(notice?.textContent).toContain('Billing is being set up. Try again in a moment.');

    notice?.querySelector('button')?.click();
    await settled();
    expect(page().querySelector('[role="status"]')?.textContent).toContain('Reading seats');
    await answer(reply);
    expect(page().querySelector('[role="alert"]')).toBeNull();
  });

  it('offers no button that would do nothing', async () => {
    await answer(reply);
    expect(page().querySelectorAll('button').length).toBe(0);
    expect(page().querySelector('a')?.getAttribute('href')).toBe('/members');
  });
});
