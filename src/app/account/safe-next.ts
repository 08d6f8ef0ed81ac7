/** Where a person may be led after signing in: pages of this site that need a session. */
const withoutSession = /^\/(sign-in|sign-up|join)(?:[/?#]|$)/;

/**
 * The path to go to after signing in, from the address's `next`.
 *
 * @param next  what stands in the address: anybody can write anything there.
 * @returns a path of this origin with its query and fragment; null for what leads elsewhere or back to signing in.
 */
export function safeNext(next: string | undefined, origin: string): string | null {
  // A browser reads a backslash as a slash and drops tabs and line breaks, so that "/\t/host" would be another site.
  if (next === undefined || !/^\/(?![/\\])[^\\\p{Cc}]*$/u.test(next)) return null;
  if (!URL.canParse(next, origin)) return null;
  const { origin: found, pathname, search, hash } = new URL(next, origin);
  const path = pathname + search + hash;
  // The path is looked at once more as it was read: "/x/..//host" is "//host" by now.
  if (found !== origin || path.startsWith('//') || withoutSession.test(path)) return null;
  return path;
}
