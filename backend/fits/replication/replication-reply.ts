import { cautions } from '../../contract';
import {
  type ReplicationLineage,
  type ReplicationResults,
  replicationSchema,
} from '../../contract/replication';
import { toEvidence } from '../evidence-reply';
import { toFitResultReply } from '../fit-replies';
import { readmeText } from './readme-text';
import type { PackFile, PackLineage, ReplicationPack } from './replication-pack';
import { rowsCsv } from './rows-csv';

/** The files of a replication pack, in their order; the same fit gives the same bytes. */
export function replicationFiles(pack: ReplicationPack): readonly PackFile[] {
  const { result, names, evidence, lineage } = pack;
  const { lag } = result.specification;
  const header = { ...names, outcome: result.outcome, lag };
  return [
    { name: 'README.txt', text: readmeText(pack) },
    { name: 'CAUTIONS.txt', text: `${cautions.join('\n\n')}\n` },
    { name: 'rows.csv', text: rowsCsv(header, pack.rows) },
    { name: 'results.json', text: json(results(pack)) },
    { name: 'schema.json', text: schemaText() },
    ...(evidence === null ? [] : [{ name: 'evidence.json', text: json(toEvidence(evidence)) }]),
    ...(lineage === null ? [] : [{ name: 'lineage.json', text: json(chain(pack, lineage)) }]),
    { name: 'replication.R', text: pack.script },
  ];
}

function results({ result, names, ...pack }: ReplicationPack): ReplicationResults {
  return {
    $schema: 'schema.json',
    specification: {
      ...result.specification,
      outcome: result.outcome,
      regressors: [...names.regressors],
      ownCompany: pack.ownCompany,
    },
    currency: pack.currency,
    unit: pack.unit,
    result: toFitResultReply(result),
  };
}

function chain(
  { result, ownCompany, currency, unit }: ReplicationPack,
  { fit, peerGroupVersion, panelVersion, importedFile }: PackLineage,
): ReplicationLineage {
  return {
    fit: { ...fit, hash: result.hash, engine: result.engine },
    peerGroupVersion: {
      ...peerGroupVersion,
      ownCompany: ownCompany ?? '',
      companies: [...peerGroupVersion.companies],
    },
    panelVersion: { ...panelVersion, currency: currency ?? '', unit: unit ?? '' },
    importedFile,
  };
}

let schema: string | undefined;

/** Made once: it is the same for every fit. */
function schemaText(): string {
  return (schema ??= json(replicationSchema()));
}

/** Characters up to which a file is laid out for reading; above, that would make it larger still and cost time. */
const mostLaidOut = 1_000_000;

function json(value: object): string {
  const plain = JSON.stringify(value);
  return `${plain.length > mostLaidOut ? plain : JSON.stringify(value, null, 2)}\n`;
}
