import express, { type Router } from 'express';
import { type ApiRoute, mayCall } from '../contract';
import { findMember } from './member';

/**
 * Lets the body of one route be larger than that of the others, for those who may call it; stands before the parser of
 * all bodies, which leaves a parsed one alone.
 */
export function largeBody(route: ApiRoute, limit: string): Router {
  const read = express.json({ limit });
  const router = express.Router();
  router.use(route.path, (req, res, next) => {
    const member = findMember(req);
    if (req.method === route.method && member !== undefined && mayCall(route, member.roles))
      read(req, res, next);
    else next();
  });
  return router;
}
