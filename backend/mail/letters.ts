import { editionReturned, editionSigned, editionWaiting } from './edition-letters';
import type { Letter, LetterPlace } from './letter';

/** Every kind of mail, by the name it is kept under while it waits. */
const letters = {
  'edition-waiting': editionWaiting,
  'edition-signed': editionSigned,
  'edition-returned': editionReturned,
} as const;

export type LetterName = keyof typeof letters;
/** What a letter needs to know besides its place; kept as JSON until the mail is sent. */
export type LetterDetail<Name extends LetterName> = Parameters<(typeof letters)[Name]>[0];

/**
 * Writes a letter from what was kept of it.
 *
 * @param detail  as `Outbox.post`, whose type holds the two together, kept it.
 * @throws for a name that no letter has.
 */
export function writeLetter(name: string, detail: object, place: LetterPlace): Letter {
  if (!Object.hasOwn(letters, name)) throw new Error(`no letter is named ${name}`);
  const write = letters[name as LetterName] as (detail: object, place: LetterPlace) => Letter;
  return write(detail, place);
}
