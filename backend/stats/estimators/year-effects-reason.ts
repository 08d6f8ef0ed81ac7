/** Why a test of the company effects says nothing of a fit with year effects. */
export const yearEffectsReason =
  'The test compares models without year effects, and this one has them.';
