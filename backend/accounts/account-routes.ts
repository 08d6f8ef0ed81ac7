import express, { type Request, type Response, type Router } from 'express';
import type { PassportStatic } from 'passport';
import {
  AcceptInvitation,
  apiRoutes,
  InvitationToken,
  type InvitationView,
  Preferences,
  Role,
  type SessionReply,
  SignUp,
} from '../contract';
import type { CrossSiteGuard } from '../http/cross-site';
import { findMember, signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { register } from '../http/register';
import type { AccountService } from './account-service';
import type { MemberService } from './member-service';
import { authenticate, endSession, startSession } from './sign-in-strategy';

export interface AccountRoutesOptions {
  readonly accounts: AccountService;
  readonly members: MemberService;
  readonly authenticator: PassportStatic;
  readonly crossSite: CrossSiteGuard;
  readonly now: () => Date;
}

/** Signing up, in and out, joining by a link, and one's own preferences. */
export function accountRoutes(options: AccountRoutesOptions): Router {
  const { accounts, members } = options;
  const router = express.Router();

  async function begin(req: Request, res: Response, user: Express.User): Promise<void> {
    await startSession(req, user, options.now());
    options.crossSite.issue(req, res);
    res.json(await sessionReply(user.personId, user.workspaceId));
  }

  async function sessionReply(personId: string, workspaceId: string): Promise<SessionReply> {
    const account = await accounts.account(personId);
    const membership = await accounts.membership(personId, workspaceId);
    if (membership === undefined) return { session: null };
    return {
      session: {
        person: { id: account.id, name: account.name, email: account.email },
        workspace: { id: workspaceId, name: membership.workspaceName },
        roles: membership.roles.map((role) => Role.parse(role)),
        preferences: account.preferences,
      },
    };
  }

  register(router, apiRoutes.readSession, async (req, res) => {
    const member = findMember(req);
    options.crossSite.issue(req, res);
    res.json(
      member === undefined
        ? { session: null }
        : await sessionReply(member.personId, member.workspaceId),
    );
  });

  register(
    router,
    apiRoutes.signIn,
    async (req, res) => {
      if (req.user !== undefined) await begin(req, res, req.user);
    },
    authenticate(options.authenticator),
  );

  register(router, apiRoutes.signOut, async (req, res) => {
    await endSession(req);
    res.setHeader('Clear-Site-Data', '"cache", "cookies", "storage"');
    res.status(204).end();
  });

  register(router, apiRoutes.signUp, async (req, res) => {
    res.status(201);
    await begin(req, res, await accounts.signUp(parse(SignUp, req.body)));
  });

  register(router, apiRoutes.changePreferences, async (req, res) => {
    const preferences = parse(Preferences, req.body);
    await accounts.changePreferences(signedInMember(req).personId, preferences);
    res.json(preferences);
  });

  register(router, apiRoutes.viewInvitation, async (req, res) => {
    const { token } = parse(InvitationToken, req.body);
    const { workspaceName, invitation, hasAccount } = await members.view(token);
    const reply: InvitationView = {
      workspaceName,
      email: invitation.email,
      roles: invitation.roles.map((role) => Role.parse(role)),
      expiresAt: invitation.expiresAt.toISOString(),
      hasAccount,
    };
    res.json(reply);
  });

  register(router, apiRoutes.acceptInvitation, async (req, res) => {
    const request = parse(AcceptInvitation, req.body);
    res.status(201);
    await begin(req, res, await members.accept(request.token, request.name, request.password));
  });

  return router;
}
