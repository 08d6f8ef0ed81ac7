import * as z from 'zod';
import { FitResult } from './fits';
import { ColumnRole, NewerPanelVersion, PanelVersionSummary } from './panels';
import { PeerGroupReply } from './peers';
import { Plan, ScenarioYear } from './scenarios';

export const Confidentiality = z.enum(['confidential', 'inside-information']);
export type Confidentiality = z.infer<typeof Confidentiality>;

export const PublishEdition = z.strictObject({
  fitId: z.uuid(),
  /** With the versions that the publisher saw: one stored meanwhile is a conflict. */
  scenarios: z.array(z.strictObject({ id: z.uuid(), version: z.number().int() })).max(4),
  confidentiality: Confidentiality,
  /** What the publisher wants the CFO to know. */
  comment: z.string().trim().max(4000),
});
export type PublishEdition = z.infer<typeof PublishEdition>;

export const ReturnEdition = z.strictObject({
  comment: z.string().trim().min(1, 'expected a comment that says what to change').max(4000),
});
export type ReturnEdition = z.infer<typeof ReturnEdition>;

/** Signing is given the password again. */
export const SignEdition = z.strictObject({ password: z.string().min(1).max(128) });
export type SignEdition = z.infer<typeof SignEdition>;

/** What an edition froze. Its SHA-256 is taken over the canonical JSON of this. */
/** As it was when it was frozen: editions published before versions said what made them do not say it. */
const FrozenPanelVersion = PanelVersionSummary.partial({
  parentId: true,
  origin: true,
  restoredNumber: true,
});

export const EditionContent = z.object({
  schema: z.literal(1),
  number: z.number().int(),
  workspaceName: z.string(),
  ownCompany: z.string(),
  publishedBy: z.string(),
  publishedAt: z.iso.datetime(),
  confidentiality: Confidentiality,
  comment: z.string(),
  fitId: z.uuid(),
  fitCreatedAt: z.iso.datetime(),
  fitCreatedBy: z.string(),
  panelVersion: FrozenPanelVersion,
  /** What each regressor of the fit is, in its order. */
  regressorRoles: z.array(ColumnRole),
  peerGroup: PeerGroupReply,
  fit: FitResult,
  scenarios: z.array(
    z.object({
      id: z.uuid(),
      name: z.string(),
      note: z.string(),
      version: z.number().int(),
      plan: Plan,
      years: z.array(ScenarioYear),
    }),
  ),
  /** Peer group versions saved in the workspace up to the publication. */
  peerGroupsTried: z.number().int(),
  cautions: z.array(z.string()),
});
export type EditionContent = z.infer<typeof EditionContent>;

export const EditionState = z.enum(['waiting', 'signed', 'returned', 'superseded']);
export type EditionState = z.infer<typeof EditionState>;

export const EditionSummary = z.object({
  id: z.uuid(),
  number: z.number().int(),
  state: EditionState,
  publishedBy: z.string(),
  publishedAt: z.iso.datetime(),
  sha256: z.string(),
  confidentiality: Confidentiality,
  decision: z
    .object({
      kind: z.enum(['signed', 'returned']),
      by: z.string(),
      at: z.iso.datetime(),
      comment: z.string(),
    })
    .nullable(),
  supersededBy: z.number().int().nullable(),
});
export type EditionSummary = z.infer<typeof EditionSummary>;

export const EditionsReply = z.object({ editions: z.array(EditionSummary) });
export type EditionsReply = z.infer<typeof EditionsReply>;

export const EditionReply = z.object({
  edition: EditionSummary,
  content: EditionContent,
  /** Never part of what was frozen. */
  newerPanelVersion: NewerPanelVersion,
  /** Whether the person who asks may sign it, and if not, why. */
  maySign: z.boolean(),
  /** One that a later signed edition overtook can still be returned. */
  mayReturn: z.boolean(),
  whyNot: z.string().nullable(),
});
export type EditionReply = z.infer<typeof EditionReply>;
