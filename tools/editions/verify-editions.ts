import pg from 'pg';
import { contentHash } from '../../backend/board/content-hash';
import { faultOf } from '../../backend/board/edition-desk-service';

interface StoredEdition {
  readonly workspace: string;
  readonly number: number;
  readonly state: 'waiting' | 'signed' | 'returned' | 'superseded';
  readonly content: string;
  readonly sha256: string;
  readonly published: string | null;
  readonly signed: string | null;
}

export interface VerifiedEdition {
  readonly workspace: string;
  readonly number: number;
  readonly state: string;
  readonly sha256: string;
  /** What is wrong with it, in words; null where nothing is. */
  readonly fault: string | null;
}

/**
 * Holds editions to the hashes recorded when they were published and signed.
 *
 * @param databaseUrl  of a role that row level security does not hold back; others see no workspace.
 * @param only  an edition's number; undefined for all.
 */
export async function verifyEditions(
  databaseUrl: string,
  only: number | undefined,
): Promise<readonly VerifiedEdition[]> {
  const client = new pg.Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    const recorded = (action: string): string => `(
      select detail ->> 'sha256' from activity
      where activity.workspace_id = edition.workspace_id and subject_id = edition.id::text
        and action = '${action}'
      order by at desc limit 1)`;
    const { rows } = await client.query<StoredEdition>(
      `select workspace.name as workspace, edition.number, edition.state, edition.content, edition.sha256,
         ${recorded('edition-published')} as published, ${recorded('edition-signed')} as signed
       from edition join workspace using (workspace_id)
       where $1::integer is null or edition.number = $1
       order by workspace.name, edition.number`,
      [only ?? null],
    );
    return rows.map(({ workspace, number, state, content, sha256, published, signed }) => {
      const hashes = { computed: contentHash(content), stored: sha256, published, signed };
      return { workspace, number, state, sha256, fault: faultOf({ number, state }, hashes) };
    });
  } finally {
    await client.end();
  }
}
