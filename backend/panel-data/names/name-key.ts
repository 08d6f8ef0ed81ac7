/** Words of a legal form, which people write or leave out. */
const legalForms = new Set(
  (
    'ab ag as asa aps bv bvba co company corp corporation gmbh inc incorporated kg kgaa limited llc llp lp ltd mbh nv ' +
    'oy oyj plc pte pty sa sab sarl sas se spa srl ug'
  ).split(' '),
);

/**
 * A company's name reduced to what tells it from others: lower case, without accents, punctuation and words of a legal
 * form, its words in alphabetical order. A name of nothing but such words keeps them.
 */
export function nameKey(name: string): string {
  const words = name
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/ß/gu, 'ss')
    // Dots and apostrophes stand inside a word: `S.A.` is one.
    .replace(/[.'’]/gu, '')
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== '');
  const telling = words.filter((word) => !legalForms.has(word));
  return (telling.length > 0 ? telling : words).sort().join(' ');
}
