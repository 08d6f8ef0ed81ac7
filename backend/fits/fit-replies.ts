import type { FitReply, FitResult as FitResultReply, FitSummary } from '../contract';
import { toPanelVersionSummary } from '../panels/panel-replies';
import { toPeerGroupSummary } from '../peers/peer-replies';
import type { FitResult } from '../stats';
import type { FitOnGround } from './fit-service';
import type { StoredFit } from './fit-view';

export function toFitSummary(fit: StoredFit): FitSummary {
  const { standing } = fit;
  return {
    id: fit.id,
    hash: fit.hash,
    state: fit.state,
    peerGroupId: fit.peerGroupId,
    panelVersionId: fit.panelVersionId,
    ownCompany: fit.ownCompany,
    regressors: [...fit.specification.regressors],
    effects: fit.specification.effects,
    form: fit.specification.form,
    lag: fit.specification.lag,
    slopes: fit.specification.slopes,
    confidence: fit.specification.confidence,
    standing:
      standing === null
        ? null
        : {
            estimate: standing.estimate,
            standardError: standing.standardError,
            low: standing.low,
            high: standing.high,
            intervalReason: standing.intervalReason,
          },
    rankSet: standing?.rankSet ? [standing.rankSet[0], standing.rankSet[1]] : null,
    companies: fit.companies,
    createdAt: fit.createdAt.toISOString(),
    createdBy: fit.createdByName,
  };
}

export function toFitReply(found: FitOnGround): FitReply {
  const { fit, result, panelVersion, newerPanelVersion, peerGroup } = found;
  return {
    fit: toFitSummary(fit),
    progress: fit.progress,
    failure: fit.failure === null ? null : { ...fit.failure, subjects: [...fit.failure.subjects] },
    result: result === undefined ? null : toFitResultReply(result),
    panelVersion: toPanelVersionSummary(panelVersion),
    newerPanelVersion,
    peerGroup: toPeerGroupSummary(peerGroup),
  };
}

/** The engine's result crosses as it is: the contract's schema describes the same members, and a spec holds them equal. */
export function toFitResultReply(result: FitResult): FitResultReply {
  return structuredClone(result) as FitResultReply;
}
