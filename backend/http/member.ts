import type { Request } from 'express';
import type { Role } from '../contract';
import { NotSignedIn } from '../errors/app-error';

/** Who asks, in which workspace, with the roles that the database holds at this moment. */
export interface Member {
  readonly personId: string;
  readonly workspaceId: string;
  readonly roles: readonly Role[];
}

const members = new WeakMap<Request, Member>();

export function setMember(req: Request, member: Member): void {
  members.set(req, member);
}

export function findMember(req: Request): Member | undefined {
  return members.get(req);
}

/** @throws {NotSignedIn} */
export function signedInMember(req: Request): Member {
  const member = members.get(req);
  if (member === undefined) throw new NotSignedIn();
  return member;
}
