import { breuschGodfreyTest } from './breusch-godfrey';
import { brownForsytheTest } from './brown-forsythe';
import { durbinWatsonTest } from './durbin-watson';
import type { EvidenceTest } from './evidence-test';
import { modifiedWaldTest } from './modified-wald';
import { pesaranCdTest } from './pesaran-cd';
import { poolabilityTest } from './poolability';
import { resetTest } from './reset';
import { slopeHomogeneityTest } from './slope-homogeneity';
import { wooldridgeFirstDifferencesTest } from './wooldridge-first-differences';
import { wooldridgeWithinTest } from './wooldridge-within';

/** Every test of the evidence in the order shown, those less asked for last. A new one is a file and a line here. */
export const testTable: readonly EvidenceTest[] = [
  poolabilityTest,
  slopeHomogeneityTest,
  wooldridgeWithinTest,
  wooldridgeFirstDifferencesTest,
  durbinWatsonTest,
  pesaranCdTest,
  brownForsytheTest,
  modifiedWaldTest,
  resetTest,
  breuschGodfreyTest,
];
