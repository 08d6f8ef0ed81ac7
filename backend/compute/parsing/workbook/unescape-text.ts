/** Text of a cell as typed: the file writes a control character as `_x000A_`. The copy keeps no chunk of XML alive. */
export function unescapeText(text: string): string {
  const copy = Buffer.from(text).toString();
  if (!copy.includes('_x')) return copy;
  return copy.replace(/_x([0-9A-Fa-f]{4})_/gu, (_, code: string) =>
    String.fromCharCode(Number.parseInt(code, 16)),
  );
}
