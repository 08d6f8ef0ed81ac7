import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createMailApp } from './mail-app';
import { Mailbox } from './mailbox';
import { SmtpListener } from './smtp-listener';

export interface SmtpStub {
  /** Where mail is sent to. */
  readonly smtpUrl: string;
  /** Where what was sent is read. */
  readonly pageUrl: string;
  stop(): Promise<void>;
}

/** A mail server that keeps what it takes, and the pages to read it; both on 127.0.0.1, port 0 for a free one. */
export async function startSmtpStub(ports: {
  readonly smtp: number;
  readonly page: number;
}): Promise<SmtpStub> {
  const mailbox = new Mailbox();
  const listener = new SmtpListener(mailbox);
  await listener.listen(ports.smtp);
  const pages = createServer(createMailApp(mailbox, listener));
  pages.listen({ port: ports.page, host: '127.0.0.1', exclusive: true });
  await once(pages, 'listening');
  return {
    smtpUrl: listener.url,
    pageUrl: `http://127.0.0.1:${(pages.address() as AddressInfo).port}`,
    stop: async () => {
      await listener.close();
      pages.close();
      pages.closeAllConnections();
      await once(pages, 'close');
    },
  };
}
