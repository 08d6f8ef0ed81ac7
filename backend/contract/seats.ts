import * as z from 'zod';

const money = z.object({
  /** Integer minor units of the currency. */
  amount: z.number().int(),
  /** ISO 4217, upper case. */
  currency: z.string(),
});

const interval = z.enum(['month', 'year']);

const seatKind = z.object({
  /** `analyst` for whoever holds the analyst role; `reading` for a CFO or reader who does not. */
  kind: z.enum(['analyst', 'reading']),
  bought: z.number().int(),
  used: z.number().int(),
  /** Taken by invitations that are open and not expired. */
  invited: z.number().int(),
  free: z.number().int(),
  /** For one seat and interval; null where the subscription holds no seats of this kind. */
  unitPrice: money.nullable(),
  interval,
});

/** What the Seats page shows, read from the payment provider. */
export const SeatsReply = z.object({
  plan: z.object({
    /** The subscription's status as the provider names it. */
    status: z.string(),
    interval,
    /** Null unless a trial is running. */
    trialEndsAt: z.iso.datetime().nullable(),
    /** When the next period begins; null for a plan that will not renew. */
    renewsAt: z.iso.datetime().nullable(),
    cancelsAt: z.iso.datetime().nullable(),
    /** Without one the plan pauses when its trial ends, and nothing is charged. */
    hasPaymentMethod: z.boolean(),
  }),
  seats: z.array(seatKind),
  /** Null when the provider expects no further invoice. */
  nextInvoice: z
    .object({
      dueAt: z.iso.datetime(),
      total: money,
      lines: z.array(z.object({ description: z.string(), amount: money })),
    })
    .nullable(),
  /** The newest 24, newest first. */
  invoices: z.array(
    z.object({
      id: z.string(),
      number: z.string().nullable(),
      status: z.string(),
      createdAt: z.iso.datetime(),
      total: money,
    }),
  ),
  readAt: z.iso.datetime(),
});
export type SeatsReply = z.infer<typeof SeatsReply>;
