import express, { type Router } from 'express';
import {
  apiRoutes,
  ChangeRoles,
  type InvitationCreated,
  InviteMember,
  type MembersReply,
  Role,
} from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import type { MemberService } from './member-service';

/** Members and invitations, for billing admins. */
export function memberRoutes(members: MemberService, now: () => Date): Router {
  const router = express.Router();

  register(router, apiRoutes.listMembers, async (req, res) => {
    const { workspaceId, personId } = signedInMember(req);
    const found = await members.list(workspaceId);
    const reply: MembersReply = {
      members: found.members.map((member) => ({
        personId: member.personId,
        name: member.name,
        email: member.email,
        roles: toRoles(member.roles),
        joinedAt: member.joinedAt.toISOString(),
        isYou: member.personId === personId,
      })),
      invitations: found.invitations.map((invitation) => ({
        id: invitation.id,
        email: invitation.email,
        roles: toRoles(invitation.roles),
        createdAt: invitation.createdAt.toISOString(),
        expiresAt: invitation.expiresAt.toISOString(),
        isExpired: invitation.expiresAt <= now(),
      })),
    };
    res.json(reply);
  });

  register(router, apiRoutes.inviteMember, async (req, res) => {
    const { workspaceId, personId } = signedInMember(req);
    const { email, roles } = parse(InviteMember, req.body);
    const invitation = await members.invite(workspaceId, personId, email, roles);
    const reply: InvitationCreated = {
      id: invitation.id,
      token: invitation.token,
      expiresAt: invitation.expiresAt.toISOString(),
    };
    res.status(201).json(reply);
  });

  register(router, apiRoutes.withdrawInvitation, async (req, res) => {
    const { workspaceId, personId } = signedInMember(req);
    await members.withdraw(workspaceId, personId, idParameter(req, 'invitationId'));
    res.status(204).end();
  });

  register(router, apiRoutes.changeRoles, async (req, res) => {
    const { workspaceId, personId } = signedInMember(req);
    const { roles } = parse(ChangeRoles, req.body);
    await members.changeRoles(workspaceId, personId, idParameter(req, 'personId'), roles);
    res.status(204).end();
  });

  register(router, apiRoutes.removeMember, async (req, res) => {
    const { workspaceId, personId } = signedInMember(req);
    await members.remove(workspaceId, personId, idParameter(req, 'personId'));
    res.status(204).end();
  });

  return router;
}

function toRoles(stored: readonly string[]): Role[] {
  return stored.map((role) => Role.parse(role));
}
