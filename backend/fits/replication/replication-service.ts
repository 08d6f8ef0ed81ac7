import { readFile } from 'node:fs/promises';
import type { Repositories, WorkspaceRepositories } from '../../../db/repositories/repositories';
import { record } from '../../activity/activity';
import { Conflict } from '../../errors/app-error';
import { findEvidence } from '../evidence-service';
import { findFinishedFit, type FinishedFit } from '../fit-service';
import { readSubject } from '../fit-subject';
import type { PackLineage, ReplicationPack } from './replication-pack';
import { rowsUsed } from './rows-used';

interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

/** Hands out all that somebody needs to compute a fit again. */
export class ReplicationService {
  /** @param scriptFile  path of `replication.R`. */
  constructor(
    private readonly repositories: Repositories,
    private readonly scriptFile: string,
  ) {}

  /** Records who took it. @throws as `read`. */
  async export(actor: Actor, fitId: string): Promise<ReplicationPack> {
    const script = await readFile(this.scriptFile, 'utf8');
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const pack = await packOf(tx, fitId, script);
      await record(tx, actor.personId, 'fit-exported', fitId, { hash: pack.result.hash });
      return pack;
    });
  }

  /** @throws {NotFound}; {Conflict} while the fit is not done or its evidence is being computed. */
  async read(workspaceId: string, fitId: string): Promise<ReplicationPack> {
    const script = await readFile(this.scriptFile, 'utf8');
    return this.repositories.inWorkspace(workspaceId, (tx) => packOf(tx, fitId, script));
  }
}

async function packOf(
  tx: WorkspaceRepositories,
  fitId: string,
  script: string,
): Promise<ReplicationPack> {
  const found = await findFinishedFit(tx, fitId);
  const view = await findEvidence(tx, fitId);
  if (view.state === 'computing')
    throw new Conflict(
      'The evidence of this fit is still being computed: export the pack when it is there.',
    );
  const { fit, result, panelVersion, peerGroup } = found;
  const { columns } = await readSubject(tx, found);
  return {
    rows: rowsUsed(columns, result),
    names: {
      company: panelVersion.companyHeader,
      year: panelVersion.yearHeader,
      regressors: fit.specification.regressors,
    },
    ownCompany: peerGroup.ownCompany,
    currency: panelVersion.currency,
    unit: panelVersion.unit,
    result,
    ...(view.state === 'ready'
      ? { evidence: view.evidence }
      : { evidence: null, evidenceReason: view.reason }),
    lineage: lineageOf(found),
    script,
  };
}

function lineageOf({ fit, peerGroup, panelVersion }: FinishedFit): PackLineage {
  const made = (row: { readonly createdAt: Date; readonly createdByName: string }) => ({
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdByName,
  });
  return {
    fit: { id: fit.id, ...made(fit) },
    peerGroupVersion: {
      number: peerGroup.number,
      note: peerGroup.note,
      companies: peerGroup.choices,
      ...made(peerGroup),
    },
    panelVersion: {
      panel: panelVersion.panelName,
      number: panelVersion.number,
      note: panelVersion.note,
      ...made(panelVersion),
    },
    importedFile: { name: panelVersion.fileName, sha256: panelVersion.fileSha256 },
  };
}
