/** `1 peer`, `2 peers`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** The page's finding: whom the own company is compared with, and out of how many. */
export function peersFinding(ownCompany: string, inCount: number, outCount: number): string {
  if (ownCompany === '') return 'Who do we compare ourselves with, and why?';
  if (inCount === 0) return `${ownCompany} has no peers yet`;
  const all = inCount + outCount;
  return outCount === 0
    ? `${ownCompany} is compared with all ${counted(all, 'other company', 'other companies')} of the panel`
    : `${ownCompany} is compared with ${inCount} of ${counted(all, 'other company', 'other companies')}`;
}

/** `FY2008–FY2025`, or `FY2008` for one year. */
export function yearsText(firstYear: number, lastYear: number): string {
  return firstYear === lastYear ? `FY${firstYear}` : `FY${firstYear}–FY${lastYear}`;
}
