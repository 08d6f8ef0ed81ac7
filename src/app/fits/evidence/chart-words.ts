import type { FitReply, FitResult } from '@contract';
import { shortHash, confidenceText, yearsText } from '../../ui/phrases';
import type { ChartText } from '../../charts/chart-text';

/** A fit that is done. */
interface Fitted {
  readonly reply: FitReply;
  readonly result: FitResult;
}

/** The words of a chart of estimates: its finding, then unit, intervals and years, then where it comes from. */
export function chartText({ reply, result }: Fitted, title: string, unit: string): ChartText {
  const intervals = `${confidenceText(result.specification.confidence)} intervals`;
  return plainChartText({ reply, result }, title, `${unit} · ${intervals}`);
}

/** The words of a chart that has no intervals. */
export function plainChartText({ reply, result }: Fitted, title: string, unit: string): ChartText {
  const { fit, panelVersion, peerGroup } = reply;
  const { firstYear, lastYear } = result.sample;
  return {
    title,
    caption: `${unit} · ${yearsText(firstYear, lastYear)}`,
    source: `Fit ${shortHash(fit.hash)} · ${panelVersion.panelName} v${panelVersion.number} · peer group v${peerGroup.number} · engine ${result.engine}`,
  };
}
