import type { CellOrigin as CellOriginReply, LineageReply } from '../contract';
import { toPanelVersionSummary } from '../panels/panel-replies';
import { toPeerGroupSummary } from '../peers/peer-replies';
import type { CellOrigin } from './cell-origins';
import type { Lineage } from './lineage-service';

export function toLineageReply(lineage: Lineage): LineageReply {
  const { fit, account, rows, result } = lineage;
  const { value } = account;
  return {
    figure: lineage.figure,
    label: account.label,
    value:
      value === null
        ? null
        : {
            estimate: value.estimate,
            standardError: value.standardError,
            low: value.low,
            high: value.high,
            intervalReason: value.intervalReason,
          },
    text: account.text,
    isMoney: account.isMoney,
    confidence: result.specification.confidence,
    formula: account.formula,
    inputs: [...account.inputs],
    fit: {
      id: fit.id,
      hash: result.hash,
      engine: result.engine,
      slopes: fit.specification.slopes,
      createdAt: fit.createdAt.toISOString(),
      createdBy: fit.createdByName,
    },
    peerGroup: toPeerGroupSummary(lineage.peerGroup),
    panelVersion: toPanelVersionSummary(lineage.panelVersion),
    cells: {
      columns: [...lineage.columns],
      rows: rows.fileRow.map((fileRow, row) => ({
        fileRow,
        company: rows.company[row],
        year: rows.year[row],
        values: [...rows.cells[row]],
        origins: lineage.origins[row].map((origin) =>
          origin === null ? null : toCellOrigin(origin),
        ),
      })),
    },
  };
}

function toCellOrigin({ corrected, conversion }: CellOrigin): CellOriginReply {
  return {
    corrected:
      corrected === null
        ? null
        : {
            by: corrected.createdByName,
            at: corrected.createdAt.toISOString(),
            reason: corrected.reason,
            source: corrected.source,
            before: corrected.before,
          },
    conversion,
  };
}
