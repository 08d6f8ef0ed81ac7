import type { Repositories } from '../../db/repositories/repositories';
import { findLatestFit } from '../fits/fit-service';

/** The newest of each thing the work goes through, read together for the frame of every page. */
export class DeskService {
  constructor(private readonly repositories: Repositories) {}

  read(workspaceId: string) {
    return this.repositories.inWorkspace(workspaceId, async (tx) => ({
      panelVersion: (await tx.panels.listVersions())[0],
      peerGroup: await tx.peers.latest(),
      fit: await findLatestFit(tx),
      editionsWaiting: await tx.editions.countWaiting(),
    }));
  }
}
