import type { CapturedMail } from './mailbox';

const style = `
:root { color-scheme: light dark; font: 15px/1.5 system-ui, sans-serif; }
body { max-width: 62rem; margin: 2rem auto; padding: 0 1rem; }
table { border-collapse: collapse; width: 100%; }
th, td { text-align: start; padding: 0.4rem 0.8rem 0.4rem 0; border-bottom: 1px solid; vertical-align: top; }
dt { font-weight: 600; } dd { margin: 0 0 0.5rem; }
pre { white-space: pre-wrap; border: 1px solid; padding: 1rem; }
iframe { width: 100%; height: 24rem; border: 1px solid; background: Canvas; }
`;

/** All mails, newest first. */
export function listPage(mails: readonly CapturedMail[]): string {
  const rows = [...mails].reverse().map(
    ({ id, takenAt, recipients, subject }) =>
      `<tr><td>${escapeHtml(takenAt)}</td><td>${escapeHtml(recipients.join(', '))}</td>
<td><a href="/mails/${encodeURIComponent(id)}">${escapeHtml(subject)}</a></td></tr>`,
  );
  const list =
    rows.length === 0
      ? '<p>No mail has been sent yet.</p>'
      : `<table><thead><tr><th>Taken</th><th>To</th><th>Subject</th></tr></thead>
<tbody>${rows.join('\n')}</tbody></table>`;
  return page('Mail that left Kinvale', `<p>Nothing here goes any further.</p>${list}`);
}

/** One mail as text and as HTML, the latter in a frame that may do nothing. */
export function mailPage(mail: CapturedMail): string {
  const facts = [
    ['From', mail.from],
    ['To', mail.to],
    ['Taken', mail.takenAt],
    ['Message-ID', mail.messageId],
  ].map(([name, value]) => `<dt>${name}</dt><dd>${escapeHtml(value)}</dd>`);
  return page(
    mail.subject,
    `<p><a href="/">All mail</a></p><dl>${facts.join('')}</dl>
<h2>Text</h2><pre>${escapeHtml(mail.text)}</pre>
<h2>HTML</h2><iframe sandbox title="The mail as HTML" src="/mails/${encodeURIComponent(mail.id)}/html"></iframe>`,
  );
}

function page(title: string, content: string): string {
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(title)}</title>
<meta name="viewport" content="width=device-width"><style>${style}</style></head>
<body><main><h1>${escapeHtml(title)}</h1>${content}</main></body></html>
`;
}

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}
