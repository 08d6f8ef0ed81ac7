import type { Specification } from './fit-result';
import { covarianceNames } from './slopes/covariance-names';
import { StatsError } from './stats-error';

/** @throws {StatsError} 'specification' where the engine does not offer what is asked. */
export function checkSpecification(specification: Specification): void {
  const { effects, form, lag, slopes, confidence, seed } = specification as {
    [Key in keyof Specification]: unknown;
  };
  refuseUnless(['company', 'company,year'], 'effects', effects);
  refuseUnless(['levels', 'log'], 'form', form);
  refuseUnless([0, 1], 'lag', lag);
  refuseUnless(covarianceNames, 'slopes', slopes);
  if (typeof confidence !== 'number' || !(confidence > 0 && confidence < 1)) {
    refuse('confidence', 'a number between 0 and 1', confidence);
  }
  const isSeed = Number.isSafeInteger(seed) && (seed as number) >= 0;
  if (slopes === 'wild' ? !isSeed : seed !== null) {
    refuse('seed', slopes === 'wild' ? 'a whole number of 0 or more' : 'null', seed);
  }
}

function refuseUnless(offered: readonly unknown[], name: string, found: unknown): void {
  if (!offered.includes(found)) refuse(name, offered.join(' or '), found);
}

function refuse(name: string, wanted: string, found: unknown): never {
  throw new StatsError('specification', `expected ${name} to be ${wanted}; found ${String(found)}`);
}
