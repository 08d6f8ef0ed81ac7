import * as z from 'zod';

const money = z.object({
  /** Integer minor units of the currency. */
  amount: z.number().int(),
  /** ISO 4217, upper case. */
  currency: z.string(),
});

const seatKind = z.object({
  kind: z.enum(['analyst', 'reading']),
  bought: z.number().int(),
  used: z.number().int(),
  /** Taken by open invitations. */
  invited: z.number().int(),
  free: z.number().int(),
  unitPrice: money,
  interval: z.enum(['month', 'year']),
});

/** What the Seats page shows, read from the payment provider. */
export const SeatsReply = z.object({
  plan: z.object({
    /** The subscription's status as the provider names it. */
    status: z.string(),
    interval: z.enum(['month', 'year']),
    trialEndsAt: z.iso.datetime().nullable(),
    renewsAt: z.iso.datetime().nullable(),
    cancelsAt: z.iso.datetime().nullable(),
  }),
  seats: z.array(seatKind),
  nextInvoice: z
    .object({
      dueAt: z.iso.datetime(),
      total: money,
      lines: z.array(z.object({ description: z.string(), amount: money })),
    })
    .nullable(),
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
