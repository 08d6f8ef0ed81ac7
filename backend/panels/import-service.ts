import { createHash, randomUUID } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import type { OpenImportRow } from '../../db/repositories/imports-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import type { TableReading } from '../compute/file-recipe';
import type { FileCheck, FilePreview } from '../compute/parse-messages';
import type { ParseProcess } from '../compute/parse-process';
import { Conflict, NotFound } from '../errors/app-error';
import { beginningOf } from '../files/beginning-of';
import { checkColumns } from './check-columns';
import { type CurrentPanel, currentPanel } from './current-panel';
import {
  type Actor,
  assertOpen,
  findImport,
  type ImportCheck,
  type ImportDraft,
  type PanelMapping,
  toDraft,
} from './import-draft';
import { refuseUnreadable } from './refuse-unreadable';
import { assertRoomFor } from './storage-quota';

interface LoadedImport {
  readonly draft: ImportDraft;
  readonly name: string;
  readonly bytes: Buffer;
}

/** An uploaded file until it is committed: upload, choose how to read it, map and check, discard. */
export class ImportService {
  constructor(
    private readonly repositories: Repositories,
    private readonly parser: ParseProcess,
  ) {}

  /**
   * Keeps the file as it came, recognises how it is read and guesses which column is what.
   *
   * @throws {AppError} with the reader's reason; {Conflict} `quota` when the workspace keeps too much.
   */
  async upload(actor: Actor, name: string, bytes: Buffer): Promise<ImportDraft> {
    const preview = await refuseUnreadable(() =>
      this.parser.preview({ owner: actor.workspaceId, bytes, name }, null),
    );
    const id = randomUUID();
    const fileId = randomUUID();
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    const createdBy = actor.personId;
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      await tx.members.lockWorkspace();
      await assertRoomFor(tx, bytes.length);
      const file = { id: fileId, name, byteSize: bytes.length, sha256, content: bytes };
      await tx.files.insert({ ...file, createdBy });
      const mapping = guessedMapping(panelNameOf(name), preview);
      await tx.imports.insert({ id, fileId, preview, mapping, createdBy });
      await record(tx, actor.personId, 'file-uploaded', fileId, { byteSize: bytes.length, sha256 });
      return toDraft(await findImport(tx, id));
    });
  }

  /** @throws {NotFound} */
  async find(workspaceId: string, importId: string): Promise<ImportDraft> {
    return this.repositories.inWorkspace(workspaceId, async (tx) =>
      toDraft(await findImport(tx, importId)),
    );
  }

  /**
   * Reads the file another way: from there on the columns are chosen anew.
   *
   * @throws {Invalid} for a sheet or header that the file does not have; {Conflict} for an import that is not open.
   */
  async readAs(workspaceId: string, importId: string, reading: TableReading): Promise<ImportDraft> {
    const { draft, name, bytes } = await this.#loadOpen(workspaceId, importId);
    const preview = await refuseUnreadable(() =>
      this.parser.preview({ owner: workspaceId, bytes, name }, reading),
    );
    const mapping = guessedMapping(draft.mapping.panelName ?? panelNameOf(name), preview);
    return this.#keep(workspaceId, importId, (tx) =>
      tx.imports.saveReading(importId, preview, mapping),
    );
  }

  /**
   * Reads the whole file with the analyst's mapping and keeps what was found, row by row.
   *
   * @throws {Invalid} when a column is named twice or is not in the file; {Conflict} for an import that is not open.
   */
  async check(workspaceId: string, importId: string, mapping: PanelMapping): Promise<ImportDraft> {
    const { draft, name, bytes } = await this.#loadOpen(workspaceId, importId);
    const { reading } = mapping;
    const file = { owner: workspaceId, bytes, name };
    const preview = isDeepStrictEqual(reading, draft.preview.reading)
      ? draft.preview
      : await refuseUnreadable(() => this.parser.preview(file, reading));
    checkColumns(mapping, preview.headers);
    const current = await this.repositories.inWorkspace(workspaceId, (tx) =>
      currentPanel(tx, mapping.panelName),
    );
    const check = await refuseUnreadable(() =>
      this.parser.check(file, mapping, current?.block ?? null),
    );
    const found = { preview, mapping, check: withVersion(check, current) };
    return this.#keep(workspaceId, importId, (tx) => tx.imports.saveCheck(importId, found));
  }

  /** The imports that are not a panel version yet, newest first. */
  async listOpen(workspaceId: string): Promise<OpenImportRow[]> {
    return this.repositories.inWorkspace(workspaceId, (tx) => tx.imports.listOpen());
  }

  /** Takes back an import that is open, its file with it. @throws {NotFound}; {Conflict} for one that is not. */
  async discard(actor: Actor, importId: string): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const found = await tx.imports.findForUpdate(importId);
      if (found === undefined) throw new NotFound('There is no such import.');
      assertOpen(found);
      await tx.imports.remove(importId);
      await tx.files.remove(found.fileId);
      const { fileId, fileName } = found;
      await record(tx, actor.personId, 'import-discarded', fileId, { fileName });
    });
  }

  async #loadOpen(workspaceId: string, importId: string): Promise<LoadedImport> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const found = await findImport(tx, importId);
      assertOpen(found);
      const file = await tx.files.find(found.fileId);
      if (file === undefined) throw new NotFound();
      return { draft: toDraft(found), name: file.name, bytes: file.content };
    });
  }

  /** Keeps what was read, unless the import was committed or discarded meanwhile. */
  async #keep(
    workspaceId: string,
    importId: string,
    save: (tx: WorkspaceRepositories) => Promise<boolean>,
  ): Promise<ImportDraft> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const isKept = await save(tx);
      const found = await findImport(tx, importId);
      if (isKept) return toDraft(found);
      assertOpen(found);
      throw new Conflict('This import changed meanwhile. Load the page again.');
    });
  }
}

function guessedMapping(panelName: string, preview: FilePreview): Partial<PanelMapping> {
  return { panelName, ...preview.guess, reading: preview.reading };
}

function withVersion(check: FileCheck, current: CurrentPanel | undefined): ImportCheck {
  const { changes } = check;
  if (changes === null || current === undefined) return { ...check, changes: null };
  const { id, number } = current.version;
  return { ...check, changes: { ...changes, panelVersionId: id, number } };
}

/** The file's name without its ending, as a first name for the panel. */
function panelNameOf(fileName: string): string {
  const stem = fileName
    .replace(/\.\w+$/, '')
    .replaceAll(/[_-]+/g, ' ')
    .trim();
  return stem === '' ? 'Panel' : beginningOf(stem, 120);
}
