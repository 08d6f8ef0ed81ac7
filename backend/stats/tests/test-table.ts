import { breuschGodfreyTest } from './breusch-godfrey';
import { breuschPaganLmTest } from './breusch-pagan-lm';
import { brownForsytheTest } from './brown-forsythe';
import { durbinWatsonTest } from './durbin-watson';
import type { EvidenceTest } from './evidence-test';
import { hausmanClassicalTest } from './hausman-classical';
import { hausmanClusteredTest } from './hausman-clustered';
import { hondaTest } from './honda';
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
  hausmanClassicalTest,
  hausmanClusteredTest,
  breuschPaganLmTest,
  wooldridgeWithinTest,
  wooldridgeFirstDifferencesTest,
  durbinWatsonTest,
  pesaranCdTest,
  brownForsytheTest,
  modifiedWaldTest,
  resetTest,
  breuschGodfreyTest,
  hondaTest,
];
