/** Trims header texts and makes them different from each other, so that a column can be named by its header. */
export function uniqueHeader(texts: readonly string[]): {
  readonly header: readonly string[];
  readonly repeatedHeaders: readonly string[];
} {
  const trimmed = texts.map((text, index) => text.trim() || `column ${index + 1}`);
  const used = new Set<string>();
  const repeated = new Set<string>();
  const header = trimmed.map((name) => {
    let unique = name;
    for (let number = 2; used.has(unique); number += 1) unique = `${name} (${number})`;
    if (unique !== name) repeated.add(name);
    used.add(unique);
    return unique;
  });
  return { header, repeatedHeaders: [...repeated] };
}
