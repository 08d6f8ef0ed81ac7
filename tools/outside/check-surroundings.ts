/** What the check needs from its surroundings. */
export interface CheckSurroundings {
  /** The project's root. */
  readonly root: URL;
  /** An empty folder for requests, answers and packs. */
  readonly folder: string;
  readonly runR: RunR;
  readonly say: (text: string) => void;
  /** Whether the outside numbers are to be written for the specs. */
  readonly freeze: boolean;
}

/** Runs an R script; resolves with what it prints. */
export type RunR = (args: readonly string[], options?: { readonly cwd: string }) => Promise<string>;
