import type { PeerGroupRow } from '../../db/repositories/peers-repository';
import type { PeerGroupReply, PeerGroupSummary } from '../contract';
import type { PeerGroup } from './peer-service';

export function toPeerGroupSummary(row: PeerGroupRow): PeerGroupSummary {
  return {
    id: row.id,
    number: row.number,
    panelVersionId: row.panelVersionId,
    ownCompany: row.ownCompany,
    peerCount: row.peerCount,
    note: row.note,
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdByName,
  };
}

export function toPeerGroupReply(group: PeerGroup): PeerGroupReply {
  return { ...toPeerGroupSummary(group), peers: [...group.choices] };
}
