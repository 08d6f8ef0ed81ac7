import { createHash, randomUUID } from 'node:crypto';
import type { ImportRow } from '../../db/repositories/imports-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import type { ColumnChoice, FileCheck, FilePreview, FileRows } from '../compute/parse-messages';
import { type ParseProcess, ParseRefused } from '../compute/parse-process';
import { AppError, Conflict, Invalid, NotFound, Unprocessable } from '../errors/app-error';

/** What the analyst says of a file. */
export interface PanelMapping extends ColumnChoice {
  readonly panelName: string;
  readonly currency: string;
  readonly unit: 'units' | 'thousands' | 'millions' | 'billions';
}

export interface ImportDraft {
  readonly id: string;
  readonly fileName: string;
  readonly byteSize: number;
  readonly state: 'mapped' | 'checked' | 'committed';
  readonly preview: FilePreview;
  readonly mapping: Partial<PanelMapping>;
  readonly check: FileCheck | null;
  readonly panelVersionId: string | null;
}

export interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

/** From an uploaded file to a panel version: upload, map and check, commit. */
export class ImportService {
  constructor(
    private readonly repositories: Repositories,
    private readonly parser: ParseProcess,
  ) {}

  /**
   * Keeps the file as it came and guesses which column is what.
   *
   * @throws {Unprocessable} `unreadable-file` with the reader's reason.
   */
  async upload(actor: Actor, name: string, bytes: Buffer): Promise<ImportDraft> {
    const preview = await refuseUnreadable(() => this.parser.preview(bytes));
    const id = randomUUID();
    const fileId = randomUUID();
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const sha256 = createHash('sha256').update(bytes).digest('hex');
      const file = { id: fileId, name, byteSize: bytes.length, sha256, content: bytes };
      await tx.files.insert({ ...file, createdBy: actor.personId });
      const mapping = { panelName: panelNameOf(name), ...preview.guess };
      await tx.imports.insert({ id, fileId, preview, mapping, createdBy: actor.personId });
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
   * Reads the whole file with the analyst's mapping and keeps what was found, row by row.
   *
   * @throws {Invalid} when a column is named twice or is not in the file; {Conflict} when committed already.
   */
  async check(workspaceId: string, importId: string, mapping: PanelMapping): Promise<ImportDraft> {
    const { draft, bytes } = await this.#load(workspaceId, importId);
    if (draft.state === 'committed') throw new Conflict('This import is a panel version already.');
    assertColumns(mapping, draft.preview.headers);
    const check = await refuseUnreadable(() => this.parser.check(bytes, mapping));
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      await tx.imports.saveCheck(importId, mapping, check);
      return toDraft(await findImport(tx, importId));
    });
  }

  /**
   * Makes the panel version, all of it or none; a second call answers with the same version.
   *
   * @throws {Unprocessable} `import-not-ready` while the check has findings that block.
   */
  async commit(actor: Actor, importId: string, note: string): Promise<string> {
    const { draft, bytes } = await this.#load(actor.workspaceId, importId);
    if (draft.panelVersionId !== null) return draft.panelVersionId;
    const { mapping, check } = readyDraft(draft);
    const rows = await refuseUnreadable(() => this.parser.read(bytes, mapping));
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      await tx.members.lockWorkspace();
      const current = await tx.imports.findForUpdate(importId);
      if (current === undefined) throw new NotFound();
      if (current.panelVersionId !== null) return current.panelVersionId;
      const versionId = await storeVersion(tx, {
        actor,
        fileId: current.fileId,
        mapping,
        check,
        rows,
        note,
      });
      await tx.imports.markCommitted(importId, versionId);
      await record(tx, actor.personId, 'panel-committed', versionId, { rows: check.rows });
      return versionId;
    });
  }

  /** Takes back an import that is not committed, its file with it. */
  async discard(workspaceId: string, importId: string): Promise<void> {
    await this.repositories.inWorkspace(workspaceId, async (tx) => {
      const found = await tx.imports.findForUpdate(importId);
      if (found === undefined) throw new NotFound('There is no such import.');
      if (found.state === 'committed')
        throw new Conflict('This import is a panel version already; it stays.');
      await tx.imports.remove(importId);
      await tx.files.remove(found.fileId);
    });
  }

  async #load(
    workspaceId: string,
    importId: string,
  ): Promise<{ readonly draft: ImportDraft; readonly bytes: Buffer }> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const found = await findImport(tx, importId);
      const file = await tx.files.find(found.fileId);
      if (file === undefined) throw new NotFound();
      return { draft: toDraft(found), bytes: file.content };
    });
  }
}

