import type { EditionRow } from '../../db/repositories/editions-repository';
import type {
  EditionContent,
  EditionHistoryReply,
  EditionPreviewReply,
  EditionReply,
  EditionSummary,
  EditionVerification,
} from '../contract';
import { EditionBlock } from '../contract';
import type { SignedEdition, Verification } from './edition-desk-service';
import type { Edition, EditionPreview } from './edition-service';

export function toEditionSummary(row: EditionRow): EditionSummary {
  return {
    id: row.id,
    number: row.number,
    state: row.state,
    publishedBy: row.publishedByName,
    publishedAt: row.publishedAt.toISOString(),
    sha256: row.sha256,
    confidentiality: row.confidentiality,
    decision:
      row.decidedAt === null
        ? null
        : {
            kind: row.state === 'returned' ? 'returned' : 'signed',
            by: row.decidedByName ?? '',
            at: row.decidedAt.toISOString(),
            comment: row.decisionComment ?? '',
          },
    supersededBy: row.supersededByNumber,
  };
}

export function toEditionReply(edition: Edition): EditionReply {
  const { row, content, newerPanelVersion, whyNot, mayReturn } = edition;
  return {
    edition: toEditionSummary(row),
    content: content as EditionContent,
    newerPanelVersion,
    maySign: whyNot === null,
    mayReturn,
    whyNot,
    openedWarnings: [...edition.openedWarnings],
    comments: edition.comments.map((comment) => ({
      id: comment.id,
      editionId: comment.editionId,
      editionNumber: comment.editionNumber,
      block: EditionBlock.parse(comment.block),
      text: comment.body,
      by: comment.writtenByName,
      at: comment.writtenAt.toISOString(),
    })),
    access:
      edition.access?.map(({ personName, kind, format, at }) => ({
        by: personName,
        kind,
        format,
        at: at.toISOString(),
      })) ?? null,
  };
}

export function toEditionPreviewReply(preview: EditionPreview): EditionPreviewReply {
  return {
    content: preview.content as EditionContent,
    suggestedHeadline: preview.suggestedHeadline,
    headlineProblems: preview.headlineFaults.map((fault) => ({ ...fault })),
    hindrances: [...preview.hindrances],
  };
}

export function toEditionVerification(verification: Verification): EditionVerification {
  const { row, checkedAt, ...found } = verification;
  return {
    ...found,
    number: row.number,
    storedSha256: row.sha256,
    checkedAt: checkedAt.toISOString(),
  };
}

export function toEditionHistoryReply(signed: readonly SignedEdition[]): EditionHistoryReply {
  return {
    editions: signed.map(({ row, content }) => {
      const { ownCompany, panelVersion, peerGroup, fit } = content as EditionContent;
      const { standing, specification, sample } = fit;
      return {
        id: row.id,
        number: row.number,
        state: row.state === 'superseded' ? 'superseded' : 'signed',
        signedAt: (row.decidedAt ?? row.publishedAt).toISOString(),
        signedBy: row.decidedByName ?? '',
        ownCompany,
        currency: panelVersion.currency,
        unit: panelVersion.unit,
        form: specification.form,
        confidence: specification.confidence,
        standing: standing && {
          estimate: standing.estimate,
          standardError: standing.standardError,
          low: standing.low,
          high: standing.high,
        },
        rankSet: standing?.rankSet ?? null,
        companies: sample.companies,
        lastYear: sample.lastYear,
        panelVersionNumber: panelVersion.number,
        peerGroupNumber: peerGroup.number,
      };
    }),
  };
}
