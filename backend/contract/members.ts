import * as z from 'zod';
import { Role } from './roles';
import { EmailAddress, Password, PersonName } from './session';

export const InviteMember = z.strictObject({
  email: EmailAddress,
  roles: z.array(Role).min(1, 'expected at least one role').max(4),
});
export type InviteMember = z.infer<typeof InviteMember>;

/** The link is in this reply and nowhere else: it cannot be shown again. */
export const InvitationCreated = z.object({
  id: z.uuid(),
  /** What follows `#` in the link /join#… */
  token: z.string(),
  expiresAt: z.iso.datetime(),
});
export type InvitationCreated = z.infer<typeof InvitationCreated>;

export const InvitationToken = z.strictObject({ token: z.string().max(200) });
export type InvitationToken = z.infer<typeof InvitationToken>;

export const InvitationView = z.object({
  workspaceName: z.string(),
  email: z.string(),
  roles: z.array(Role),
  expiresAt: z.iso.datetime(),
  /** Whether the e-mail address has an account already: the person then joins with its password. */
  hasAccount: z.boolean(),
});
export type InvitationView = z.infer<typeof InvitationView>;

export const AcceptInvitation = z.strictObject({
  token: z.string().max(200),
  /** Needed for a new account; ignored where the address has one. */
  name: PersonName.optional(),
  password: Password,
});
export type AcceptInvitation = z.infer<typeof AcceptInvitation>;

export const ChangeRoles = z.strictObject({ roles: z.array(Role).min(1).max(4) });
export type ChangeRoles = z.infer<typeof ChangeRoles>;

export const MembersReply = z.object({
  members: z.array(
    z.object({
      personId: z.uuid(),
      name: z.string(),
      email: z.string(),
      roles: z.array(Role),
      joinedAt: z.iso.datetime(),
      isYou: z.boolean(),
    }),
  ),
  invitations: z.array(
    z.object({
      id: z.uuid(),
      email: z.string(),
      roles: z.array(Role),
      createdAt: z.iso.datetime(),
      expiresAt: z.iso.datetime(),
      isExpired: z.boolean(),
    }),
  ),
});
export type MembersReply = z.infer<typeof MembersReply>;
