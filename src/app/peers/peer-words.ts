import { counted } from '../ui/phrases';
/** The page's finding: whom the own company is compared with, and out of how many. */
export function peersFinding(ownCompany: string, inCount: number, outCount: number): string {
  if (ownCompany === '') return 'Who do we compare ourselves with, and why?';
  if (inCount === 0) return `${ownCompany} has no peers yet`;
  const all = inCount + outCount;
  return outCount === 0
    ? `${ownCompany} is compared with all ${counted(all, 'other company', 'other companies')} of the panel`
    : `${ownCompany} is compared with ${inCount} of ${counted(all, 'other company', 'other companies')}`;
}
