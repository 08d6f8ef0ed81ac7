import { readFileSync } from 'node:fs';
import { eventually } from '../../db/testing/eventually';
import type { EditionReply, FitReply, ImportReply, StartFit } from '../contract';
import type { TestClient } from './test-client';

/** Market value on investment and capital stock of 11 companies, 1935 to 1954: open data, see stats/golden. */
export function referencePanel(): string {
  return readFileSync(
    new URL('../stats/golden/grunfeld11_value_on_inv_capital.csv', import.meta.url),
    'utf8',
  );
}

export const referenceMapping = {
  panelName: 'Reference',
  company: 'company',
  year: 'year',
  marketValue: 'value',
  capex: 'inv',
  bookEquity: 'capital',
  others: [],
  currency: 'USD',
  unit: 'millions',
};

/** Brings a panel in and answers its version's id. */
export async function importPanel(
  analyst: TestClient,
  text = referencePanel(),
  mapping: object = referenceMapping,
): Promise<string> {
  const uploaded = await analyst.upload('/api/imports', 'panel.csv', text);
  const importId = idOf(uploaded, 201);
  const checked = await analyst.put(`/api/imports/${importId}/mapping`, mapping);
  idOf(checked, 200);
  return commitImport(analyst, importId, 'first');
}

/** Commits a checked import and waits for its panel version. @returns the version's id. */
export async function commitImport(
  analyst: TestClient,
  importId: string,
  note = '',
): Promise<string> {
  idOf(await analyst.post(`/api/imports/${importId}/commit`, { note }), 202);
  const ended = await importThatEnded(analyst, importId);
  if (ended.panelVersionId === null)
    throw new Error(`the import ended ${ended.state}: ${ended.failure ?? ''}`);
  return ended.panelVersionId;
}

/** Waits for an import that is being committed. */
export function importThatEnded(analyst: TestClient, importId: string): Promise<ImportReply> {
  return eventually('the end of an import', async () => {
    const found = (await analyst.get(`/api/imports/${importId}`)).body as ImportReply;
    return found.state === 'committing' ? undefined : found;
  });
}

/** Saves a peer group of the own company and all others, each with a reason. */
export async function savePeers(
  analyst: TestClient,
  panelVersionId: string,
  ownCompany: string,
  parentId: string | null = null,
): Promise<string> {
  const listed = await analyst.get(`/api/panel-versions/${panelVersionId}/companies`);
  const { companies } = listed.body as { companies: { name: string }[] };
  const peers = companies
    .filter(({ name }) => name !== ownCompany)
    .map(({ name }) => ({ company: name, isIncluded: true, reason: 'In the reference set.' }));
  const saved = await analyst.post('/api/peer-groups', {
    panelVersionId,
    ownCompany,
    note: '',
    parentId,
    peers,
  });
  return idOf(saved, 201);
}

/** Starts a fit, the plain one unless a specification is given, and waits for it. */
export async function runFit(
  analyst: TestClient,
  peerGroupId: string,
  specification: Partial<StartFit> = {},
): Promise<FitReply> {
  const started = await analyst.post('/api/fits', { ...specification, peerGroupId });
  if (started.status !== 202) throw new Error(`starting a fit answered ${started.text}`);
  const { fit } = started.body as FitReply;
  return eventually('the end of a fit', async () => {
    const found = (await analyst.get(`/api/fits/${fit.id}`)).body as FitReply;
    return ['queued', 'running'].includes(found.fit.state) ? undefined : found;
  });
}

export function idOf(
  response: { readonly status: number; readonly body: unknown; readonly text: string },
  status: number,
): string {
  if (response.status !== status)
    throw new Error(`expected status ${status}; found ${response.status}: ${response.text}`);
  return (response.body as { id: string }).id;
}

/** Opens every serious warning of an edition, as whoever signs has to. */
export async function openWarnings(cfo: TestClient, editionId: string): Promise<void> {
  const path = `/api/editions/${editionId}`;
  const { content } = (await cfo.get(path)).body as EditionReply;
  for (const { id } of content.warnings.filter(({ isSerious }) => isSerious)) {
    const opened = await cfo.put(`${path}/warnings/${id}`, {});
    if (opened.status !== 204) throw new Error(`opening ${id} answered ${opened.text}`);
  }
}
