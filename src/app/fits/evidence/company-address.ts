import type { NavigationExtras } from '@angular/router';
import type { FitReply, FitResult } from '@contract';

/**
 * Where a company that is selected leads, as the router wants it: a peer to its reason in the peer group of the fit;
 * the own company, which needs none, to its newest row of the panel.
 */
export function companyAddress(
  { panelVersion, peerGroup, fit }: FitReply,
  { ownYears }: FitResult,
  company: string,
): [commands: string[], extras: NavigationExtras] {
  const newest = company === fit.ownCompany ? ownYears?.at(-1) : undefined;
  return newest === undefined
    ? [['/peers', peerGroup.id], { queryParams: { company } }]
    : [['/panel', panelVersion.id], { queryParams: { company, year: newest.year } }];
}
