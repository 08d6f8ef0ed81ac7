import type { BootstrapRow } from '../../db/repositories/bootstraps-repository';
import type {
  Bootstrap,
  Evidence as EvidenceOfContract,
  EvidenceReply,
  EvidenceStateReply,
} from '../contract';
import type { Evidence } from '../stats';
import type { EvidenceState, EvidenceView } from './evidence-service';

export function toEvidenceReply(view: EvidenceView): EvidenceReply {
  if (view.state !== 'ready') return view;
  return {
    state: 'ready',
    evidence: toEvidence(view.evidence),
    bootstrap: view.bootstrap === null ? null : toBootstrap(view.bootstrap),
  };
}

export function toEvidenceStateReply({ state, bootstrap }: EvidenceState): EvidenceStateReply {
  return { state, bootstrap: bootstrap === null ? null : toBootstrap(bootstrap) };
}

/** The engine's evidence crosses as it is: the contract's schema describes the same members, and a spec holds them equal. */
export function toEvidence(evidence: Evidence): EvidenceOfContract {
  return structuredClone(evidence) as EvidenceOfContract;
}

export function toBootstrap({ seed, state, progress, failure }: BootstrapRow): Bootstrap {
  return { seed, state, progress: progress as Bootstrap['progress'], failure };
}
