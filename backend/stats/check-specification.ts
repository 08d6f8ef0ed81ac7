import type { Specification } from './fit-result';
import { StatsError } from './stats-error';

const covariances = new Set<string>(['cr2', 'cr1', 'cr0', 'classical']);

/** @throws {StatsError} 'specification' where the engine does not offer what is asked. */
export function checkSpecification(specification: Specification): void {
  const { effects, form, lag, slopes, confidence } = specification as {
    [Key in keyof Specification]: unknown;
  };
  if (effects !== 'company') refuse('effects', 'company', effects);
  if (form !== 'levels') refuse('form', 'levels', form);
  if (lag !== 0) refuse('lag', '0', lag);
  if (!covariances.has(String(slopes))) refuse('slopes', [...covariances].join(', '), slopes);
  if (typeof confidence !== 'number' || !(confidence > 0 && confidence < 1)) {
    refuse('confidence', 'a number between 0 and 1', confidence);
  }
}

function refuse(name: string, wanted: string, found: unknown): never {
  throw new StatsError('specification', `expected ${name} to be ${wanted}; found ${String(found)}`);
}
