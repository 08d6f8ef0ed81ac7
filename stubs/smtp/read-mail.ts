import { simpleParser } from 'mailparser';

/** What a reader's program would show of a mail. */
export interface ReadMail {
  readonly subject: string;
  readonly from: string;
  readonly to: string;
  readonly messageId: string;
  readonly text: string;
  readonly html: string;
}

/** @param source  headers and body, as they came. */
export async function readMail(source: Buffer): Promise<ReadMail> {
  const { subject, from, to, messageId, text, html } = await simpleParser(source, {
    skipHtmlToText: true,
    skipTextToHtml: true,
  });
  const recipients = to === undefined || Array.isArray(to) ? to : [to];
  return {
    subject: subject ?? '',
    from: from?.text ?? '',
    to: (recipients ?? []).map((each) => each.text).join(', '),
    messageId: messageId ?? '',
    text: text ?? '',
    html: typeof html === 'string' ? html : '',
  };
}
