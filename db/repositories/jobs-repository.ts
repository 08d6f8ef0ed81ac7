import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';

export interface JobTicketRow {
  readonly id: string;
  readonly workspaceId: string;
  readonly kind: string;
  readonly subjectId: string;
}

/** A ticket whose server has fallen silent, with the queue package's id of the job. */
export interface SilentTicketRow extends JobTicketRow {
  readonly jobId: string;
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

  /** Says that the job is being worked; by the database's clock, since servers' may differ. */
  async beat(id: string, jobId: string): Promise<void> {
    await this.db
      .updateTable('jobTicket')
      .set({ jobId, heartbeatAt: sql`now()` })
      .where('id', '=', id)
      .execute();
  }

  /** Says that nobody works the job any more. */
  async rest(id: string): Promise<void> {
    await this.db
      .updateTable('jobTicket')
      .set({ heartbeatAt: null })
      .where('id', '=', id)
      .execute();
  }

  /**
   * Takes the tickets of these kinds that nobody has spoken of for a while; each is given to one caller alone, who lets it
   * `rest` when done with it. Where the caller fails, the ticket falls silent again.
   *
   * @param except  tickets that the caller works itself.
   */
  async takeSilent(
    kinds: readonly string[],
    seconds: number,
    except: readonly string[] = [],
  ): Promise<SilentTicketRow[]> {
    if (kinds.length === 0) return [];
    const taken = await this.db
      .updateTable('jobTicket')
      .set({ heartbeatAt: sql`now()` })
      .where('kind', 'in', kinds)
      .where('heartbeatAt', '<', secondsAgo(seconds))
      .$if(except.length > 0, (query) => query.where('id', 'not in', except))
      .returning(['id', 'workspaceId', 'kind', 'subjectId', 'jobId'])
      .execute();
    return taken.flatMap((row) => (row.jobId === null ? [] : [{ ...row, jobId: row.jobId }]));
  }

  /**
   * Beats once for each job that the queue package gave out a while ago and nobody spoke of, as when its server died at
   * once: if it stays silent, it is taken back like any other.
   *
   * @param queueSchema  where the queue package keeps its jobs.
   */
  async beatForUnspoken(
    queueSchema: string,
    kinds: readonly string[],
    seconds: number,
  ): Promise<void> {
    const { rows } = await sql<{ jobId: string; ticketId: string }>`
      select id as job_id, data ->> 'ticketId' as ticket_id from ${sql.table(`${queueSchema}.job`)}
      where name = any(${kinds}) and state = 'active' and started_on < ${secondsAgo(seconds)}
        and data ->> 'ticketId' ~ '^[0-9a-f-]{36}$'`.execute(this.db);
    for (const { jobId, ticketId } of rows)
      await this.db
        .updateTable('jobTicket')
        .set({ jobId, heartbeatAt: sql`now()` })
        .where('id', '=', ticketId)
        .where('heartbeatAt', 'is', null)
        .execute();
  }
}

function secondsAgo(seconds: number) {
  return sql<Date>`now() - make_interval(secs => ${seconds})`;
}
