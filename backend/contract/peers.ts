import * as z from 'zod';

export const CompanyName = z.string().min(1).max(200);

export const PeerChoice = z.strictObject({
  company: CompanyName,
  isIncluded: z.boolean(),
  /** Why it is in, or out. An empty reason is kept and keeps an edition from being published. */
  reason: z.string().trim().max(2000),
});
export type PeerChoice = z.infer<typeof PeerChoice>;

export const SavePeerGroup = z.strictObject({
  panelVersionId: z.uuid(),
  ownCompany: CompanyName,
  note: z.string().trim().max(2000),
  /** The version these choices started from; a newer one by somebody else is a conflict. */
  parentId: z.uuid().nullable(),
  peers: z.array(PeerChoice).max(8000),
});
export type SavePeerGroup = z.infer<typeof SavePeerGroup>;

export const PeerGroupSummary = z.object({
  id: z.uuid(),
  number: z.number().int(),
  panelVersionId: z.uuid(),
  ownCompany: z.string(),
  /** Peers that are in, the own company not counted. */
  peerCount: z.number().int(),
  note: z.string(),
  createdAt: z.iso.datetime(),
  createdBy: z.string(),
});
export type PeerGroupSummary = z.infer<typeof PeerGroupSummary>;

export const PeerGroupReply = PeerGroupSummary.extend({ peers: z.array(PeerChoice) });
export type PeerGroupReply = z.infer<typeof PeerGroupReply>;

export const PeerGroupsReply = z.object({ versions: z.array(PeerGroupSummary) });
export type PeerGroupsReply = z.infer<typeof PeerGroupsReply>;
