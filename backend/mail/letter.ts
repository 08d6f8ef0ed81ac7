/** A mail in words, before it is plain text or HTML. All of it is text: nothing in it is markup. */
export interface Letter {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  /** The one thing to do. */
  readonly link: { readonly words: string; readonly address: string };
  /** Stands below the link: cautions, and why the reader gets this mail. */
  readonly closing: readonly string[];
}

/** Where a letter is written from. */
export interface LetterPlace {
  readonly workspaceName: string;
  /** Scheme, host and port that browsers see. */
  readonly publicOrigin: string;
}

/** A name as part of a line: line breaks and other control characters in it become spaces. */
export function oneLine(text: string): string {
  return text.replace(/[\p{Cc}\p{Zl}\p{Zp}]+/gu, ' ').trim();
}

export function letterText({ paragraphs, link, closing }: Letter): string {
  const parts = [...paragraphs, `${link.words}: ${link.address}`, '-- ', ...closing];
  return `${parts.map((part) => (part === '-- ' ? part : oneLine(part))).join('\n\n')}\n`;
}

/** A page that needs neither pictures nor a style sheet. */
export function letterHtml({ subject, paragraphs, link, closing }: Letter): string {
  const lines = [
    ...paragraphs.map((text) => `<p>${escapeHtml(text)}</p>`),
    `<p><a href="${escapeHtml(link.address)}">${escapeHtml(link.words)}</a></p>`,
    '<hr>',
    ...closing.map((text) => `<p><small>${escapeHtml(text)}</small></p>`),
  ];
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><title>${escapeHtml(subject)}</title></head>
<body>
${lines.join('\n')}
</body>
</html>
`;
}

const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escapeHtml(text: string): string {
  return oneLine(text).replace(/[&<>"']/g, (character) => entities[character]);
}
