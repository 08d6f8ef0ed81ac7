/** What a flag found, with the figures that it found it by; money in the panel's unit. */
export type FlagFacts =
  /** The cell is empty. */
  | { readonly code: 'missing' }
  /**
   * The figures of `company` in the same year, as `columns` of the model's three are in this row; `more` companies have
   * them too.
   */
  | {
      readonly code: 'duplicate';
      readonly of: 'figures';
      readonly company: string;
      readonly columns: number;
      readonly more: number;
    }
  /** The company, of which this is the first year, may be `company` under another name, or one of `more`. */
  | {
      readonly code: 'duplicate';
      readonly of: 'name';
      readonly company: string;
      readonly more: number;
    }
  /** `ratio` to the year before; `score` its distance from the company's usual change, in robust deviations. */
  | {
      readonly code: 'jump';
      readonly before: number;
      readonly ratio: number;
      readonly usualRatio: number;
      readonly score: number;
    }
  /**
   * Near `factor` times, or one `factor`th of, what is usual: the median size of the company's own years; or, of a whole
   * column, the companies' median ratio of it to another column.
   */
  | {
      readonly code: 'unit-slip';
      readonly factor: 1000 | 1_000_000;
      readonly isTooLarge: boolean;
      readonly usual: number;
      readonly against: 'own-years' | 'other-columns';
    }
  /** A market value or book equity that is negative, a market value or capex of 0 or below. */
  | { readonly code: 'sign' }
  /** The figure of the year before, digit by digit; `columns` of the model's three are so in this row. */
  | { readonly code: 'stale-copy'; readonly columns: number }
  /** Its ratio to book equity lies far from the peers' in this year. */
  | {
      readonly code: 'peer-outlier';
      readonly ratio: number;
      readonly usualRatio: number;
      readonly score: number;
      readonly peers: number;
    }
  /** The company has rows before and after, and none in this year. */
  | { readonly code: 'year-gap' };

export type FlagCode = FlagFacts['code'];

/** One thing about one cell that somebody should look at. */
export interface Flag {
  readonly company: string;
  readonly year: number;
  /** Position among the columns; null where the whole row is meant. */
  readonly column: number | null;
  /** The cell's value; null where it is missing. */
  readonly value: number | null;
  readonly facts: FlagFacts;
}

/** Where a rule found something: a row and column of the panel. */
export interface FlaggedCell {
  readonly row: number;
  readonly column: number;
  readonly facts: FlagFacts;
}
