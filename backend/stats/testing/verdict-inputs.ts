import type { Alternative, EstimatorSlope } from '../evidence/evidence';
import { evidenceOf } from '../evidence/evidence-of';
import type { VerdictInput } from '../evidence/verdict-rule';
import { type FitResult, openFit, type WarningCode } from '../index';
import { panelOf, type PanelRow, plainSpecification, sha256 } from './golden-panels';
import { randomNumbers } from './random-panels';

/** Twelve companies over twenty years, y = x + level + noise; K00 lies above the others. */
function soundInput(): VerdictInput {
  const random = randomNumbers(12);
  const noise = (): number => random() + random() + random() - 1.5;
  const rows = Array.from({ length: 240 }, (_, index): PanelRow => {
    const company = Math.floor(index / 20);
    const x = 10 * random();
    const level = company === 0 ? 10 : company / 4;
    const name = `K${String(company).padStart(2, '0')}`;
    return {
      company: name,
      year: 2000 + (index % 20),
      outcome: 100 + x + level + noise(),
      regressors: [x],
    };
  });
  const data = panelOf(rows, { outcome: 'value', regressors: ['capex'] });
  const open = openFit(
    { data, specification: plainSpecification, own: 'K00', members: undefined },
    { sha256 },
  );
  const { withoutYear, estimators, covariances, alternatives, tests } = evidenceOf(open);
  return { result: open.result, withoutYear, estimators, covariances, alternatives, tests };
}

/** An input that nothing speaks against. */
export const sound = soundInput();

export function withResult(change: Partial<FitResult>): VerdictInput {
  return { ...sound, result: { ...sound.result, ...change } };
}

export function withWarning(code: WarningCode, subjects?: readonly string[]): VerdictInput {
  return withResult({ warnings: [{ code, detail: `The words of ${code}.`, subjects }] });
}

export function withStanding(change: Partial<NonNullable<FitResult['standing']>>): VerdictInput {
  if (sound.result.standing === null) throw new Error('expected a sound fit to have a standing');
  return withResult({ standing: { ...sound.result.standing, ...change } });
}

export function withDifferences(change: Partial<EstimatorSlope>): VerdictInput {
  const slope = { name: 'capex', estimate: 1, standardError: 0.1, low: 0.8, high: 1.2, ...change };
  return {
    ...sound,
    estimators: sound.estimators.map((one) =>
      one.code === 'first-differences' ? { ...one, slopes: [slope] } : one,
    ),
  };
}

export function withAlternative(
  code: Alternative['code'],
  standing: Alternative['standing'],
): VerdictInput {
  return {
    ...sound,
    alternatives: sound.alternatives.map((one) => (one.code === code ? { ...one, standing } : one)),
  };
}

export function withTest(code: string): VerdictInput {
  const list = sound.tests.list.map((one) =>
    one.code === code ? { ...one, holm: 'rejects' as const, pValue: 0.0001 } : one,
  );
  return { ...sound, tests: { ...sound.tests, list } };
}

/** With rows that lack two cells each, all from one line of a file with a column a year. */
export function withDropped(rows: number, lag: 0 | 1): VerdictInput {
  const { sample, specification } = sound.result;
  const dropped = Array.from({ length: rows }, (_, row) => {
    const place = { company: 'K03', year: 1900 + row, row: 4, reason: 'missing' as const };
    return [
      { ...place, column: 'value' },
      { ...place, column: 'capex' },
    ];
  }).flat();
  return withResult({
    sample: { ...sample, dropped },
    specification: { ...specification, lag },
  });
}

/** With the own company's last years alone. */
export function withOwnYears(count: number): VerdictInput {
  return withResult({ ownYears: sound.result.ownYears?.slice(-count) ?? null });
}

export function withDefault({ isChosen, low }: { isChosen: boolean; low: number }): VerdictInput {
  return {
    ...sound,
    covariances: sound.covariances.map((one) =>
      one.isDefault
        ? { ...one, isChosen, slopes: one.slopes?.map((slope) => ({ ...slope, low })) ?? null }
        : one,
    ),
  };
}
