import type { FileMending, ImportFinding } from '@contract';
import { counted } from '../../ui/phrases';
import { type FileCell, mendedText, withCell, withoutCell } from './mending';
import { findingKinds } from './review';

/** Many lines left out, or many cells mended, as one act that is taken back as one. */
export interface BulkAct {
  /** What was done: `9 lines are left out.` */
  readonly words: string;
  readonly lines: readonly number[];
  readonly cells: readonly (FileCell & {
    readonly text: string;
    /** What it was mended to before; undefined for one that was not. */
    readonly before: string | undefined;
  })[];
}

/** An act that is offered, with what its button says. */
export interface BulkOffer {
  readonly label: string;
  readonly act: BulkAct;
}

type Code = ImportFinding['code'];

/** Kinds whose lines are of no use as they stand; a gap or a formula is no reason to leave a line out. */
const unusable: readonly Code[] = [
  'not-a-number',
  'duplicate',
  'no-company',
  'year',
  'currency',
  'other-currency',
  'sum',
];

/** Kinds where equal texts mean the same, whatever the line. */
const sameByText: ReadonlySet<Code> = new Set<Code>([
  'not-a-number',
  'ambiguous-number',
  'year',
  'currency',
  'other-currency',
]);

/** Leaving out the lines of a kind at once, for each kind that has two or more; of rows that stand twice the first stays. */
export function leaveOutOffers(
  findings: readonly ImportFinding[],
  mending: FileMending,
  kind: Code | null,
): readonly BulkOffer[] {
  const excluded = new Set(mending.excludedRows);
  return unusable.flatMap((code) => {
    if (kind !== null && kind !== code) return [];
    const own = findings.filter((finding) => finding.code === code && isUnusable(finding));
    const lines = [...new Set(own.map(({ row }) => row))].filter((line) => !excluded.has(line));
    if (lines.length < 2) return [];
    const which = code === 'duplicate' ? 'later lines, keep the first of each' : 'lines';
    const label = `Leave out ${code === 'duplicate' ? 'the' : 'all'} ${lines.length} ${which}: ${findingKinds[code]}`;
    return [{ label, act: { words: leftOutWords(lines.length), lines, cells: [] } }];
  });
}

function isUnusable({ code, isBlocking, sameAs }: ImportFinding): boolean {
  if (code === 'duplicate') return sameAs !== undefined;
  return isBlocking || code === 'sum';
}

function leftOutWords(lines: number): string {
  return `${counted(lines, 'line')} ${lines === 1 ? 'is' : 'are'} left out.`;
}

/** The findings whose cells read the same and mean the same, by `textKey`; only where there are two or more. */
export function alikeFindings(
  findings: readonly ImportFinding[],
): ReadonlyMap<string, readonly ImportFinding[]> {
  const groups = new Map<string, ImportFinding[]>();
  for (const finding of findings) {
    if (!sameByText.has(finding.code) || finding.found.trim() === '') continue;
    const key = textKey(finding);
    const known = groups.get(key);
    if (known === undefined) groups.set(key, [finding]);
    else known.push(finding);
  }
  return new Map([...groups].filter(([, group]) => group.length > 1));
}

export function textKey({ code, found }: ImportFinding): string {
  return `${code} ${found}`;
}

/** Using a cell's mended text for all that read as it did; undefined where all of them have it, or it is not mended. */
export function useForAllOffer(
  finding: ImportFinding,
  alike: readonly ImportFinding[],
  mending: FileMending,
): BulkOffer | undefined {
  const text = mendedText(mending, finding);
  if (text === undefined) return undefined;
  const cells = alike
    .map(({ row, column }) => ({ row, column, text, before: mendedText(mending, { row, column }) }))
    .filter(({ before }) => before !== text);
  if (cells.length === 0) return undefined;
  const reads = text.trim() === '' ? 'is empty' : `reads “${text}”`;
  const all = counted(alike.length, 'cell');
  return {
    label: `Use this for all ${all} that read “${finding.found}”`,
    act: { words: `Each of the ${all} that read “${finding.found}” ${reads}.`, lines: [], cells },
  };
}

export function afterAct(mending: FileMending, { lines, cells }: BulkAct): FileMending {
  const mended = cells.reduce((sofar, cell) => withCell(sofar, cell, cell.text), mending);
  return { ...mended, excludedRows: [...new Set([...mended.excludedRows, ...lines])] };
}

/** Takes the act back; what was mended besides it stays. */
export function beforeAct(mending: FileMending, { lines, cells }: BulkAct): FileMending {
  const taken = new Set(lines);
  const restored = cells.reduce((sofar, cell) => {
    if (mendedText(sofar, cell) !== cell.text) return sofar;
    return cell.before === undefined
      ? withoutCell(sofar, cell)
      : withCell(sofar, cell, cell.before);
  }, mending);
  return { ...restored, excludedRows: restored.excludedRows.filter((line) => !taken.has(line)) };
}

/** Whether anything of the act still stands. */
export function isStanding(mending: FileMending, { lines, cells }: BulkAct): boolean {
  return (
    lines.some((line) => mending.excludedRows.includes(line)) ||
    cells.some((cell) => mendedText(mending, cell) === cell.text)
  );
}
