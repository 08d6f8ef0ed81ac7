import { counted } from '../../ui/phrases';
import type { PeerNearness } from '../nearness/peer-nearness-of';

/** Companies within so many standard deviations are called near. */
const near = 1.5;

/** `7 of 60 companies lie within 1.5 standard deviations of Velmara`; the nearest one where none does. */
export function planeFinding(
  ownCompany: string,
  companies: number,
  { byCompany }: Pick<PeerNearness, 'byCompany'>,
): string {
  if (byCompany.size === 0) return `${counted(companies, 'company', 'companies')} side by side`;
  const distances = [...byCompany].sort(([, a], [, b]) => a.distance - b.distance);
  const within = distances.filter(([, { distance }]) => distance <= near).length;
  if (within > 0)
    return `${within} of ${counted(companies, 'company', 'companies')} ${within === 1 ? 'lies' : 'lie'} within ${near} standard deviations of ${ownCompany}`;
  const [nearest, { distance }] = distances[0];
  return `None of ${counted(companies, 'company', 'companies')} lies within ${near} standard deviations of ${ownCompany}: ${nearest}, the nearest, is ${distance.toFixed(2)} away`;
}
