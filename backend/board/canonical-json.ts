/**
 * JSON with sorted keys and the shortest numbers that read back the same: equal content gives equal text.
 * Members that are undefined are left out.
 */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, member: unknown) =>
    typeof member === 'object' && member !== null && !Array.isArray(member)
      ? Object.fromEntries(
          Object.entries(member).sort(([left], [right]) => (left < right ? -1 : 1)),
        )
      : member,
  );
}
