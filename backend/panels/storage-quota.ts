import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import { Conflict, TooManyRequests } from '../errors/app-error';

const gigabyte = 1024 ** 3;

/** What a workspace may keep and have under way. */
export const quota = { bytes: 2 * gigabyte, files: 500, committing: 3 } as const;

const retryAfterSeconds = 10;

/**
 * Within a transaction that has locked the workspace.
 *
 * @throws {Conflict} `quota` when the file would be one too many, or its bytes too many.
 */
export async function assertRoomFor(tx: WorkspaceRepositories, byteSize: number): Promise<void> {
  const { files, bytes } = await tx.files.usage();
  if (files >= quota.files)
    throw new Conflict(
      `This workspace keeps ${files} files, and ${quota.files} is the most. Discard imports that are not needed.`,
      'quota',
    );
  if (bytes + byteSize > quota.bytes)
    throw new Conflict(
      `The files of this workspace take ${gigabytes(bytes)} GB, and with this one they would take more than ${gigabytes(quota.bytes)} GB. Discard imports that are not needed.`,
      'quota',
    );
}

/**
 * Within a transaction that has locked the workspace.
 *
 * @throws {TooManyRequests} `quota` while as many imports as are taken at once are being committed.
 */
export async function assertFewCommitting(tx: WorkspaceRepositories): Promise<void> {
  if ((await tx.imports.committing()) >= quota.committing)
    throw new TooManyRequests(
      `${quota.committing} imports of this workspace are being made panel versions. Wait for one to end, or cancel one.`,
      retryAfterSeconds,
      'quota',
    );
}

function gigabytes(bytes: number): string {
  return (bytes / gigabyte).toFixed(2).replace(/\.?0+$/, '');
}
