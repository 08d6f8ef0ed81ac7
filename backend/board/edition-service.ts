import { randomUUID } from 'node:crypto';
import { CheckViolation } from '../../db/errors';
import type {
  EditionAccessRow,
  EditionCommentRow,
} from '../../db/repositories/edition-desk-repository';
import type { EditionRow } from '../../db/repositories/editions-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import type { AccountService } from '../accounts/account-service';
import { record } from '../activity/activity';
import { AppError, Conflict, Forbidden, Invalid, NotFound } from '../errors/app-error';
import { canonicalJson } from './canonical-json';
import type { ComposedEdition, EditionWriter, HeadlineFault } from './edition-parts';
import { findEdition, type Reader, seesDrafts, visibleStates } from './edition-reader';
import { contentHash } from './content-hash';
import type { EditionMails } from './edition-mails';
import { type EditionRequest, gatherParts, hindrances } from './gather-parts';

export interface Edition {
  readonly row: EditionRow;
  /** What was frozen, as it is shown. */
  readonly content: unknown;
  /** The newest version of its fit's panel, where that is another one. */
  readonly newerPanelVersion: { readonly id: string; readonly number: number } | null;
  /** Why the reader may not sign it; null when they may. */
  readonly whyNot: string | null;
  readonly mayReturn: boolean;
  /** Warnings that the reader has opened, by id. */
  readonly openedWarnings: readonly string[];
  /** Of this edition and those it answers, oldest first. */
  readonly comments: readonly EditionCommentRow[];
  /** Newest first; null where the reader is not to see it. */
  readonly access: readonly EditionAccessRow[] | null;
}

/** An edition as publishing would freeze it now, and what keeps it from being published. */
export interface EditionPreview extends ComposedEdition {
  readonly hindrances: readonly string[];
}

/** Frozen summaries for the CFO: published, then signed or returned by somebody else. */
export class EditionService {
  constructor(
    private readonly repositories: Repositories,
    private readonly accounts: AccountService,
    private readonly now: () => Date,
    private readonly writer: EditionWriter,
    private readonly mails: EditionMails,
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
        content: this.writer.read(text).content,
        newerPanelVersion: await newerPanelVersion(tx, row),
        whyNot: whyNotSign(reader, row, signed),
        mayReturn: whyNotSign(reader, row, undefined) === null,
        openedWarnings: await tx.editionDesk.openedWarnings(id, reader.personId),
        comments: await tx.editionDesk.comments(id),
        access: seesDrafts(reader) ? await tx.editionDesk.access(id) : null,
      };
    });
  }

  /** What `publish` would freeze now. @throws {NotFound}; {Conflict} for another version than seen. */
  async preview(reader: Reader, request: EditionRequest): Promise<EditionPreview> {
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      const parts = await gatherParts(tx, reader, request, this.now());
      return { ...this.writer.compose(parts), hindrances: hindrances(parts) };
    });
  }

  /**
   * Freezes figures, plans, sentences, peers with reasons, lineage and cautions under the next number.
   *
   * @throws {Invalid} for a peer without a reason or a scenario of another fit; {AppError} `headline-mismatch` for a
   *   headline that says what no figure says; {Conflict} for another version than seen.
   */
  async publish(reader: Reader, request: EditionRequest): Promise<string> {
    const id = randomUUID();
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await tx.members.lockWorkspace();
      const parts = await gatherParts(tx, reader, request, this.now());
      const [hindrance] = hindrances(parts);
      if (hindrance !== undefined) throw new Invalid(hindrance);
      const composed = this.writer.compose(parts);
      if (composed.headlineFaults.length > 0) throw headlineMismatch(composed.headlineFaults);
      const content = canonicalJson(composed.content);
      const sha256 = contentHash(content);
      const { fitId, confidentiality } = request;
      const { number, publishedAt } = parts;
      const edition = { id, number, fitId, content, sha256, confidentiality, publishedAt };
      const answers = parts.answers?.id ?? null;
      await tx.editions.insert({ ...edition, answers, publishedBy: reader.personId });
      await record(tx, reader.personId, 'edition-published', id, { number, sha256 });
      await this.mails.published(tx, reader.personId, { id, number });
      return id;
    });
  }

  /**
   * Signs a waiting edition; the one signed before is superseded.
   *
   * @throws {AppError} `wrong-credentials`; `warnings-unopened` while a serious warning was not opened; {Forbidden}
   *   `four-eyes` for the publisher; {Conflict} when it no longer waits or a later one is signed.
   */
  async sign(reader: Reader, id: string, password: string): Promise<void> {
    if (!(await this.accounts.confirmPassword(reader.personId, password)))
      throw new AppError('wrong-credentials', 403, 'This is not the password of your account.');
    await this.#decide(reader, id, async (tx, row) => {
      const signed = await tx.editions.findSigned();
      const overtaker = laterSigned(row, signed);
      if (overtaker !== undefined) throw new Conflict(overtakenBy(overtaker));
      await this.#assertWarningsOpened(tx, reader, id);
      if (signed !== undefined) await tx.editions.supersede(signed.id, id);
      return { state: 'signed', comment: '' };
    });
  }

  /** @throws {Conflict} when it no longer waits; {Forbidden} `four-eyes` for the publisher. */
  async sendBack(reader: Reader, id: string, comment: string): Promise<void> {
    await this.#decide(reader, id, () => Promise.resolve({ state: 'returned', comment }));
  }

  /** @throws {AppError} `warnings-unopened`, naming them. */
  async #assertWarningsOpened(
    tx: WorkspaceRepositories,
    reader: Reader,
    id: string,
  ): Promise<void> {
    const text = await tx.editions.content(id);
    if (text === undefined) throw new NotFound();
    const opened = await tx.editionDesk.openedWarnings(id, reader.personId);
    const unopened = this.writer
      .read(text)
      .warnings.filter((warning) => warning.isSerious && !opened.includes(warning.id));
    if (unopened.length > 0)
      throw new AppError(
        'warnings-unopened',
        409,
        `Open every serious warning before you sign. Not opened: ${unopened.map(({ title }) => title).join(', ')}.`,
        { warnings: unopened.map((warning) => warning.id) },
      );
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
        await this.mails.decided(tx, row, decision);
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

function headlineMismatch(faults: readonly HeadlineFault[]): AppError {
  return new AppError(
    'headline-mismatch',
    400,
    'The headline says what no figure of this edition says.',
    { errors: faults.map(({ detail }) => ({ pointer: '/headline', detail })) },
  );
}
