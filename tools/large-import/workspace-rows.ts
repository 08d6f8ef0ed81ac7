import pg from 'pg';

/** What lies in the database of imported panels, past every wall. */
export interface KeptRows {
  readonly panels: number;
  readonly versions: number;
  readonly rows: number;
  readonly companies: number;
}

/** Counts them in all workspaces together, as the owner of the database. */
export async function countKept(): Promise<KeptRows> {
  const connectionString = process.env['KINVALE_ADMIN_URL'];
  if (connectionString === undefined) throw new Error('expected KINVALE_ADMIN_URL from the stack');
  const client = new pg.Client({ connectionString });
  await client.connect();
  try {
    const found = await client.query<KeptRows>(`select
      (select count(*)::integer from panel) as panels,
      (select count(*)::integer from panel_version) as versions,
      (select count(*)::integer from panel_row) as rows,
      (select count(*)::integer from panel_company) as companies`);
    return found.rows[0];
  } finally {
    await client.end();
  }
}
