/** One thing the check found, at one place of the file. */
export interface TableFinding {
  /** Line of the file, the header being line 1. */
  readonly row: number;
  readonly column: string;
  readonly found: string;
  readonly code: 'missing' | 'duplicate' | 'not-a-number' | 'year' | 'no-company' | 'spelling';
  readonly detail: string;
  /** Whether the panel cannot be brought in while this stands. */
  readonly isBlocking: boolean;
}
