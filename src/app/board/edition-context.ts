import { type EditionContent, type EditionReply, type Role, apiRoutes, mayCall } from '@contract';
import type { LineageStep, ShownContext } from '../ui/page-context';

const hashLength = 6;

/** What the frame shows around an edition; its links only to those who may open where they lead. */
export function editionContext(
  { edition, content }: EditionReply,
  roles: readonly Role[],
): ShownContext {
  const steps = mayCall(apiRoutes.readFit, roles) ? fitSteps(content) : [];
  return {
    ...contentContext(content),
    lineage:
      steps.length === 0
        ? []
        : [...steps, { label: `Edition ${edition.number}`, link: `/board/${edition.id}` }],
  };
}

/** Whose figures they are, and in which unit. */
export function contentContext(content: EditionContent): ShownContext {
  const { currency, unit } = content.panelVersion;
  return { ownCompany: content.ownCompany, currency, unit };
}

export function fitSteps({
  panelVersion,
  peerGroup,
  fit,
  fitId,
}: EditionContent): readonly LineageStep[] {
  return [
    {
      label: 'Panel',
      version: `v${panelVersion.number}`,
      detail: `FY${panelVersion.firstYear}–FY${panelVersion.lastYear}`,
      link: `/panel/${panelVersion.id}`,
    },
    {
      label: 'Peers',
      version: `v${peerGroup.number}`,
      detail: `${peerGroup.peerCount + 1} companies`,
      link: `/peers/${peerGroup.id}`,
    },
    { label: 'Fit', version: fit.hash.slice(0, hashLength), link: `/fit/${fitId}` },
  ];
}
