/** What tables call their last lines, in the languages of the trade; in small letters. */
const names: ReadonlySet<string> = new Set([
  ...['total', 'totals', 'grand total', 'subtotal', 'sub-total', 'sum', 'all companies'],
  ...['average', 'mean', 'median', 'peer average', 'peer mean', 'peer median'],
  ...['peers’ average', 'peers’ mean', 'peers’ median', 'weighted average'],
  ...['average of peers', 'mean of peers', 'median of peers', 'peer group', 'peer group average'],
  ...['minimum', 'maximum', 'min', 'max', 'standard deviation'],
  ...['gesamt', 'gesamtsumme', 'insgesamt', 'summe', 'zwischensumme', 'durchschnitt'],
  ...['mittelwert', 'mittel', 'peer-durchschnitt', 'peer-median', 'durchschnitt der peers'],
  ...['total général', 'sous-total', 'somme', 'moyenne', 'médiane', 'moyenne des pairs'],
  ...['totale', 'somma', 'subtotale', 'media', 'mediana', 'total general', 'suma', 'promedio'],
  ...['totaal', 'subtotaal', 'som', 'gemiddelde', 'mediaan'],
  ...['soma', 'média', 'totalt', 'summa', 'delsumma', 'genomsnitt', 'medelvärde', 'gennemsnit'],
  ...['gjennomsnitt', 'i alt', 'suma razem', 'razem', 'średnia'],
]);

/** Whether a whole name is a word for a sum or a mean, as `Total` and `Peers' mean:`; a name with more in it is not. */
export function isSumName(name: string): boolean {
  const plain = name
    .normalize('NFC')
    .toLowerCase()
    .replace(/[’'`´]/gu, '’')
    .replace(/[\s:*]+$/u, '')
    .replace(/\s+/gu, ' ')
    .trim();
  return names.has(plain);
}
