import { type VerdictInput, type VerdictRule, warningRule } from './verdict-rule';

const muchMissing = 0.1;

/** What speaks against a fit because of the rows it rests on. */
export const sampleRules: readonly VerdictRule[] = [
  {
    ...warningRule('perfect-fit', 'serious'),
    leavesNothing: true,
  },
  warningRule('few-companies', 'serious'),
  warningRule('few-years', 'notable'),
  warningRule('single-row', 'notable'),
  warningRule('spelling', 'notable'),
  { code: 'missing-rows', weight: 'notable', when: missingRows },
];

/**
 * A lag takes the first row of every member by construction, which is not counted as missing; of the others the result
 * does not tell whether a regressor of their own is missing or that of the year before.
 */
function missingRows({ result: { members, sample, specification } }: VerdictInput): string | null {
  const left = new Set(sample.dropped.map(({ company, year }) => `${year} ${company}`)).size;
  const used = sample.observations + sample.singleRow.length;
  const byLag = specification.lag * members.length;
  const missing = Math.max(0, left - byLag);
  const share = missing / (missing + used);
  if (share <= muchMissing) return null;
  const rows = `${missing} of ${missing + used} rows (${(100 * share).toFixed(0)} %)`;
  return specification.lag === 0
    ? `${rows} lack a value and are left out.`
    : `${rows} lack a value of their own or of the year before and are left out, beside each company’s first row.`;
}
