import { mostReplications, type Persistence, type Setting } from './setting';

type Usual = Omit<Setting, 'name' | 'seed' | 'companies' | 'years' | 'persistence'>;

/** What differs from the usual, and the end of the setting's name that says so. */
interface Varied extends Partial<Usual> {
  readonly suffix?: string;
}

const usual: Usual = {
  regressors: 2,
  sizes: 'equal',
  own: 'each',
  commonShock: 'none',
  rows: 'all',
  effects: 'company',
  hasWild: false,
};

const skewed = { sizes: 'skewed' } as const;
const single = { regressors: 1 } as const;
const short = { rows: 'last 5 of the own', own: 'first' } as const;
const wild = { hasWild: true } as const;

/** Every setting of the report; seeds go with the place in this list, so new ones are added at its end. */
export const settings: readonly Setting[] = [
  like(12, 20, 0, { ...single, ...wild }),
  like(12, 20, 0.5, single),
  like(12, 20, 0.8, { ...single, ...wild }),
  like(12, 20, 0, { ...single, ...skewed }),
  like(12, 20, 0.5, { ...single, ...skewed }),
  like(12, 20, 0.8, { ...single, ...skewed, ...wild }),
  like(12, 10, 0, {}),
  like(12, 10, 0.5, {}),
  like(12, 10, 0.8, {}),
  like(12, 10, 0, skewed),
  like(12, 10, 0.5, skewed),
  like(12, 10, 0.8, skewed),
  like(8, 20, 0, {}),
  like(8, 20, 0.8, {}),
  like(8, 20, 0.5, { ...skewed, ...wild }),
  like(8, 10, 0.5, {}),
  like(8, 10, 0.8, skewed),
  like(20, 20, 0, {}),
  like(20, 20, 0.8, wild),
  like(20, 20, 0.5, { ...skewed, ...wild }),
  like(20, 10, 0.5, {}),
  like(20, 10, 0.8, skewed),
  like(12, 20, 0.5, { commonShock: 'errors', suffix: 'shock-in-errors' }),
  like(12, 10, 0.8, { commonShock: 'errors', suffix: 'shock-in-errors' }),
  like(12, 20, 0.5, { commonShock: 'errors and regressors', suffix: 'shock-in-both' }),
  apart('own-more-persistent', 20, { kind: 'own apart', own: 0.85, peers: 0.4 }),
  apart('own-more-persistent', 10, { kind: 'own apart', own: 0.85, peers: 0.4 }),
  apart('varied-persistence', 20, { kind: 'varied', from: 0.2, to: 0.9 }),
  apart('varied-persistence', 10, { kind: 'varied', from: 0.2, to: 0.9 }),
  like(12, 20, 0, { ...short, suffix: 'own-last-5' }),
  like(12, 20, 0.5, { ...short, suffix: 'own-last-5' }),
  like(12, 20, 0.8, { ...short, suffix: 'own-last-5' }),
  like(12, 20, 0.5, { rows: 'one in five missing', suffix: 'missing-rows' }),
  like(12, 10, 0.8, { rows: 'one in five missing', suffix: 'missing-rows' }),
  like(12, 20, 0.5, { ...skewed, own: 'largest', suffix: 'own-largest' }),
  like(12, 20, 0.5, { ...skewed, own: 'smallest', suffix: 'own-smallest' }),
  like(12, 20, 0.5, {
    commonShock: 'errors and regressors',
    effects: 'company,year',
    suffix: 'shock-in-both-year-effects',
  }),
  like(12, 20, 0, { rows: 'last 10 of the own', own: 'first', suffix: 'own-last-10' }),
  like(12, 20, 0, { rows: 'last 14 of the own', own: 'first', suffix: 'own-last-14' }),
  like(12, 20, 0, { rows: 'last 3 of the own', own: 'first', suffix: 'own-last-3' }),
].map((setting, index) => ({ ...setting, seed: (index + 1) * mostReplications }));

function like(
  companies: number,
  years: number,
  rho: number,
  { suffix, ...varied }: Varied,
): Omit<Setting, 'seed'> {
  const end = suffix ?? (varied.sizes === 'skewed' ? 'skewed' : null);
  return {
    ...usual,
    ...varied,
    name: `n${companies}-t${years}-rho${rho}${end === null ? '' : `-${end}`}`,
    companies,
    years,
    persistence: { kind: 'like', rho },
  };
}

function apart(suffix: string, years: number, persistence: Persistence): Omit<Setting, 'seed'> {
  const own = persistence.kind === 'own apart' ? 'first' : 'each';
  return { ...usual, own, name: `n12-t${years}-${suffix}`, companies: 12, years, persistence };
}
