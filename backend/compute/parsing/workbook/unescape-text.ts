/**
 * Text of a cell as typed: the file writes a control character as `_x000A_`. What would be no text, a NUL or half a
 * character, stays as it is written. The copy keeps no chunk of XML alive.
 */
export function unescapeText(text: string): string {
  const copy = Buffer.from(text).toString();
  if (!copy.includes('_x')) return copy;
  return copy.replace(/_x([0-9A-Fa-f]{4})_/gu, (written, code: string) => {
    const sign = Number.parseInt(code, 16);
    const isText = sign !== 0 && (sign < 0xd800 || sign > 0xdfff);
    return isText ? String.fromCharCode(sign) : written;
  });
}
