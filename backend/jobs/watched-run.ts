/** How often a running job says how far it is, and looks whether somebody cancelled it. */
const usualWatchMs = 500;

/**
 * Waits for a run in a worker, and ends it when it was cancelled, on this server or another.
 *
 * @param start  starts the run.
 * @param tell  keeps the share done, 0 to 1; false once the run was cancelled.
 * @returns undefined when it was cancelled.
 */
export async function watchedRun<Answer>(
  start: (signal: AbortSignal) => { readonly answer: Promise<Answer>; progress(): number },
  tell: (share: number) => Promise<boolean>,
  watchEveryMs = usualWatchMs,
): Promise<Answer | undefined> {
  const abort = new AbortController();
  const run = start(abort.signal);
  const look = async (): Promise<void> => {
    // The database is away for a moment: the run goes on, the next look tells.
    const isWanted = await tell(run.progress()).catch(() => true);
    if (!isWanted) abort.abort();
  };
  const watch = setInterval(() => void look(), watchEveryMs);
  try {
    return await run.answer;
  } catch (error) {
    if (abort.signal.aborted) return undefined;
    throw error;
  } finally {
    clearInterval(watch);
  }
}
