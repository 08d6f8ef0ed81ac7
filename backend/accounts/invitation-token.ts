import { createHash, randomBytes } from 'node:crypto';

/** What an invitation's link carries: the workspace, in the open, and 256 random bits. */
export interface InvitationSecret {
  readonly workspaceId: string;
  readonly tokenHash: Buffer;
}

export function createInvitationToken(workspaceId: string): {
  readonly token: string;
  readonly tokenHash: Buffer;
} {
  const secret = randomBytes(32).toString('base64url');
  return { token: `${workspaceId}.${secret}`, tokenHash: digest(secret) };
}

/** Undefined for what is no token of ours. */
export function readInvitationToken(token: string): InvitationSecret | undefined {
  const match = /^([0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})\.([\w-]{43})$/.exec(token);
  if (match === null) return undefined;
  return { workspaceId: match[1], tokenHash: digest(match[2]) };
}

function digest(secret: string): Buffer {
  return createHash('sha256').update(secret).digest();
}
