import type { PeerTrialReply, StartPeerTrial, TrialOutcome as OutcomeReply } from '../../contract';
import { groupsOf, type TrialGroup, type TrialRequest } from './trial-groups';
import type { TrialOutcome } from './trial-outcome';
import type { StoredTrial } from './trial-view';

export function toPeerTrialReply(trial: StoredTrial): PeerTrialReply {
  const groups = groupsOf(trial.request);
  const outcomes = groups.map((_, place) => toOutcomeReply(trial.outcomes.at(place)));
  const ofKind = (kind: TrialGroup['kind']): PeerTrialReply['without'] =>
    groups.flatMap((group, place) =>
      group.kind === kind && group.kind !== 'chosen'
        ? [{ company: group.company, outcome: outcomes[place] }]
        : [],
    );
  return {
    id: trial.id,
    state: trial.state,
    asked: toAsked(trial.request),
    progress: { done: trial.outcomes.length, total: groups.length },
    failure: trial.failure,
    chosen: outcomes[0],
    without: ofKind('without'),
    taking: ofKind('taking'),
    createdAt: trial.createdAt.toISOString(),
  };
}

function toAsked({ specification, peers, candidates, ...rest }: TrialRequest): StartPeerTrial {
  const { outcome: _, regressors, seed, ...asked } = specification;
  const furtherRegressors = regressors.slice(2);
  return {
    ...rest,
    peers: [...peers],
    candidates: [...candidates],
    specification: { ...asked, ...(seed === null ? {} : { seed }), furtherRegressors },
  };
}

/** An outcome crosses as it is kept; null while there is none. */
function toOutcomeReply(outcome: TrialOutcome | undefined): OutcomeReply | null {
  return outcome === undefined ? null : (structuredClone(outcome) as OutcomeReply);
}
