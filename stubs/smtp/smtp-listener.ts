import { once } from 'node:events';
import type { AddressInfo, Socket } from 'node:net';
import { buffer } from 'node:stream/consumers';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import { changedFaults, type Faults, noFaults } from './faults';
import type { Mailbox } from './mailbox';
import { readMail } from './read-mail';

type Answer = (error?: Error | null) => void;

/** The mail server of the stub: takes everything, unless it was told to fail. */
export class SmtpListener {
  #server: SMTPServer | undefined;
  readonly #sockets = new Set<Socket>();
  #faults = noFaults;
  #port = 0;

  constructor(private readonly mailbox: Mailbox) {}

  get faults(): Faults {
    return this.#faults;
  }

  get url(): string {
    return `smtp://127.0.0.1:${this.#port}`;
  }

  /** @param port  on 127.0.0.1; 0 takes a free one. */
  async listen(port: number): Promise<void> {
    const server = new SMTPServer({
      logger: false,
      disableReverseLookup: true,
      disabledCommands: ['AUTH', 'STARTTLS'],
      onConnect: (_, answer) => {
        if (this.#faults.hangs !== 'at-greeting') answer();
      },
      onRcptTo: ({ address }, _, answer) => {
        this.#judge(address, answer);
      },
      onData: (stream, session, answer) => {
        this.#take(stream, session).then(
          () => {
            if (this.#faults.hangs !== 'after-taking') answer();
          },
          (error: unknown) => {
            answer(error instanceof Error ? error : new Error(String(error)));
          },
        );
      },
    });
    // A client that leaves in the middle of the dialogue is no failure of the stub.
    server.on('error', (error: NodeJS.ErrnoException) => {
      if (error.code !== 'ECONNRESET' && error.code !== 'EPIPE') console.error(error);
    });
    server.server.on('connection', (socket: Socket) => {
      this.#sockets.add(socket);
      socket.once('close', () => this.#sockets.delete(socket));
    });
    // Exclusive: spec processes that run at once would share one port.
    const listening = server.listen({ port, host: '127.0.0.1', exclusive: true });
    await once(listening, 'listening');
    this.#port = (listening.address() as AddressInfo).port;
    this.#server = server;
  }

  async close(): Promise<void> {
    const server = this.#server;
    if (server === undefined) return;
    this.#server = undefined;
    const closed = new Promise<void>((resolve) => {
      server.close(resolve);
    });
    for (const socket of this.#sockets) socket.destroy();
    await closed;
  }

  /** @throws {TypeError} for changes that are none. */
  async change(changes: unknown): Promise<void> {
    this.#faults = changedFaults(this.#faults, changes);
    if (this.#faults.refusesConnections) await this.close();
    else if (this.#server === undefined) await this.listen(this.#port);
  }

  #judge(address: string, answer: Answer): void {
    const { greylist, refused } = this.#faults;
    if (refused.some((other) => other.toLowerCase() === address.toLowerCase())) {
      answer(refusal(550, '5.1.1 There is no such mailbox here.'));
    } else if (greylist > 0) {
      this.#faults = { ...this.#faults, greylist: greylist - 1 };
      answer(refusal(451, '4.7.1 Greylisted: try again later.'));
    } else answer();
  }

  async #take(stream: SMTPServerDataStream, { envelope }: SMTPServerSession): Promise<void> {
    const source = await buffer(stream);
    this.mailbox.add({
      ...(await readMail(source)),
      sender: envelope.mailFrom === false ? '' : envelope.mailFrom.address,
      recipients: envelope.rcptTo.map(({ address }) => address),
      source: source.toString('latin1'),
    });
  }
}

function refusal(responseCode: number, words: string): Error {
  return Object.assign(new Error(words), { responseCode });
}
