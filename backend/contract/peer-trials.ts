import * as z from 'zod';
import { FitSpecification, FitState, IntervalEstimate } from './fits';
import { CompanyName } from './peers';

/** So many members are left out in turn, the first of those sent; all of them are in the group that is fitted. */
export const mostMembersTried = 60;
export const mostCandidatesTried = 20;

/**
 * Has the engine fit a peer group that is not saved: as chosen, without each of its members, and with each candidate
 * taken in beside them.
 */
export const StartPeerTrial = z.strictObject({
  panelVersionId: z.uuid(),
  ownCompany: CompanyName,
  /** Who is in, the nearest first; the own company not among them. */
  peers: z.array(CompanyName).min(1).max(8000),
  /** Who is out and might come in. */
  candidates: z.array(CompanyName).max(mostCandidatesTried),
  specification: FitSpecification,
});
export type StartPeerTrial = z.infer<typeof StartPeerTrial>;

/** What a fit of one group says of the own company; equal to the fit of that group once saved. */
export const TrialFigures = z.object({
  hash: z.string(),
  companies: z.number().int(),
  /** How many companies have a place. */
  ranked: z.number().int(),
  slopes: z.array(z.object({ name: z.string(), ...IntervalEstimate.shape })),
  /** In the panel's currency unit, or in log form a difference of logs; null with a reason. */
  standing: IntervalEstimate.nullable(),
  standingReason: z.string().optional(),
  rankSet: z.tuple([z.number().int(), z.number().int()]).nullable(),
  rankReason: z.string().optional(),
});
export type TrialFigures = z.infer<typeof TrialFigures>;

/** What came of one group: figures, or why there are none. */
export const TrialOutcome = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('fitted'), figures: TrialFigures }),
  z.object({
    kind: z.literal('refused'),
    code: z.string(),
    detail: z.string(),
    subjects: z.array(z.string()),
  }),
]);
export type TrialOutcome = z.infer<typeof TrialOutcome>;

/** Null while it is not fitted yet. */
const outcome = TrialOutcome.nullable();
const ofCompany = z.object({ company: z.string(), outcome });

export const PeerTrialReply = z.object({
  id: z.uuid(),
  state: FitState,
  /** What was asked, the specification with what it left open. */
  asked: StartPeerTrial,
  /** Fits done of all. */
  progress: z.object({ done: z.number().int(), total: z.number().int() }),
  /** Why it failed as a whole, where it did. */
  failure: z.string().nullable(),
  /** The group as it was chosen. */
  chosen: outcome,
  without: z.array(ofCompany),
  taking: z.array(ofCompany),
  createdAt: z.iso.datetime(),
});
export type PeerTrialReply = z.infer<typeof PeerTrialReply>;
