import { randomUUID } from 'node:crypto';
import type { EditionRow } from '../../db/repositories/editions-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { NotFound } from '../errors/app-error';
import { findRowsUsed, type RowUsed } from '../fits/fit-rows-service';
import { contentHash } from './content-hash';
import type { EditionWriter } from './edition-parts';
import { findEdition, type Reader } from './edition-reader';

/** Whether an edition is as it was published and signed. */
export interface Verification {
  readonly row: EditionRow;
  readonly isUnchanged: boolean;
  readonly computedSha256: string;
  readonly publishedSha256: string | null;
  readonly signedSha256: string | null;
  readonly checkedAt: Date;
  readonly detail: string;
}

/** An edition that was signed, with what it shows. */
export interface SignedEdition {
  readonly row: EditionRow;
  readonly content: unknown;
}

/** A second look within this time is the same look. */
const sameViewMs = 60 * 60 * 1000;

/** What surrounds editions: warnings opened, comments, who looked, history and verification. */
export class EditionDeskService {
  constructor(
    private readonly repositories: Repositories,
    private readonly now: () => Date,
    private readonly writer: EditionWriter,
  ) {}

  /** Notes that the reader looked at an edition. @throws {NotFound} */
  async noteView(reader: Reader, editionId: string): Promise<void> {
    await this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await findEdition(tx, reader, editionId);
      const { personId } = reader;
      const last = await tx.editionDesk.lastViewed(editionId, personId);
      const at = this.now();
      if (last !== undefined && at.getTime() - last.getTime() < sameViewMs) return;
      const view = {
        id: randomUUID(),
        editionId,
        personId,
        kind: 'viewed',
        format: null,
        at,
      } as const;
      await tx.editionDesk.insertAccess(view);
      await record(tx, personId, 'edition-viewed', editionId);
    });
  }

  /** Notes that the reader takes an edition out. @returns the reader's name. @throws {NotFound} */
  async noteExport(reader: Reader, editionId: string, format: 'pdf' | 'xlsx'): Promise<string> {
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await findEdition(tx, reader, editionId);
      const { personId } = reader;
      const at = this.now();
      await tx.editionDesk.insertAccess({
        id: randomUUID(),
        editionId,
        personId,
        kind: 'exported',
        format,
        at,
      });
      await record(tx, personId, 'edition-exported', editionId, { format });
      return (await tx.members.find(personId))?.name ?? '';
    });
  }

  /** The rows of the panel that an edition's fit was computed from. @throws {NotFound} */
  async rows(reader: Reader, editionId: string): Promise<readonly RowUsed[]> {
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      const { fitId } = await findEdition(tx, reader, editionId);
      return findRowsUsed(tx, fitId);
    });
  }

  /** Notes that the reader opened a warning. @throws {NotFound}, also for a warning that the edition does not have. */
  async openWarning(reader: Reader, editionId: string, warningId: string): Promise<void> {
    await this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await findEdition(tx, reader, editionId);
      const text = await tx.editions.content(editionId);
      if (text === undefined) throw new NotFound();
      if (!this.writer.read(text).warnings.some(({ id }) => id === warningId))
        throw new NotFound('This edition has no such warning.');
      await tx.editionDesk.openWarning(editionId, reader.personId, warningId);
    });
  }

  /** Ids of the warnings that whoever signs has to open. @throws {NotFound} */
  async seriousWarnings(reader: Reader, editionId: string): Promise<readonly string[]> {
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await findEdition(tx, reader, editionId);
      const text = await tx.editions.content(editionId);
      if (text === undefined) throw new NotFound();
      return this.writer
        .read(text)
        .warnings.filter(({ isSerious }) => isSerious)
        .map(({ id }) => id);
    });
  }

  /** @throws {NotFound} */
  async comment(
    reader: Reader,
    editionId: string,
    { block, text }: { readonly block: string; readonly text: string },
  ): Promise<void> {
    await this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      await findEdition(tx, reader, editionId);
      const id = randomUUID();
      await tx.editionDesk.insertComment({
        id,
        editionId,
        block,
        body: text,
        writtenBy: reader.personId,
        writtenAt: this.now(),
      });
      await record(tx, reader.personId, 'edition-commented', editionId, { block });
    });
  }

  /** Every edition that was signed, oldest first. */
  async history(reader: Reader): Promise<readonly SignedEdition[]> {
    const rows = await this.repositories.inWorkspace(reader.workspaceId, (tx) =>
      tx.editions.signedContents(),
    );
    return rows.map(({ content, ...row }) => ({ row, content: this.writer.read(content).content }));
  }

  /**
   * Computes the hash of the stored content and holds it against the stored one and those that the record of activity
   * has of publication and signature. @throws {NotFound}
   */
  async verify(reader: Reader, editionId: string): Promise<Verification> {
    return this.repositories.inWorkspace(reader.workspaceId, async (tx) => {
      const row = await findEdition(tx, reader, editionId);
      const text = await tx.editions.content(editionId);
      if (text === undefined) throw new NotFound();
      const recorded = async (action: string) =>
        hashOf((await tx.activity.ofSubject(editionId, action)).at(-1)?.detail);
      const found = {
        computed: contentHash(text),
        stored: row.sha256,
        published: await recorded('edition-published'),
        signed: await recorded('edition-signed'),
      };
      const fault = faultOf(row, found);
      return {
        row,
        isUnchanged: fault === null,
        computedSha256: found.computed,
        publishedSha256: found.published,
        signedSha256: found.signed,
        checkedAt: this.now(),
        detail:
          fault ??
          `Edition ${row.number} is as it was published${found.signed === null ? '' : ' and signed'}.`,
      };
    });
  }
}

interface Hashes {
  readonly computed: string;
  readonly stored: string;
  readonly published: string | null;
  readonly signed: string | null;
}

/** What is wrong with an edition's hashes, in words; null where nothing is. */
export function faultOf(
  { number, state }: Pick<EditionRow, 'number' | 'state'>,
  { computed, stored, published, signed }: Hashes,
): string | null {
  const ofEdition = `Edition ${number}`;
  if (computed !== stored)
    return `${ofEdition} was changed: its content has another SHA-256 than the one stored with it.`;
  if (published === null)
    return `${ofEdition} has no record of its publication, so nothing outside it vouches for it.`;
  if (published !== computed)
    return `${ofEdition} was changed: its content and its hash are others than those recorded when it was published.`;
  const isSigned = state === 'signed' || state === 'superseded';
  if (isSigned && signed === null)
    return `${ofEdition} counts as signed, but nobody’s signature is recorded.`;
  return signed !== null && signed !== computed
    ? `${ofEdition} was changed: its content is another than the one recorded when it was signed.`
    : null;
}

function hashOf(detail: object | undefined): string | null {
  return detail !== undefined && 'sha256' in detail && typeof detail.sha256 === 'string'
    ? detail.sha256
    : null;
}
