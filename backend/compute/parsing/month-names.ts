/** Month names, English and German, in full and by the letters that begin them. */
const names: readonly (readonly string[])[] = [
  ['january', 'januar', 'jänner'],
  ['february', 'februar', 'feber'],
  ['march', 'märz', 'maerz', 'mrz'],
  ['april'],
  ['may', 'mai'],
  ['june', 'juni'],
  ['july', 'juli'],
  ['august'],
  ['september'],
  ['october', 'oktober'],
  ['november'],
  ['december', 'dezember'],
];

const months = new Map(
  names.flatMap((ofMonth, index) =>
    ofMonth.flatMap((name) =>
      [name, name.slice(0, 3), name.slice(0, 4)].map((form) => [form, index + 1] as const),
    ),
  ),
);

/** 1 to 12 for `March`, `Mar`, `Sept`, `März`, `Mrz`, in any case; undefined for any other word. */
export function monthOfName(word: string): number | undefined {
  return months.get(word.toLowerCase());
}
