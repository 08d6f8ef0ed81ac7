import type { Kysely, Migration, MigrationProvider } from 'kysely';
import { peopleAndWorkspaces } from './0001-people-and-workspaces';
import { panelsAndPeers } from './0002-panels-and-peers';
import { fitsScenariosEditions } from './0003-fits-scenarios-editions';
import { evidenceAndBootstraps } from './0004-evidence-and-bootstraps';
import { panelDesk } from './0005-panel-desk';
import { peerTrials } from './0006-peer-trials';
import { scenarioWorkbench } from './0007-scenario-workbench';
import { boardDesk } from './0008-board-desk';
import { mailOutbox } from './0009-mail-outbox';

/** In order, append-only: a merged migration is never edited. */
const steps: Readonly<Record<string, (db: Kysely<unknown>, appRole: string) => Promise<void>>> = {
  '0001-people-and-workspaces': peopleAndWorkspaces,
  '0002-panels-and-peers': panelsAndPeers,
  '0003-fits-scenarios-editions': fitsScenariosEditions,
  '0004-evidence-and-bootstraps': evidenceAndBootstraps,
  '0005-panel-desk': panelDesk,
  '0006-peer-trials': peerTrials,
  '0007-scenario-workbench': scenarioWorkbench,
  '0008-board-desk': boardDesk,
  '0009-mail-outbox': mailOutbox,
};

export const latestMigration = Object.keys(steps).at(-1) ?? '';

/** The migrations with the name of the role that the application signs in with. */
export class Migrations implements MigrationProvider {
  constructor(private readonly appRole: string) {}

  getMigrations(): Promise<Record<string, Migration>> {
    const named = Object.entries(steps).map(([name, step]): [string, Migration] => [
      name,
      { up: (db: Kysely<unknown>) => step(db, this.appRole) },
    ]);
    return Promise.resolve(Object.fromEntries(named));
  }
}
