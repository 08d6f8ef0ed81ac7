import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerOptions } from 'smtp-server';
import { SmtpSender } from './smtp-sender';

const letter = {
  subject: 'Edition 3',
  paragraphs: ['Ana published edition 3.'],
  link: { words: 'Open edition 3', address: 'https://kinvale.example/board/x' },
  closing: [],
};
const to = 'cfo@velmara.example';

/** Sends to a server with these settings. */
async function sendTo(options: SMTPServerOptions, host: string, account = '', address = to) {
  const server = new SMTPServer({ logger: false, disableReverseLookup: true, ...options });
  const listening = server.listen({ port: 0, host, exclusive: true });
  await once(listening, 'listening');
  const { port } = listening.address() as AddressInfo;
  const url = `smtp://${account}${host}:${port}`;
  const sender = new SmtpSender({ url, from: 'kinvale@velmara.example', silenceMs: 2000 });
  try {
    return await sender.send('an-id', address, letter);
  } finally {
    sender.close();
    await new Promise<void>((resolve) => {
      server.close(resolve);
    });
  }
}

const plain: SMTPServerOptions = { disabledCommands: ['AUTH', 'STARTTLS'] };

describe('the sender of mail', () => {
  it('keeps a mail waiting where our sign-in to the mail server fails: nothing is said of the mail', async () => {
    const refused = { responseCode: 535, message: 'Not this password.' };
    const reception = await sendTo(
      {
        disabledCommands: ['STARTTLS'],
        allowInsecureAuth: true,
        onAuth: (_, _session, answer) => {
          answer(Object.assign(new Error(refused.message), refused));
        },
      },
      '127.0.0.1',
      'kinvale:wrong@',
    );
    expect(reception).toEqual({ kind: 'delayed', words: '535 Not this password.' });
    const unauthenticated = await sendTo(
      { disabledCommands: ['STARTTLS'], allowInsecureAuth: true },
      '127.0.0.1',
    );
    expect(unauthenticated.kind).toBe('delayed');
  });

  it('says nothing in clear to a mail server on another machine', async () => {
    let said = 0;
    const listening = { ...plain, onMailFrom: () => said++ };
    const reception = await sendTo(listening, '127.0.0.2');
    expect(reception.kind).toBe('delayed');
    expect(said).toBe(0);
    expect(await sendTo(plain, '127.0.0.1')).toEqual({ kind: 'taken' });
  });

  it('refuses by itself what is no address', async () => {
    const reception = await sendTo(plain, '127.0.0.1', '', 'cfo@velmara.example>\r\nRCPT TO:<x');
    expect(reception.kind).toBe('refused');
  });

  it('does not outlive the server that it belongs to', async () => {
    const server = new SMTPServer({ logger: false, onConnect: () => undefined });
    const listening = server.listen({ port: 0, host: '127.0.0.1', exclusive: true });
    await once(listening, 'listening');
    const { port } = listening.address() as AddressInfo;
    const url = `smtp://127.0.0.1:${port}`;
    const sender = new SmtpSender({ url, from: 'kinvale@velmara.example' });
    const connected = once(listening, 'connection');
    const reception = sender.send('an-id', to, letter);
    await connected;
    sender.close();
    expect((await reception).kind).toBe('delayed');
    server.close();
  });
});
