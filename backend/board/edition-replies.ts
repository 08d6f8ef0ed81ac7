import type { EditionRow } from '../../db/repositories/editions-repository';
import type { EditionContent, EditionReply, EditionSummary } from '../contract';
import type { Edition } from './edition-service';

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
  };
}
