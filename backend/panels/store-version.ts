import { randomUUID } from 'node:crypto';
import type { InsertOptions } from '../../db/repositories/panel-rows-repository';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { FileRecipe } from '../compute/file-recipe';
import type { FilePanel } from '../compute/parse-messages';
import { assertCheckedOn } from './assert-checked-on';
import type { ImportCheck, PanelMapping } from './import-draft';

export interface ImportedVersion {
  readonly fileId: string;
  readonly mapping: PanelMapping;
  readonly check: ImportCheck;
  readonly note: string;
  readonly personId: string;
  readonly panel: FilePanel;
}

/**
 * Writes a panel version read from a file: the next one of the newest panel of the same name, or the first of a new one.
 *
 * @returns the version's id.
 * @throws {Conflict} `stale-version` when the panel has another version since the check.
 */
export async function storeVersion(
  tx: WorkspaceRepositories,
  { fileId, mapping, check, note, personId, panel }: ImportedVersion,
  writing: InsertOptions,
): Promise<string> {
  await tx.panels.lockName(mapping.panelName);
  const parent = await tx.panels.findLatestByName(mapping.panelName);
  assertCheckedOn(parent, check);
  const panelId = parent?.panelId ?? randomUUID();
  if (parent === undefined) await tx.panels.insertPanel(panelId, mapping.panelName);
  const id = randomUUID();
  await tx.panels.insertVersion({
    id,
    panelId,
    number: (parent?.number ?? 0) + 1,
    parentId: parent?.id ?? null,
    fileId,
    origin: 'import',
    recipe: recipeOf(mapping),
    currency: mapping.currency,
    unit: mapping.unit,
    companyHeader: mapping.company,
    yearHeader: mapping.year,
    columns: columnsOf(mapping),
    note,
    companies: panel.companies.length,
    rowCount: panel.year.length,
    firstYear: panel.year.reduce((least, year) => Math.min(least, year)),
    lastYear: panel.year.reduce((most, year) => Math.max(most, year)),
    createdBy: personId,
  });
  await tx.panelRows.insert(id, panel, writing);
  await tx.panels.insertCompanies(
    id,
    panel.companies
      .map((company, code) => ({ company, attributes: panel.attributes[code] }))
      .filter(({ attributes }) => Object.keys(attributes).length > 0),
  );
  return id;
}

/** The whole mapping but for the panel's name, which the version has already. */
function recipeOf({ panelName: _, ...recipe }: PanelMapping): FileRecipe {
  return recipe;
}

function columnsOf(mapping: PanelMapping): PanelVersionRow['columns'] {
  return [
    { name: mapping.marketValue, role: 'marketValue' },
    { name: mapping.capex, role: 'capex' },
    { name: mapping.bookEquity, role: 'bookEquity' },
    ...mapping.others.map((name) => ({ name, role: 'other' as const })),
  ];
}
