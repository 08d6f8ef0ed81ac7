import type { PeerYear } from './prediction';
import type { WithinFit } from './regression/within-fit';

/** Every peer's row in the own company's last year, by the peers' names; peers without one are left out. */
export function peerYearsOf(fit: WithinFit, own: number): PeerYear[] {
  const { sample, residuals, relativeIntercepts } = fit;
  const lastYear = sample.year[sample.starts[own + 1] - 1];
  return sample.companies.flatMap((company, index): PeerYear[] => {
    if (index === own) return [];
    const from = sample.starts[index];
    const place = sample.year.subarray(from, sample.starts[index + 1]).indexOf(lastYear);
    if (place === -1) return [];
    const row = from + place;
    return [
      {
        company,
        interceptGap: relativeIntercepts[own] - relativeIntercepts[index],
        regressors: sample.levels.regressors.map((column) => column[row]),
        residual: residuals[row],
      },
    ];
  });
}
