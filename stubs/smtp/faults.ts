/** What the stub does wrong on request, as real mail servers do. */
export interface Faults {
  /** Nobody listens: connections are refused, and those that stand are cut. */
  readonly refusesConnections: boolean;
  /** How many of the next recipients are put off with 451. */
  readonly greylist: number;
  /** Addresses that are refused for good, with 550. */
  readonly refused: readonly string[];
  /** Where the dialogue falls silent: before the greeting, or after a mail was taken and before that is said. */
  readonly hangs: 'never' | 'at-greeting' | 'after-taking';
}

export const noFaults: Faults = {
  refusesConnections: false,
  greylist: 0,
  refused: [],
  hangs: 'never',
};

/**
 * Faults with these changes.
 *
 * @throws {TypeError} naming a member that is unknown or of another kind.
 */
export function changedFaults(faults: Faults, changes: unknown): Faults {
  if (typeof changes !== 'object' || changes === null)
    throw new TypeError('expected an object of faults');
  for (const [name, value] of Object.entries(changes)) {
    if (!Object.hasOwn(checks, name)) throw new TypeError(`there is no fault ${name}`);
    if (!checks[name as keyof Faults](value)) throw new TypeError(`${name} has another kind`);
  }
  return { ...faults, ...changes };
}

const checks: Readonly<Record<keyof Faults, (value: unknown) => boolean>> = {
  refusesConnections: (value) => typeof value === 'boolean',
  greylist: (value) => Number.isInteger(value) && Number(value) >= 0,
  refused: (value) => Array.isArray(value) && value.every((address) => typeof address === 'string'),
  hangs: (value) => ['never', 'at-greeting', 'after-taking'].includes(String(value)),
};
