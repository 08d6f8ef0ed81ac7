import type { Evidence, FitResult } from '../../stats';
import type { RowUsed } from './rows-used';

/** All that a replication pack is made of, as plain data. */
export interface ReplicationPack {
  /** Read once, while the pack is written. */
  readonly rows: Iterable<RowUsed>;
  /** Names of the panel's columns. */
  readonly names: {
    readonly company: string;
    readonly year: string;
    readonly regressors: readonly string[];
  };
  readonly ownCompany: string | null;
  /** Of amounts; null where the panel names none. */
  readonly currency: string | null;
  readonly unit: 'units' | 'thousands' | 'millions' | 'billions' | null;
  readonly result: FitResult;
  readonly evidence: Evidence | null;
  /** Why there is no evidence, where somebody could look for it. */
  readonly evidenceReason?: string;
  /** Null for a fit that no workspace keeps. */
  readonly lineage: PackLineage | null;
  /** Text of `replication.R`. */
  readonly script: string;
}

interface Made {
  /** ISO 8601, UTC. */
  readonly createdAt: string;
  readonly createdBy: string;
}

/** The chain that a fit stands on. */
export interface PackLineage {
  readonly fit: Made & { readonly id: string };
  readonly peerGroupVersion: Made & {
    readonly number: number;
    readonly note: string;
    readonly companies: readonly {
      readonly company: string;
      readonly isIncluded: boolean;
      readonly reason: string;
    }[];
  };
  readonly panelVersion: Made & {
    readonly panel: string;
    readonly number: number;
    readonly note: string;
  };
  readonly importedFile: { readonly name: string; readonly sha256: string };
}

export interface PackFile {
  readonly name: string;
  /** Whole, or in parts that are made when they are asked for. */
  readonly text: string | Iterable<string>;
}
