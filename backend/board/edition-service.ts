import { createHash, randomUUID } from 'node:crypto';
import { CheckViolation } from '../../db/errors';
import type { EditionRow, EditionState } from '../../db/repositories/editions-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import type { AccountService } from '../accounts/account-service';
import { record } from '../activity/activity';
import { AppError, Conflict, Forbidden, Invalid, NotFound } from '../errors/app-error';
import { findFinishedFit, type FinishedFit } from '../fits/fit-service';
import { findScenario, type Scenario } from '../scenarios/scenario-service';
import { canonicalJson } from './canonical-json';
import type { EditionParts } from './edition-parts';

export interface Reader {
  readonly personId: string;
  readonly workspaceId: string;
  readonly roles: readonly string[];
}

export interface Edition {
  readonly row: EditionRow;
  /** What was frozen, as it was hashed. */
  readonly content: unknown;
  /** The newest version of its fit's panel, where that is another one. */
  readonly newerPanelVersion: { readonly id: string; readonly number: number } | null;
  /** Why the reader may not sign it; null when they may. */
  readonly whyNot: string | null;
  readonly mayReturn: boolean;
}

export interface EditionRequest {
  readonly fitId: string;
  readonly scenarios: readonly { readonly id: string; readonly version: number }[];
  readonly confidentiality: 'confidential' | 'inside-information';
  readonly comment: string;
}

const everyState: readonly EditionState[] = ['waiting', 'signed', 'returned', 'superseded'];
/** What somebody who only reads may see: what was signed, whether or not a later one superseded it. */
const signedStates: readonly EditionState[] = ['signed', 'superseded'];

/** Frozen summaries for the CFO: published, then signed or returned by somebody else. */
export class EditionService {
  constructor(
    private readonly repositories: Repositories,
    private readonly accounts: AccountService,
    private readonly now: () => Date,
    /** Makes the content that is frozen, in the words of the contract. */
    private readonly freeze: (parts: EditionParts) => unknown,
  ) {}

  async list(reader: Reader): Promise<readonly EditionRow[]> {
    return this.repositories.inWorkspace(reader.workspaceId, (tx) =>
      tx.editions.list(visibleStates(reader)),
    );
  }

  /** @throws {NotFound}, also for one that this reader may not see. */
  async find(reader: Reader, id: string): Promise<Edition> {
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      const row = await findEdition(tx, reader, id);
      const text = await tx.editions.content(id);
      if (text === undefined) throw new NotFound();
      const signed = await tx.editions.findSigned();
      return {
        row,
        content: JSON.parse(text) as unknown,
        newerPanelVersion: await newerPanelVersion(tx, row),
        whyNot: whyNotSign(reader, row, signed),
        mayReturn: whyNotSign(reader, row, undefined) === null,
      };
    });
  }

  /**
   * Freezes figures, plans, peers with reasons, lineage and cautions under the next number.
   *
   * @throws {Invalid} for a peer without a reason or a scenario of another fit; {Conflict} for another version than seen.
   */
  async publish(reader: Reader, request: EditionRequest): Promise<string> {
    const id = randomUUID();
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await tx.members.lockWorkspace();
      const ground = await findFinishedFit(tx, request.fitId);
      const scenarios: Scenario[] = [];
      for (const seen of request.scenarios) {
        const scenario = await findScenario(tx, seen.id);
        if (scenario.version !== seen.version)
          throw new Conflict(
            `${scenario.updatedByName} saved version ${scenario.version} of “${scenario.name}” meanwhile. Load the page again to see what the edition would freeze.`,
            'stale-version',
          );
        scenarios.push(scenario);
      }
      assertPublishable(ground, scenarios);
      const workspace = await tx.members.workspace();
      const publisher = await tx.members.find(reader.personId);
      const number = await tx.editions.nextNumber();
      const publishedAt = this.now();
      const content = canonicalJson(
        this.freeze({
          number,
          workspaceName: workspace?.name ?? '',
          publishedBy: publisher?.name ?? '',
          publishedAt,
          confidentiality: request.confidentiality,
          comment: request.comment,
          ground,
          scenarios,
          peerGroupsTried: (await tx.peers.list()).length,
        }),
      );
      const sha256 = createHash('sha256').update(content).digest('hex');
      const { fitId, confidentiality } = request;
      const edition = { id, number, fitId, content, sha256, confidentiality, publishedAt };
      await tx.editions.insert({ ...edition, publishedBy: reader.personId });
      await record(tx, reader.personId, 'edition-published', id, { number, sha256 });
      return id;
    });
  }

  /**
   * Signs a waiting edition; the one signed before is superseded.
   *
   * @throws {AppError} `wrong-credentials`; {Forbidden} `four-eyes` for the publisher; {Conflict} when it no longer
   *   waits or a later one is signed.
   */
  async sign(reader: Reader, id: string, password: string): Promise<void> {
    if (!(await this.accounts.confirmPassword(reader.personId, password)))
      throw new AppError('wrong-credentials', 403, 'This is not the password of your account.');
    await this.#decide(reader, id, async (tx, row) => {
      const signed = await tx.editions.findSigned();
      const overtaker = laterSigned(row, signed);
      if (overtaker !== undefined) throw new Conflict(overtakenBy(overtaker));
      if (signed !== undefined) await tx.editions.supersede(signed.id, id);
      return { state: 'signed', comment: '' };
    });
  }

  /** @throws {Conflict} when it no longer waits; {Forbidden} `four-eyes` for the publisher. */
  async sendBack(reader: Reader, id: string, comment: string): Promise<void> {
    await this.#decide(reader, id, () => Promise.resolve({ state: 'returned', comment }));
  }

  async #decide(
    reader: Reader,
    id: string,
    prepare: (
      tx: WorkspaceRepositories,
      row: EditionRow,
    ) => Promise<{ readonly state: 'signed' | 'returned'; readonly comment: string }>,
  ): Promise<void> {
    await this.repositories
      .inWorkspace(reader.workspaceId, async (tx) => {
        await tx.members.lockWorkspace();
        const row = await findEdition(tx, reader, id);
        if (row.publishedBy === reader.personId) throw fourEyes();
        if (row.state !== 'waiting') throw new Conflict(decidedAlready(row));
        const { state, comment } = await prepare(tx, row);
        const decision = { state, comment, by: reader.personId, at: this.now() };
        if (!(await tx.editions.decide(id, decision))) throw new Conflict(decidedAlready(row));
        const action = state === 'signed' ? 'edition-signed' : 'edition-returned';
        await record(tx, reader.personId, action, id, { number: row.number, sha256: row.sha256 });
      })
      .catch((error: unknown) => {
        if (error instanceof CheckViolation && error.constraint === 'edition_four_eyes')
          throw fourEyes();
        throw error;
      });
  }
}

