import type { SeatsReply } from '../contract';
import type { SeatsView } from './billing-service';

export function toSeatsReply(view: SeatsView): SeatsReply {
  const { plan, nextInvoice } = view;
  return {
    plan: {
      status: plan.status,
      interval: plan.interval,
      trialEndsAt: plan.trialEndsAt?.toISOString() ?? null,
      renewsAt: plan.renewsAt?.toISOString() ?? null,
      cancelsAt: plan.cancelsAt?.toISOString() ?? null,
      hasPaymentMethod: plan.hasPaymentMethod,
    },
    seats: view.seats.map((seat) => ({ ...seat, interval: plan.interval })),
    nextInvoice:
      nextInvoice === null
        ? null
        : {
            dueAt: nextInvoice.dueAt.toISOString(),
            total: nextInvoice.total,
            lines: [...nextInvoice.lines],
          },
    invoices: view.invoices.map((invoice) => ({
      ...invoice,
      createdAt: invoice.createdAt.toISOString(),
    })),
    readAt: view.readAt.toISOString(),
  };
}
