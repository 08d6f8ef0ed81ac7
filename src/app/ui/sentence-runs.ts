import { type SentencePart, type SentenceSetting, sentencePartText } from '@figures';

/** What is read as one: words, the own company's name, or a figure with its interval. */
export type SentenceRun =
  | { readonly kind: 'words' | 'own'; readonly text: string }
  | {
      readonly kind: 'figure';
      readonly text: string;
      /** Key of the figure's lineage. */
      readonly figure: string;
      /** Of its first number, in the panel's unit. */
      readonly value: number;
    };

const within = /^ (\(|to )$/;
const closing = /^(\)| and (up|down)\)| \(no interval\))/;

/** A sentence as it is read, a figure and its interval in one run. */
export function sentenceRuns(
  sentence: readonly SentencePart[],
  setting: SentenceSetting,
): readonly SentenceRun[] {
  const runs: SentenceRun[] = [];
  const add = (run: SentenceRun) => {
    const last = runs.at(-1);
    if (last?.kind === 'words' && run.kind === 'words')
      runs.splice(-1, 1, { ...last, text: last.text + run.text });
    else if (run.text !== '') runs.push(run);
  };
  for (let at = 0; at < sentence.length; at += 1) {
    const part = sentence[at];
    const text = sentencePartText(part, setting);
    if ('own' in part) add({ kind: 'own', text });
    else if (!('kind' in part) || part.figure === null) add({ kind: 'words', text });
    else {
      const last = lastOfInterval(sentence, at, part.figure);
      const written = sentence
        .slice(at, last + 1)
        .map((each) => sentencePartText(each, setting))
        .join('');
      const rest = sentence.at(last + 1);
      const after = rest !== undefined && 'text' in rest ? rest.text : '';
      const end = closing.exec(after)?.[0] ?? '';
      add({ kind: 'figure', text: written + end, figure: part.figure, value: part.value });
      at = last;
      if (end !== '') {
        add({ kind: 'words', text: after.slice(end.length) });
        at += 1;
      }
    }
  }
  return runs;
}

/** Where a figure's last number stands: after its estimate come ` (`, its low end, ` to ` and its high end. */
function lastOfInterval(sentence: readonly SentencePart[], from: number, figure: string): number {
  let last = from;
  for (let at = from + 1; at + 1 < sentence.length; at += 2) {
    const [link, next] = [sentence[at], sentence[at + 1]];
    if (!('text' in link) || !within.test(link.text)) return last;
    if (!('kind' in next) || next.figure !== figure) return last;
    last = at + 1;
  }
  return last;
}
