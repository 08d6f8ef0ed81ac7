import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface JobTicketRow {
  readonly id: string;
  readonly workspaceId: string;
  readonly kind: string;
  readonly subjectId: string;
}

/** Tickets that queued jobs name; over all workspaces, since a worker learns the workspace from the ticket. */
export class JobTicketsRepository {
  constructor(private readonly db: Kysely<Database>) {}

  async insert(ticket: JobTicketRow): Promise<void> {
    await this.db.insertInto('jobTicket').values(ticket).execute();
  }

  async remove(id: string): Promise<void> {
    await this.db.deleteFrom('jobTicket').where('id', '=', id).execute();
  }

  find(id: string): Promise<JobTicketRow | undefined> {
    return this.db
      .selectFrom('jobTicket')
      .select(['id', 'workspaceId', 'kind', 'subjectId'])
      .where('id', '=', id)
      .executeTakeFirst();
  }
}
