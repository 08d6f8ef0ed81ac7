import * as z from 'zod';
import { FitSummary } from './fits';
import { PanelVersionSummary } from './panels';
import { PeerGroupSummary } from './peers';

/** The newest of each thing the work goes through; null where there is none yet. */
export const DeskReply = z.object({
  panelVersion: PanelVersionSummary.nullable(),
  peerGroup: PeerGroupSummary.nullable(),
  fit: FitSummary.nullable(),
  editionsWaiting: z.number().int(),
});
export type DeskReply = z.infer<typeof DeskReply>;
