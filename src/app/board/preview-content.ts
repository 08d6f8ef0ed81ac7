import {
  type EditionContent,
  type FitReply,
  type FitResult,
  type PeerGroupReply,
  type ScenarioReply,
  cautions,
} from '@contract';
import { rolesByOrder } from '../ui/plan/regressor-labels';

/** What an edition would be made of, were it published now. */
export interface PreviewParts {
  readonly fit: FitReply;
  readonly result: FitResult;
  readonly peerGroup: PeerGroupReply;
  readonly scenarios: readonly ScenarioReply[];
  readonly number: number;
  readonly workspaceName: string;
  readonly publishedBy: string;
  readonly publishedAt: Date;
  readonly confidentiality: EditionContent['confidentiality'];
  readonly comment: string;
  readonly peerGroupsTried: number;
}

/** The content as publishing would freeze it, so that the preview is drawn by the edition's own sheet. */
export function previewContent(parts: PreviewParts): EditionContent {
  const { fit, result, peerGroup, scenarios, publishedAt, ...rest } = parts;
  return {
    ...rest,
    schema: 1,
    ownCompany: peerGroup.ownCompany,
    publishedAt: publishedAt.toISOString(),
    fitId: fit.fit.id,
    fitCreatedAt: fit.fit.createdAt,
    fitCreatedBy: fit.fit.createdBy,
    panelVersion: fit.panelVersion,
    regressorRoles: [...rolesByOrder(fit.fit.regressors)],
    peerGroup,
    fit: result,
    scenarios: scenarios.map(({ id, name, note, version, plan, years }) => ({
      id,
      name,
      note,
      version,
      plan,
      years,
    })),
    cautions: [...cautions],
  };
}

/** What keeps a fit from being published, in words; empty when nothing does. */
export function hindrances(result: FitResult, peerGroup: PeerGroupReply): readonly string[] {
  const silent = peerGroup.peers
    .filter(({ reason }) => reason === '')
    .map(({ company }) => company);
  return [
    ...(result.standing === null
      ? [result.standingReason ?? 'The fit has no standing of the own company to publish.']
      : []),
    ...(silent.length > 0
      ? [
          `Every company that is in or out needs a written reason. Without one: ${silent.join(', ')}.`,
        ]
      : []),
  ];
}
