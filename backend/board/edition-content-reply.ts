import { cautions, type EditionContent } from '../contract';
import { toFitResultReply } from '../fits/fit-replies';
import { toPanelVersionSummary } from '../panels/panel-replies';
import { toPeerGroupReply } from '../peers/peer-replies';
import { toPlan, toYears } from '../scenarios/scenario-replies';
import type { EditionParts } from './edition-parts';

/** All that an edition freezes: nothing shown on it is read from anywhere else later. */
export function editionContent(parts: EditionParts): EditionContent {
  const { fit, result, panelVersion, peerGroup } = parts.ground;
  return {
    schema: 1,
    number: parts.number,
    workspaceName: parts.workspaceName,
    ownCompany: peerGroup.ownCompany,
    publishedBy: parts.publishedBy,
    publishedAt: parts.publishedAt.toISOString(),
    confidentiality: parts.confidentiality,
    comment: parts.comment,
    fitId: fit.id,
    fitCreatedAt: fit.createdAt.toISOString(),
    fitCreatedBy: fit.createdByName,
    panelVersion: toPanelVersionSummary(panelVersion),
    regressorRoles: fit.specification.regressors.map(
      (name) => panelVersion.columns.find((column) => column.name === name)?.role ?? 'other',
    ),
    peerGroup: toPeerGroupReply(peerGroup),
    fit: toFitResultReply(result),
    scenarios: parts.scenarios.map((scenario) => ({
      id: scenario.id,
      name: scenario.name,
      note: scenario.note,
      version: scenario.version,
      plan: toPlan(scenario.plan),
      years: toYears(scenario.years),
    })),
    peerGroupsTried: parts.peerGroupsTried,
    cautions: [...cautions],
  };
}
