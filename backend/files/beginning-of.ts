/** At most so many UTF-16 units of a text, and no half of a character that takes two: PostgreSQL stores none. */
export function beginningOf(text: string, most: number): string {
  return text.slice(0, most).replace(/\p{Cs}$/u, '');
}
