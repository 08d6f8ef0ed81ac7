import type { PeerYear } from './prediction';
import type { WithinFit } from './regression/within-fit';

/** Every peer's row in the own company's last year, by the peers' names; peers without one are left out. */
export function peerYearsOf(fit: WithinFit, own: number): PeerYear[] {
  const { sample, residuals, relativeIntercepts } = fit;
  const lastYear = sample.year[sample.starts[own + 1] - 1];
  const peers: PeerYear[] = [];
  sample.companies.forEach((company, index) => {
    let row = sample.starts[index + 1] - 1;
    while (row > sample.starts[index] && sample.year[row] > lastYear) row -= 1;
    if (index === own || sample.year[row] !== lastYear) return;
    peers.push({
      company,
      interceptGap: relativeIntercepts[own] - relativeIntercepts[index],
      regressors: sample.levels.regressors.map((column) => column[row]),
      residual: residuals[row],
    });
  });
  return peers;
}
