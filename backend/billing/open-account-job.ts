import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { BillingService } from './billing-service';

/** Works the queue `open-billing-account`; a rejection has the queue try again. */
export function workOpenBillingAccount(
  billing: BillingService,
): (ticket: JobTicketRow) => Promise<void> {
  return (ticket) => billing.openAccount(ticket.workspaceId);
}