async function newerPanelVersion(
  tx: WorkspaceRepositories,
  { fitId }: EditionRow,
): Promise<Edition['newerPanelVersion']> {
  const fit = await tx.fits.find(fitId);
  if (fit === undefined) throw new Error(`fit ${fitId} of an edition is not there`);
  return (await tx.panels.newerThan(fit.panelVersionId)) ?? null;
}

function visibleStates(reader: Reader): readonly EditionState[] {
  const seesAll = reader.roles.includes('analyst') || reader.roles.includes('cfo');
  return seesAll ? everyState : signedStates;
}

async function findEdition(
  tx: WorkspaceRepositories,
  reader: Reader,
  id: string,
): Promise<EditionRow> {
  const found = await tx.editions.find(id);
  if (found === undefined || !visibleStates(reader).includes(found.state))
    throw new NotFound('There is no such edition.');
  return found;
}

function whyNotSign(
  reader: Reader,
  row: EditionRow,
  signed: EditionRow | undefined,
): string | null {
  if (row.state !== 'waiting') return decidedAlready(row);
  const overtaker = laterSigned(row, signed);
  if (overtaker !== undefined) return overtakenBy(overtaker);
  if (!reader.roles.includes('cfo')) return 'Signing is for the CFO.';
  if (row.publishedBy === reader.personId)
    return 'You published this edition: another person has to sign it.';
  return null;
}

/** The signed edition, where it is later than this one. */
function laterSigned(row: EditionRow, signed: EditionRow | undefined): EditionRow | undefined {
  return signed !== undefined && signed.number > row.number ? signed : undefined;
}

function overtakenBy(signed: EditionRow): string {
  return `Edition ${signed.number} is later and is signed already.`;
}

function decidedAlready(row: EditionRow): string {
  const verb = row.state === 'returned' ? 'returned' : 'signed';
  return `${row.decidedByName ?? 'Somebody'} has ${verb} this edition already.`;
}

function fourEyes(): Forbidden {
  return new Forbidden(
    'You published this edition: another person has to sign or return it.',
    'four-eyes',
  );
}

function assertPublishable(ground: FinishedFit, scenarios: readonly Scenario[]): void {
  if (ground.result.standing === null)
    throw new Invalid(
      ground.result.standingReason ?? 'The fit has no standing of the own company to publish.',
    );
  const silent = ground.peerGroup.choices.filter(({ reason }) => reason === '');
  if (silent.length > 0)
    throw new Invalid(
      `Every company that is in or out needs a written reason. Without one: ${silent.map(({ company }) => company).join(', ')}.`,
    );
  const foreign = scenarios.filter(({ fitId }) => fitId !== ground.fit.id);
  if (foreign.length > 0)
    throw new Invalid(
      `An edition shows scenarios of its own fit alone. Of another fit: ${foreign.map(({ name }) => name).join(', ')}.`,
    );
}
