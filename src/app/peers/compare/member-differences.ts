import type { PeerGroupReply } from '@contract';
import { counted, listed } from '../../ui/phrases';

/** What a version says of a company; null where it does not know it. */
export interface SaidOf {
  readonly isIncluded: boolean;
  readonly reason: string;
}

export type DifferenceKind = 'side' | 'known' | 'reason' | 'same';

export interface MemberDifference {
  readonly company: string;
  readonly a: SaidOf | null;
  readonly b: SaidOf | null;
  /** Which side it is on, whether both know it, the reason alone, or nothing differs. */
  readonly kind: DifferenceKind;
}

const order: readonly DifferenceKind[] = ['side', 'known', 'reason', 'same'];

/** Each company that one of the versions knows, those first that moved, then by name. */
export function memberDifferences(
  a: PeerGroupReply,
  b: PeerGroupReply,
): readonly MemberDifference[] {
  const [inA, inB] = [a, b].map(
    ({ peers }) => new Map(peers.map((peer): [string, SaidOf] => [peer.company, peer])),
  );
  return [...new Set([...inA.keys(), ...inB.keys()])]
    .map((company) => {
      const said = { a: inA.get(company) ?? null, b: inB.get(company) ?? null };
      return { company, ...said, kind: kindOf(said.a, said.b) };
    })
    .sort(
      (left, right) =>
        order.indexOf(left.kind) - order.indexOf(right.kind) ||
        left.company.localeCompare(right.company, 'en'),
    );
}

function kindOf(a: SaidOf | null, b: SaidOf | null): DifferenceKind {
  if (a === null || b === null) return (a ?? b)?.isIncluded === true ? 'side' : 'known';
  if (a.isIncluded !== b.isIncluded) return 'side';
  return a.reason === b.reason ? 'same' : 'reason';
}

/** `Version 2 leaves out Zethorin, which version 1 takes in`; names at most three on each side. */
export function comparisonFinding(
  a: PeerGroupReply,
  b: PeerGroupReply,
  differences: readonly MemberDifference[],
): string {
  const names = (isIn: (each: MemberDifference) => boolean) =>
    differences.filter(({ kind }) => kind === 'side').filter(isIn);
  const added = names((each) => each.b?.isIncluded === true);
  const left = names((each) => each.a?.isIncluded === true);
  const older = `version ${a.number}`;
  const version = `Version ${b.number}`;
  if (added.length + left.length === 0) {
    const reasons = differences.filter(({ kind }) => kind === 'reason').length;
    const same = `${version} has the same peers as ${older}`;
    if (a.ownCompany !== b.ownCompany) return `${same}, for another own company`;
    return reasons === 0
      ? same
      : `${same}; ${counted(reasons, 'reason')} ${reasons === 1 ? 'differs' : 'differ'}`;
  }
  const parts = [
    ...(added.length === 0 ? [] : [`takes in ${who(added)}`]),
    ...(left.length === 0 ? [] : [`leaves out ${who(left)}`]),
  ];
  return `${version} ${listed(parts)}, unlike ${older}`;
}

function who(companies: readonly MemberDifference[]): string {
  return companies.length > 3
    ? counted(companies.length, 'company', 'companies')
    : listed(companies.map(({ company }) => company));
}
