import type { Evidence, FitReply, FitResult } from '@contract';
import { shortHash, confidenceText, yearsText } from '../../ui/phrases';
import type { ChartText } from '../../charts/chart-text';

/** A fit that is done, and the evidence beside it: what every block is told from. */
export interface EvidenceGround {
  readonly reply: FitReply;
  readonly result: FitResult;
  readonly evidence: Evidence;
}

/** The words of one chart of the evidence: its finding, then unit, intervals and years, then where it comes from. */
export function chartText(
  { reply, result }: Pick<EvidenceGround, 'reply' | 'result'>,
  title: string,
  unit: string,
): ChartText {
  const { fit, panelVersion, peerGroup } = reply;
  const { sample, specification } = result;
  const caption = [
    unit,
    `${confidenceText(specification.confidence)} intervals`,
    yearsText(sample.firstYear, sample.lastYear),
  ];
  return {
    title,
    caption: caption.filter((part) => part !== '').join(' · '),
    source: `Fit ${shortHash(fit.hash)} · ${panelVersion.panelName} v${panelVersion.number} · peer group v${peerGroup.number} · engine ${result.engine}`,
  };
}
