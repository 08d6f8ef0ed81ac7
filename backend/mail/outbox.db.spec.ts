import { randomUUID } from 'node:crypto';
import { eventually } from '../../db/testing/eventually';
import type { CapturedMail } from '../../stubs/smtp/mailbox';
import { noFaults } from '../../stubs/smtp/faults';
import { SmtpStubClient } from '../../stubs/smtp/testing/stub-client';
import { JobBench } from '../jobs/testing/job-bench';
import { Outbox } from './outbox';
import { MailServer } from './testing/mail-server';

describe('the outbox', () => {
  let bench: JobBench;
  let stub: SmtpStubClient;
  let outbox: Outbox;
  let server: MailServer;
  let hurry: NodeJS.Timeout;

  beforeAll(async () => {
    bench = await JobBench.open();
    stub = await SmtpStubClient.start();
    outbox = new Outbox(bench.queue);
    server = await MailServer.start(bench, stub.smtpUrl);
    // The queue's pauses between tries are seconds; nobody needs to wait for them here.
    hurry = setInterval(() => {
      void bench.pool.query(`update pgboss.job set start_after = now() where state = 'retry'`);
    }, 100);
  });

  afterEach(() => stub.fail(noFaults));

  afterAll(async () => {
    clearInterval(hurry);
    await server.stop();
    await bench.close();
    await stub.stop();
  });

  const someone = (): string => `${randomUUID()}@velmara.example`;

  const post = (recipients: readonly string[], editionId = randomUUID(), by = 'Ana') =>
    bench.repositories.inWorkspace(bench.workspaceId, (tx) =>
      outbox.post(tx, {
        eventKey: `edition-waiting:${editionId}`,
        letter: 'edition-waiting',
        detail: { editionId, number: 3, by },
        recipients,
      }),
    );

  interface KeptMail {
    readonly id: string;
    readonly state: string;
    readonly attempts: number;
    readonly lastError: string | null;
    readonly waits: boolean;
  }

  /** As it stands in the tables, walls aside. */
  const kept = (recipient: string): Promise<readonly KeptMail[]> =>
    bench.repositories.inWorkspace(bench.workspaceId, async (tx) => {
      const { rows } = await tx.executeSql(
        `select id, state, attempts, last_error, exists
            (select from mail_due where mail_id = mail.id) as waits
          from mail where recipient = $1`,
        [recipient],
      );
      return rows as KeptMail[];
    });

  const settled = (recipient: string): Promise<KeptMail> =>
    eventually('a mail that no longer waits', async () => {
      const [mail] = await kept(recipient);
      return mail.state === 'waiting' ? undefined : mail;
    });

  const delayed = (recipient: string): Promise<KeptMail> =>
    eventually('a mail that was put off', async () => {
      const [mail] = await kept(recipient);
      return mail.lastError === null ? undefined : mail;
    });

  it('sends a mail once, however often the same event is told', async () => {
    const [to, editionId] = [someone(), randomUUID()];
    await post([to], editionId);
    await Promise.all([post([to], editionId), post([to], editionId)]);
    const { state, attempts, waits, id } = await settled(to);
    expect([state, attempts, waits]).toEqual(['sent', 1, false]);
    expect((await kept(to)).length).toBe(1);
    const [mail, ...others] = await stub.mailsTo(to);
    expect(others).toEqual([]);
    expect(mail.messageId).toBe(`<${id}@velmara.example>`);
    expect(mail.subject).toBe('Edition 3 waits for your decision (W)');
    expect(mail.from).toBe('"Kinvale" <kinvale@velmara.example>');
    expect(mail.text).toContain(`https://kinvale.example/board/${editionId}`);
    expect(mail.html).toContain(`href="https://kinvale.example/board/${editionId}"`);
  });

  it('sends each person a mail of their own, and one for each edition', async () => {
    const [first, second] = [someone(), someone()];
    await post([first, second]);
    await post([first]);
    await settled(second);
    const mails = await eventually('two mails', async () => {
      const found = await stub.mailsTo(first);
      return found.length === 2 ? found : undefined;
    });
    expect(mails.map(({ recipients }) => recipients)).toEqual([[first], [first]]);
    expect((await stub.mailsTo(second)).length).toBe(1);
  });

  it('holds no mail whose transaction was rolled back', async () => {
    const to = someone();
    const rolledBack = bench.repositories.inWorkspace(bench.workspaceId, async (tx) => {
      await tx.mail.insert(
        { id: randomUUID(), eventKey: 'x', recipient: to, template: 'edition-waiting', detail: {} },
        60,
      );
      throw new Error('rolled back');
    });
    await expectAsync(rolledBack).toBeRejectedWithError('rolled back');
    expect(await kept(to)).toEqual([]);
  });

  it('tries again after a greylisting, and sends once', async () => {
    const to = someone();
    await stub.fail({ greylist: 2 });
    await post([to]);
    const { state, attempts, lastError } = await settled(to);
    expect([state, attempts, lastError]).toEqual(['sent', 3, null]);
    expect((await stub.mailsTo(to)).length).toBe(1);
  });

  it('gives a mail up that the server refuses for good, in the server’s words', async () => {
    const to = someone();
    await stub.fail({ refused: [to] });
    await post([to]);
    const { id, state, attempts, lastError, waits } = await settled(to);
    expect([state, attempts, waits]).toEqual(['refused', 1, false]);
    expect(lastError).toBe('550 5.1.1 There is no such mailbox here.');
    await eventually('word of it', () => server.refusals.has(id));
    expect(server.refusals.get(id)).toBe(lastError ?? '');
  });

  it('waits while nobody listens at the mail server', async () => {
    const to = someone();
    await stub.fail({ refusesConnections: true });
    await post([to]);
    expect((await delayed(to)).lastError).toContain('ECONNREFUSED');
    await stub.fail({ refusesConnections: false });
    expect((await settled(to)).state).toBe('sent');
    expect((await stub.mailsTo(to)).length).toBe(1);
  });

  it('sends a mail again under the same id where the server took it and did not say so', async () => {
    const to = someone();
    await stub.fail({ hangs: 'after-taking' });
    await post([to]);
    await delayed(to);
    await stub.fail({ hangs: 'never' });
    expect((await settled(to)).state).toBe('sent');
    const mails = await stub.mailsTo(to);
    expect(mails.length).toBeGreaterThan(1);
    expect(new Set(mails.map(({ messageId }) => messageId)).size).toBe(1);
  });

  it('leaves the line of a name a line: no header comes from it', async () => {
    const [to, other] = [someone(), someone()];
    await post([to], randomUUID(), `Ana\r\nBcc: ${other}\r\n\r\n<b>`);
    await settled(to);
    const [mail] = await stub.mailsTo(to);
    expect(mail.recipients).toEqual([to]);
    expect(mail.source).not.toMatch(/^bcc/im);
    expect(mail.text).toContain(`Ana Bcc: ${other} <b> published edition 3`);
    expect(mail.html).toContain('&lt;b&gt; published edition 3');
  });

  describe('that another server takes over', () => {
    beforeAll(() => server.stop());

    afterAll(async () => {
      server = await MailServer.start(bench, stub.smtpUrl);
    });

    async function sentAfterwards(
      to: string,
      before?: () => Promise<void>,
    ): Promise<CapturedMail[]> {
      const next = await MailServer.start(bench, stub.smtpUrl);
      try {
        await before?.();
        expect((await settled(to)).state).toBe('sent');
        return [...(await stub.mailsTo(to))];
      } finally {
        await next.stop();
      }
    }

    it('sends once what the first was stopped at', async () => {
      const to = someone();
      await stub.fail({ hangs: 'at-greeting' });
      const first = await MailServer.start(bench, stub.smtpUrl);
      await post([to]);
      await eventually('a try under way', async () => (await kept(to))[0].attempts > 0);
      await first.stop();
      expect((await kept(to))[0]).toEqual(jasmine.objectContaining({ state: 'waiting' }));
      await stub.fail({ hangs: 'never' });
      expect((await sentAfterwards(to)).length).toBe(1);
    });

    it('finds what a job was lost of, in the round', async () => {
      const [to, held, fresh] = [someone(), someone(), someone()];
      await post([to]);
      await post([held]);
      await post([fresh]);
      const ids = await Promise.all([to, held, fresh].map(async (at) => (await kept(at))[0].id));
      const lost = await bench.pool.query(
        `update pgboss.job set state = 'cancelled' where singleton_key = any($1)`,
        [ids],
      );
      expect(lost.rowCount).toBe(3);
      await bench.pool.query(
        `update mail_due set due_at = now() - interval '1 second',
            held_until = case when mail_id = $2 then now() + interval '1 minute'
              else now() - interval '1 second' end
          where mail_id in ($1, $2)`,
        ids.slice(0, 2),
      );
      // The queue takes the same job for the same mail once in half a minute.
      await bench.pool.query(
        `update pgboss.job set singleton_on = singleton_on - interval '1 hour' where name = 'mail'`,
      );
      const round = async (): Promise<void> => {
        await server.round.run();
        await server.round.run();
      };
      expect((await sentAfterwards(to, round)).length).toBe(1);
      for (const other of [held, fresh])
        expect((await kept(other))[0]).toEqual(
          jasmine.objectContaining({ state: 'waiting', attempts: 0 }),
        );
    });

    it('is given to one of two servers, and to no other workspace', async () => {
      const to = someone();
      await post([to]);
      const [{ id }] = await kept(to);
      const take = (workspaceId = bench.workspaceId) =>
        bench.repositories.inWorkspace(workspaceId, (tx) => tx.mail.take(id, 60));
      const elsewhere = randomUUID();
      expect(await take(elsewhere)).toBeUndefined();
      await bench.repositories.inWorkspace(elsewhere, (tx) => tx.mail.settle(id, { kind: 'sent' }));
      const both = await Promise.all([take(), take()]);
      expect(both.filter((mail) => mail !== undefined).length).toBe(1);
      expect(both.find((mail) => mail !== undefined)?.recipient).toBe(to);
    });
  });
});
