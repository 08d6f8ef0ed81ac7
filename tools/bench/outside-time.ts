import { spawnSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { PanelColumns } from '../../backend/stats';

/**
 * Milliseconds of R's panel package for the same panel: plm's within fit, its classical and company-clustered
 * covariance and its fixed effects; the reading of the data is not counted. Null where R or plm is not installed.
 */
export function outsideMs(
  data: PanelColumns,
  { folder, scripts }: { readonly folder: string; readonly scripts: string },
): number | null {
  const columns = [data.outcome.values, ...data.regressors.map(({ values }) => values)];
  const doubles = [Float64Array.from(data.company), Float64Array.from(data.year), ...columns];
  const path = join(folder, 'panel.bin');
  writeFileSync(path, Buffer.concat(doubles.map(({ buffer }) => Buffer.from(buffer))));
  const rows = String(data.company.length);
  const { status, stdout } = spawnSync('Rscript', [join(scripts, 'plm-time.R'), path, rows], {
    encoding: 'utf8',
    timeout: 600_000,
  });
  return status === 0 ? Number(stdout.trim()) : null;
}
