/** A failure the person at the terminal can act on: its message is one full sentence, shown without a stack. */
export class PlainFailure extends Error {
  name = 'PlainFailure';
}

/** A command that ended with another status than 0, with the last lines it printed. */
export class CommandFailed extends Error {
  name = 'CommandFailed';

  constructor(command, status, tail) {
    super(`${command} ended with ${status}`);
    this.command = command;
    this.status = status;
    this.tail = tail;
  }
}

/** The command was ended because the person asked to stop. */
export class Interrupted extends Error {
  name = 'Interrupted';
}

const diskIsFull = /ENOSPC|No space left on device/i;

/**
 * Says in one sentence what stopped the script; an unforeseen error keeps its stack, because someone must mend it.
 *
 * @param error  whatever was thrown.
 */
export function inOneSentence(error) {
  if (error instanceof PlainFailure) return error.message;
  const tail = error instanceof CommandFailed ? error.tail : '';
  if (error?.code === 'ENOSPC' || diskIsFull.test(tail)) {
    return 'The disk is full: free some space, then start again.';
  }
  if (error instanceof CommandFailed) {
    const lines = tail.split('\n').filter((line) => line.trim() !== '');
    const reason =
      lines.findLast((line) => /error|fatal|cannot|failed/i.test(line)) ?? lines.at(-1);
    return `"${error.command}" failed (${error.status})${reason === undefined ? '' : `: ${reason.trim()}`}`;
  }
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
