import express, { type Router } from 'express';
import { apiRoutes } from '../contract';
import { signedInMember } from '../http/member';
import { register } from '../http/register';
import type { BillingService } from './billing-service';
import { toSeatsReply } from './seat-replies';

/** Seats and what they cost, for billing admins. */
export function seatRoutes(billing: BillingService): Router {
  const router = express.Router();

  register(router, apiRoutes.readSeats, async (req, res) => {
    res.json(toSeatsReply(await billing.seats(signedInMember(req).workspaceId)));
  });

  return router;
}
