const longest = 300;

/**
 * The line that tells the most of what a process wrote before it ended: the fatal error of a trace, else the first line.
 * Undefined for blank text.
 */
export function tellingLine(text: string): string | undefined {
  const lines = text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
  const telling = lines.find((line) => line.startsWith('FATAL ERROR')) ?? lines.at(0);
  return telling?.slice(0, longest);
}
