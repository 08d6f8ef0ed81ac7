import type { SeatsReply } from '@contract';
import { invoiceStatusText, planWords } from './plan-words';

const active: SeatsReply['plan'] = {
  status: 'active',
  interval: 'month',
  trialEndsAt: null,
  renewsAt: '2026-04-04T12:00:00.000Z',
  cancelsAt: null,
  hasPaymentMethod: true,
};
const trial: SeatsReply['plan'] = {
  ...active,
  status: 'trialing',
  trialEndsAt: '2026-03-18T12:00:00.000Z',
  hasPaymentMethod: false,
};

describe('a plan in words', () => {
  it('says until when a trial runs, and that it pauses without a payment method', () => {
    expect(planWords(trial)).toEqual({
      status: 'Trial until 18 Mar 2026',
      isCaution: true,
      sentences: [
        'No payment method is on file. Without one the plan pauses then, and nothing is charged.',
      ],
    });
  });

  it('says how a trial goes on when a payment method is there', () => {
    const words = planWords({ ...trial, hasPaymentMethod: true, interval: 'year' });
    expect(words.isCaution).toBeFalse();
    expect(words.sentences).toEqual(['Then paid yearly.']);
  });

  it('says when an active plan renews', () => {
    expect(planWords(active)).toEqual({
      status: 'Active',
      isCaution: false,
      sentences: ['Paid monthly.', 'Renews on 4 Apr 2026.'],
    });
  });

  it('says when a plan that was cancelled ends, and not that it renews', () => {
    const words = planWords({ ...active, renewsAt: null, cancelsAt: '2026-04-04T12:00:00.000Z' });
    expect(words.isCaution).toBeTrue();
    expect(words.sentences).toEqual(['Paid monthly.', 'The plan ends on 4 Apr 2026.']);
  });

  it('names what stopped, and passes on a status it does not know', () => {
    const status = (name: string) => planWords({ ...active, status: name }).status;
    expect(['paused', 'past_due', 'unpaid', 'canceled', 'resting'].map(status)).toEqual([
      'Paused',
      'Payment overdue',
      'Payment overdue',
      'Ended',
      'Status “resting”',
    ]);
  });

  it('names the state of an invoice', () => {
    expect(['paid', 'open', 'void', 'other'].map(invoiceStatusText)).toEqual([
      'paid',
      'to be paid',
      'withdrawn',
      'other',
    ]);
  });
});
