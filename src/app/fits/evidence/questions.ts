export interface EvidenceQuestion {
  /** Of its heading: a link that ends with it opens the question. */
  readonly id: string;
  readonly words: string;
}

/** The evidence by its questions, in the order in which they are asked. */
export const questions = {
  oneLine: { id: 'one-line', words: 'Does one line for all do?' },
  drivers: { id: 'who-drives', words: 'Who drives it?' },
  steady: { id: 'steady', words: 'Is the standing steady?' },
  trends: { id: 'only-trends', words: 'Could it be only trends?' },
  intervals: { id: 'which-intervals', words: 'Which intervals?' },
  models: { id: 'other-models', words: 'What if the model were another?' },
  tests: { id: 'all-tests', words: 'What do all tests say?' },
  residuals: { id: 'residuals', words: 'What does the model not explain?' },
} as const satisfies Record<string, EvidenceQuestion>;
