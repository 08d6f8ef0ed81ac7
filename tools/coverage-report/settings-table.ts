import { markdownTable } from './markdown-table';
import type { Setting } from './setting';

export function settingsTable(settings: readonly Setting[]): string {
  return markdownTable(
    [
      'setting',
      'seed',
      'N',
      'T',
      'regressors',
      'ρ of errors and regressors',
      'sizes',
      'own company',
      'common shock',
      'rows',
      'effects',
    ],
    settings.map((setting) => [
      setting.name,
      String(setting.seed),
      String(setting.companies),
      String(setting.years),
      String(setting.regressors),
      persistenceText(setting),
      setting.sizes,
      setting.own === 'each' ? 'each in turn' : setting.own,
      setting.commonShock,
      setting.rows,
      setting.effects,
    ]),
  );
}

function persistenceText({ persistence }: Setting): string {
  if (persistence.kind === 'like') return String(persistence.rho);
  if (persistence.kind === 'varied') return `uniform in (${persistence.from}, ${persistence.to})`;
  return `own ${persistence.own}, peers ${persistence.peers}`;
}
