import type { FinishedFit } from '../fits/fit-service';
import type { Scenario } from '../scenarios/scenario-service';

/** What goes into an edition at its publication. */
export interface EditionParts {
  readonly number: number;
  readonly workspaceName: string;
  readonly publishedBy: string;
  readonly publishedAt: Date;
  readonly confidentiality: 'confidential' | 'inside-information';
  readonly comment: string;
  readonly ground: FinishedFit;
  readonly scenarios: readonly Scenario[];
  readonly peerGroupsTried: number;
}
