import { createTransport } from 'nodemailer';
import { type Letter, letterHtml, letterText } from './letter';

export interface SmtpSettings {
  /** `smtps://` is TLS from the start; `smtp://` turns to TLS before anything is said, except on this machine. */
  readonly url: string;
  /** Address that mail comes from. */
  readonly from: string;
  /** Longest silence of the mail server, in milliseconds. */
  readonly silenceMs?: number;
}

/** What the mail server made of a message, in its own words where it said no. */
export type Reception =
  | { readonly kind: 'taken' }
  | { readonly kind: 'refused'; readonly words: string }
  | { readonly kind: 'delayed'; readonly words: string };

/** Longest time for one message, however often the server says a byte. */
export const longestSendMs = 60_000;

const usualSilenceMs = 15_000;
const longestWords = 500;
const thisMachine = new Set(['127.0.0.1', 'localhost', '[::1]']);

/** Sends over one connection, which stays open for a while for the next message. */
export class SmtpSender {
  readonly #transport;
  readonly #closing = new AbortController();

  constructor(private readonly settings: SmtpSettings) {
    const silenceMs = settings.silenceMs ?? usualSilenceMs;
    const { hostname } = new URL(settings.url);
    this.#transport = createTransport({
      url: settings.url,
      pool: true,
      maxConnections: 1,
      maxRequeues: 1,
      idleTimeout: 30_000,
      requireTLS: !thisMachine.has(hostname),
      dnsTimeout: silenceMs,
      connectionTimeout: silenceMs,
      greetingTimeout: silenceMs,
      socketTimeout: silenceMs,
      disableFileAccess: true,
      disableUrlAccess: true,
    });
  }

  /**
   * @param id  makes the Message-ID: a mail that had to be sent twice can be told from two mails.
   * @param to  one address.
   */
  async send(id: string, to: string, letter: Letter): Promise<Reception> {
    const { from } = this.settings;
    const signal = AbortSignal.any([this.#closing.signal, AbortSignal.timeout(longestSendMs)]);
    try {
      await this.#transport.sendMail({
        from: { name: 'Kinvale', address: from },
        to: { name: '', address: to },
        envelope: { from, to: [to] },
        messageId: `<${id}@${from.slice(from.lastIndexOf('@') + 1)}>`,
        subject: letter.subject,
        text: letterText(letter),
        html: letterHtml(letter),
        headers: { 'Auto-Submitted': 'auto-generated' },
        signal,
      });
      return { kind: 'taken' };
    } catch (error) {
      if (!(error instanceof Error)) throw error;
      return { kind: isRefusal(error) ? 'refused' : 'delayed', words: wordsOf(error) };
    }
  }

  /** Ends the message under way, which counts as delayed, and the connection. */
  close(): void {
    this.#closing.abort(new Error('the server was stopped'));
    this.#transport.close({ force: true });
  }
}

type SmtpError = Error & {
  readonly code?: string;
  readonly command?: string;
  readonly response?: string;
  readonly responseCode?: number;
};

/**
 * Whether the server said no for good to this message (5xx, RFC 5321 §4.2.1), or the address is none. What is wrong with
 * the connection or our sign-in to the server (530, 535) says nothing of the message.
 */
function isRefusal({ code, command, responseCode }: SmtpError): boolean {
  if (code !== 'EENVELOPE' && code !== 'EMESSAGE') return false;
  if (responseCode === undefined) return command === 'API';
  return responseCode >= 500 && responseCode !== 530;
}

function wordsOf(error: SmtpError): string {
  return (error.response ?? error.message).replace(/\s+/g, ' ').slice(0, longestWords);
}
