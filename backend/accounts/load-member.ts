import type { RequestHandler } from 'express';
import type { Repositories } from '../../db/repositories/repositories';
import { Role } from '../contract';
import { setMember } from '../http/member';

/** Reads the roles of a signed-in person at each request: a change or removal holds from the next one on. */
export function loadMember(repositories: Repositories): RequestHandler {
  return async (req, _res, next) => {
    const user = req.user;
    if (user !== undefined && user.workspaceId !== '') {
      const member = await repositories.inWorkspace(user.workspaceId, (tx) =>
        tx.members.find(user.personId),
      );
      if (member !== undefined)
        setMember(req, { ...user, roles: member.roles.map((role) => Role.parse(role)) });
    }
    next();
  };
}
