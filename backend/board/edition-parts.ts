import type { EditionRow } from '../../db/repositories/editions-repository';
import type { FinishedFit } from '../fits/fit-service';
import type { PanelDifferences } from '../panel-data';
import type { Scenario } from '../scenarios/scenario-service';

export type MoneyUnit = 'units' | 'thousands' | 'millions' | 'billions';

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
  /** Groups whose figures were looked at before or without saving them. */
  readonly peerGroupsTriedOut: number;
  /** The headline as edited, its amounts in `unit`; null for the one made from the figures. */
  readonly headline: string | null;
  readonly unit: MoneyUnit;
  /** The returned edition that this one answers. */
  readonly answers: { readonly id: string; readonly number: number } | null;
  /** The edition signed last, as stored, with what the panel has different since; null for the first one. */
  readonly before: {
    readonly row: EditionRow;
    readonly text: string;
    readonly panelDifferences: PanelDifferences | null;
  } | null;
}

/** A place in an edited headline that says what no figure says. */
export interface HeadlineFault {
  readonly start: number;
  readonly end: number;
  readonly found: string;
  readonly detail: string;
}

/** An edition as publishing would freeze it. */
export interface ComposedEdition {
  /** What is frozen, in the words of the contract. */
  readonly content: unknown;
  readonly suggestedHeadline: string;
  readonly headlineFaults: readonly HeadlineFault[];
}

/** What the service has to know of a frozen edition. */
export interface ReadEdition {
  /** As it is shown, whichever schema it was frozen with. */
  readonly content: unknown;
  readonly warnings: readonly {
    readonly id: string;
    readonly isSerious: boolean;
    readonly title: string;
  }[];
}

/** Makes and reads what editions freeze. */
export interface EditionWriter {
  compose(parts: EditionParts): ComposedEdition;
  read(text: string): ReadEdition;
}
