import { randomUUID } from 'node:crypto';
import type { ReadMail } from './read-mail';

/** A mail as it was taken, with what the dialogue before it said. */
export interface CapturedMail extends ReadMail {
  readonly id: string;
  /** ISO 8601, UTC. */
  readonly takenAt: string;
  readonly sender: string;
  readonly recipients: readonly string[];
  /** Headers and body as they came. */
  readonly source: string;
}

const kept = 500;

/** Every mail that was taken, oldest first; the newest 500 are kept. */
export class Mailbox {
  #mails: CapturedMail[] = [];

  add(mail: Omit<CapturedMail, 'id' | 'takenAt'>): void {
    const captured = { id: randomUUID(), takenAt: new Date().toISOString(), ...mail };
    this.#mails = [...this.#mails, captured].slice(-kept);
  }

  /** @param recipient  only mails to this address, where given. */
  list(recipient?: string): readonly CapturedMail[] {
    if (recipient === undefined) return this.#mails;
    const wanted = recipient.toLowerCase();
    return this.#mails.filter(({ recipients }) =>
      recipients.some((address) => address.toLowerCase() === wanted),
    );
  }

  find(id: string): CapturedMail | undefined {
    return this.#mails.find((mail) => mail.id === id);
  }

  clear(): void {
    this.#mails = [];
  }
}
