import { createHash, randomUUID } from 'node:crypto';
import { UniqueViolation } from '../../../db/errors';
import type { Repositories, WorkspaceRepositories } from '../../../db/repositories/repositories';
import { record } from '../../activity/activity';
import {
  Conflict,
  type FieldError,
  Invalid,
  NotFound,
  TooManyRequests,
} from '../../errors/app-error';
import type { JobQueue } from '../../jobs/job-queue';
import { engineVersion } from '../../stats';
import { type AskedSpecification, specificationOf } from '../specification-of';
import { mostLeftOut, type TrialRequest } from './trial-groups';
import { type StoredTrial, toStoredTrial } from './trial-view';

interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

/** What is asked for, with the specification as a fit takes it. */
export interface AskedTrial extends Omit<TrialRequest, 'specification'> {
  readonly specification: AskedSpecification;
}

/** Of a workspace, queued or running. */
const mostUnfinished = 3;
const retryAfterSeconds = 30;

/** Peer groups that are tried out before they are saved. */
export class TrialService {
  constructor(
    private readonly repositories: Repositories,
    private readonly queue: JobQueue,
  ) {}

  /**
   * Queues a trial; the same request by the same engine answers with the trial that exists.
   *
   * @throws {NotFound} for an unknown panel version; {Invalid} for companies or columns it does not have;
   *   {TooManyRequests} while the workspace has several under way.
   */
  async start(actor: Actor, asked: AskedTrial): Promise<StoredTrial> {
    const id = await this.repositories
      .inWorkspace(actor.workspaceId, (tx) => this.#queue(tx, actor.personId, asked))
      .catch((error: unknown) => {
        if (error instanceof UniqueViolation) return undefined;
        throw error;
      });
    this.queue.wake('peer-trial');
    // Somebody else asked for the same in the same moment: theirs is the one.
    if (id === undefined) return this.start(actor, asked);
    return this.find(actor.workspaceId, id);
  }

  async #queue(tx: WorkspaceRepositories, personId: string, asked: AskedTrial): Promise<string> {
    const { panelVersionId } = asked;
    const version = await tx.panels.findVersion(panelVersionId);
    if (version === undefined) throw new NotFound('There is no such panel version.');
    assertCompanies(asked, new Set(await tx.panels.companyNames(panelVersionId)));
    const specification = specificationOf(asked.specification, version, '/specification');
    const request: TrialRequest = { ...asked, specification };
    const requestKey = keyOf(request);
    await tx.peerTrials.lockCount();
    const same = await tx.peerTrials.findSame(requestKey);
    if (same !== undefined) return same.id;
    if ((await tx.peerTrials.unfinished()) >= mostUnfinished)
      throw new TooManyRequests(
        `${mostUnfinished} choices of this workspace are being tried out. Wait for one to end, or cancel one.`,
        retryAfterSeconds,
      );
    const id = randomUUID();
    await tx.peerTrials.insert({ id, panelVersionId, request, requestKey, createdBy: personId });
    await this.queue.enqueue(tx, 'peer-trial', id);
    const counts = { peers: asked.peers.length, candidates: asked.candidates.length };
    await record(tx, personId, 'peer-trial-started', id, counts);
    return id;
  }

  /** @throws {NotFound} */
  async find(workspaceId: string, id: string): Promise<StoredTrial> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findTrial(tx, id));
  }

  /** Stops one that is queued or running. @throws {NotFound}; {Conflict} when it has ended. */
  async cancel(actor: Actor, id: string, now: Date): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      await findTrial(tx, id);
      if (!(await tx.peerTrials.cancel(id, now)))
        throw new Conflict('This has ended already; it stays as it is.');
      await record(tx, actor.personId, 'peer-trial-cancelled', id);
    });
  }
}

async function findTrial(tx: WorkspaceRepositories, id: string): Promise<StoredTrial> {
  const row = await tx.peerTrials.find(id);
  if (row === undefined) throw new NotFound('There is no such trial of a peer group.');
  return toStoredTrial(row);
}

/** Who is in and who is tried, in whichever order they were sent. */
function keyOf({ peers, candidates, ...rest }: TrialRequest): string {
  const tried = [peers, peers.slice(0, mostLeftOut), candidates].map((list) => [...list].sort());
  const { panelVersionId, ownCompany, specification } = rest;
  const text = JSON.stringify([engineVersion, panelVersionId, ownCompany, tried, specification]);
  return createHash('sha256').update(text).digest('hex');
}

function assertCompanies(asked: AskedTrial, companies: ReadonlySet<string>): void {
  const { ownCompany, peers, candidates } = asked;
  const errors: FieldError[] = [];
  const seen = new Set<string>();
  const check = (company: string, pointer: string): void => {
    if (seen.has(company)) errors.push({ pointer, detail: `“${company}” is named twice` });
    else if (!companies.has(company))
      errors.push({ pointer, detail: `expected a company of the panel; found “${company}”` });
    seen.add(company);
  };
  check(ownCompany, '/ownCompany');
  for (const [index, peer] of peers.entries()) check(peer, `/peers/${index}`);
  for (const [index, candidate] of candidates.entries()) check(candidate, `/candidates/${index}`);
  if (errors.length > 0) throw new Invalid('The choice cannot be tried out.', errors);
}
