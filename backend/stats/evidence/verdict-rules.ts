import { modelRules } from './model-rules';
import { sampleRules } from './sample-rules';
import { slopeRules } from './slope-rules';
import { standingRules } from './standing-rules';
import type { VerdictRule } from './verdict-rule';

/** Everything that can speak against a board statement, in the order in which it is read out. */
export const verdictRules: readonly VerdictRule[] = [
  ...standingRules,
  ...sampleRules,
  ...slopeRules,
  ...modelRules,
];
