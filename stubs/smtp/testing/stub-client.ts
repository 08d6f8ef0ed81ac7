import type { Faults } from '../faults';
import type { CapturedMail } from '../mailbox';
import { type SmtpStub, startSmtpStub } from '../smtp-stub';

/** A stub on free ports, and its JSON interface as a spec uses it. */
export class SmtpStubClient {
  private constructor(private readonly stub: SmtpStub) {}

  static async start(): Promise<SmtpStubClient> {
    return new SmtpStubClient(await startSmtpStub({ smtp: 0, page: 0 }));
  }

  get smtpUrl(): string {
    return this.stub.smtpUrl;
  }

  get pageUrl(): string {
    return this.stub.pageUrl;
  }

  async mailsTo(address: string): Promise<readonly CapturedMail[]> {
    const reply = await fetch(`${this.pageUrl}/api/mails?to=${encodeURIComponent(address)}`);
    return ((await reply.json()) as { mails: CapturedMail[] }).mails;
  }

  async fail(faults: Partial<Faults>): Promise<void> {
    const reply = await fetch(`${this.pageUrl}/api/faults`, {
      method: 'PUT',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(faults),
    });
    if (!reply.ok) throw new Error(`the stub answered ${await reply.text()}`);
  }

  stop(): Promise<void> {
    return this.stub.stop();
  }
}
