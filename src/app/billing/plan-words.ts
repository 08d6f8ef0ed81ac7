import { formatDate } from '@angular/common';
import type { SeatsReply } from '@contract';

type Plan = SeatsReply['plan'];

/** A plan's status in words, and what comes next. */
export interface PlanWords {
  readonly status: string;
  /** Whether somebody should act. */
  readonly isCaution: boolean;
  readonly sentences: readonly string[];
}

const paid: Readonly<Record<Plan['interval'], string>> = {
  month: 'Paid monthly.',
  year: 'Paid yearly.',
};

const noMethod = 'No payment method is on file.';

export function planWords(plan: Plan): PlanWords {
  const ends = plan.cancelsAt === null ? [] : [`The plan ends on ${dateText(plan.cancelsAt)}.`];
  switch (plan.status) {
    case 'trialing':
      return trialWords(plan, ends);
    case 'active':
      return {
        status: 'Active',
        isCaution: plan.cancelsAt !== null,
        sentences: [paid[plan.interval], ...ends, ...renewal(plan)],
      };
    case 'paused':
      return {
        status: 'Paused',
        isCaution: true,
        sentences: ['The trial ended without a payment method. Nothing is charged.'],
      };
    case 'past_due':
    case 'unpaid':
      return {
        status: 'Payment overdue',
        isCaution: true,
        sentences: ['An invoice could not be collected.', ...ends],
      };
    case 'incomplete':
      return {
        status: 'Payment not complete',
        isCaution: true,
        sentences: ['The first payment has not gone through yet.'],
      };
    case 'canceled':
    case 'incomplete_expired':
      return { status: 'Ended', isCaution: true, sentences: ['No further invoice will come.'] };
    default:
      return { status: `Status “${plan.status}”`, isCaution: true, sentences: ends };
  }
}

function trialWords(plan: Plan, ends: readonly string[]): PlanWords {
  const status = plan.trialEndsAt === null ? 'Trial' : `Trial until ${dateText(plan.trialEndsAt)}`;
  if (plan.cancelsAt !== null) return { status, isCaution: true, sentences: ends };
  if (!plan.hasPaymentMethod)
    return {
      status,
      isCaution: true,
      sentences: [`${noMethod} Without one the plan pauses then, and nothing is charged.`],
    };
  return { status, isCaution: false, sentences: [`Then ${paid[plan.interval].toLowerCase()}`] };
}

function renewal(plan: Plan): readonly string[] {
  if (plan.renewsAt === null) return [];
  const renews = `Renews on ${dateText(plan.renewsAt)}.`;
  return plan.hasPaymentMethod ? [renews] : [renews, noMethod];
}

function dateText(iso: string): string {
  return formatDate(iso, 'd MMM y', 'en-US');
}

const invoiceStatuses: Readonly<Record<string, string>> = {
  draft: 'draft',
  open: 'to be paid',
  paid: 'paid',
  uncollectible: 'not collected',
  void: 'withdrawn',
};

export function invoiceStatusText(status: string): string {
  return invoiceStatuses[status] ?? status;
}
