import * as z from 'zod';
import { Evidence } from './evidence';
import { FitResult } from './fits';
import { PeerChoice } from './peers';

// Not behind the contract's door: the browser reads none of it, and would load the schema writer with it.

/** `results.json` of a replication pack. */
export const ReplicationResults = z.object({
  /** Where this is described: a file beside it. */
  $schema: z.literal('schema.json'),
  specification: z.object({
    ...FitResult.shape.specification.shape,
    outcome: z.string().describe('name of the outcome as the panel has it'),
    regressors: z.array(z.string()).describe('names of the regressors, in the order of rows.csv'),
    ownCompany: z.string().nullable().describe('null for a fit without a standing'),
  }),
  /** Of amounts in the outcome's measure. */
  currency: z.string().nullable(),
  unit: z.enum(['units', 'thousands', 'millions', 'billions']).nullable(),
  result: FitResult,
});
export type ReplicationResults = z.infer<typeof ReplicationResults>;

const madeBy = { createdAt: z.iso.datetime(), createdBy: z.string() };

/** `lineage.json`: fit ← specification ← peer group version ← panel version ← imported file. */
export const ReplicationLineage = z.object({
  fit: z.object({ id: z.string(), hash: z.string(), engine: z.string(), ...madeBy }),
  peerGroupVersion: z.object({
    number: z.number().int(),
    ownCompany: z.string(),
    note: z.string(),
    companies: z.array(PeerChoice),
    ...madeBy,
  }),
  panelVersion: z.object({
    panel: z.string(),
    number: z.number().int(),
    currency: z.string(),
    unit: z.string(),
    note: z.string(),
    ...madeBy,
  }),
  importedFile: z.object({ name: z.string(), sha256: z.string() }),
});
export type ReplicationLineage = z.infer<typeof ReplicationLineage>;

/** JSON Schema of `results.json`, with that of the evidence beside it. */
export function replicationSchema(): object {
  return {
    ...z.toJSONSchema(ReplicationResults),
    title: 'results.json of a replication pack',
    $defs: { evidence: { title: 'evidence.json', ...withoutDialect(z.toJSONSchema(Evidence)) } },
  };
}

function withoutDialect({ $schema: _, ...schema }: Record<string, unknown>): object {
  return schema;
}
