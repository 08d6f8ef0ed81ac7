import type { DeskReply, FitReply } from '@contract';
import type { ShownContext, StaleNotice } from '../ui/page-context';
import { fitContext } from '../ui/fit-context';
import type { ScenarioGround } from './scenario-ground';

/** What the frame shows around a plan: whose figures, and panel › peers › fit › scenario. */
export function contextOf(
  { fit, saved, desk }: Pick<ScenarioGround, 'fit' | 'saved' | 'desk'>,
  locale: string,
): ShownContext {
  const ofFit = fitContext(fit, desk, locale);
  if (saved === null) return { ...ofFit, stale: ofFit.stale ?? newerFit(fit, desk) };
  const step = { label: saved.name, version: `v${saved.version}`, link: `/scenarios/${saved.id}` };
  return {
    ...ofFit,
    lineage: [...(ofFit.lineage ?? []), step],
    stale: ofFit.stale ?? newerFit(fit, desk),
  };
}

function newerFit({ fit }: FitReply, desk: DeskReply): StaleNotice | null {
  if (desk.fit === null || desk.fit.id === fit.id) return null;
  return { text: 'A newer fit is done.', action: { label: 'Plan on it', link: '/scenarios' } };
}