async function storeVersion(
  tx: WorkspaceRepositories,
  from: {
    readonly actor: Actor;
    readonly fileId: string;
    readonly mapping: PanelMapping;
    readonly check: FileCheck;
    readonly rows: FileRows;
    readonly note: string;
  },
): Promise<string> {
  const { mapping, check } = from;
  const parent = await tx.panels.findLatestByName(mapping.panelName);
  const panelId = parent?.panelId ?? randomUUID();
  if (parent === undefined) await tx.panels.insertPanel(panelId, mapping.panelName);
  const id = randomUUID();
  await tx.panels.insertVersion({
    id,
    panelId,
    number: (parent?.number ?? 0) + 1,
    parentId: parent?.id ?? null,
    fileId: from.fileId,
    currency: mapping.currency,
    unit: mapping.unit,
    companyHeader: mapping.company,
    yearHeader: mapping.year,
    columns: [
      { name: mapping.marketValue, role: 'marketValue' },
      { name: mapping.capex, role: 'capex' },
      { name: mapping.bookEquity, role: 'bookEquity' },
      ...mapping.others.map((name) => ({ name, role: 'other' as const })),
    ],
    note: from.note,
    companies: check.companies,
    rowCount: check.rows,
    firstYear: check.firstYear ?? 0,
    lastYear: check.lastYear ?? 0,
    createdBy: from.actor.personId,
  });
  await tx.panels.insertRows(id, from.rows);
  return id;
}

async function findImport(tx: WorkspaceRepositories, importId: string): Promise<ImportRow> {
  const found = await tx.imports.find(importId);
  if (found === undefined) throw new NotFound('There is no such import.');
  return found;
}

function toDraft(row: ImportRow): ImportDraft {
  return {
    id: row.id,
    fileName: row.fileName,
    byteSize: row.byteSize,
    state: row.state,
    preview: row.preview as FilePreview,
    mapping: row.mapping,
    check: row.findings as FileCheck | null,
    panelVersionId: row.panelVersionId,
  };
}

function readyDraft(draft: ImportDraft): {
  readonly mapping: PanelMapping;
  readonly check: FileCheck;
} {
  if (draft.check === null)
    throw new Unprocessable('Check the columns before committing.', 'import-not-ready');
  if (draft.check.blockingCount > 0)
    throw new Unprocessable(
      `${draft.check.blockingCount} findings keep this file from becoming a panel. Mend the file and choose it again.`,
      'import-not-ready',
    );
  if (draft.check.rows === 0)
    throw new Unprocessable('The file has a header and no rows.', 'import-not-ready');
  return { mapping: draft.mapping as PanelMapping, check: draft.check };
}

function assertColumns(mapping: PanelMapping, headers: readonly string[]): void {
  const named: readonly (readonly [string, string])[] = [
    ['/company', mapping.company],
    ['/year', mapping.year],
    ['/marketValue', mapping.marketValue],
    ['/capex', mapping.capex],
    ['/bookEquity', mapping.bookEquity],
    ...mapping.others.map((name, index) => [`/others/${index}`, name] as const),
  ];
  const errors = named.flatMap(([pointer, name], index) => {
    if (!headers.includes(name))
      return [{ pointer, detail: `expected a column of the file; found “${name}”` }];
    const isTwice = named.findIndex(([, other]) => other === name) !== index;
    return isTwice ? [{ pointer, detail: `“${name}” is chosen for two things` }] : [];
  });
  if (errors.length > 0) throw new Invalid('The choice of columns does not fit the file.', errors);
}

/** The file's name without its ending, as a first name for the panel. */
function panelNameOf(fileName: string): string {
  const stem = fileName
    .replace(/\.\w+$/, '')
    .replaceAll(/[_-]+/g, ' ')
    .trim();
  return stem === '' ? 'Panel' : stem.slice(0, 120);
}

async function refuseUnreadable<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof ParseRefused)) throw error;
    if (error.code === 'table-too-large') throw new AppError('too-large', 413, error.message);
    throw new Unprocessable(error.message, 'unreadable-file', { code: error.code });
  }
}
