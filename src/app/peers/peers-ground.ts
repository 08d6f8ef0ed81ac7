import type { FitResult, PanelVersionSummary, PeerGroupReply, PeerGroupSummary } from '@contract';
import { type Bounded, asDifference, differenceKind } from '../ui/model-form';
import type { FigureKind } from '../ui/number-format';
import type { PanelCompany } from './peer-draft';

/** What the page stands on, as the server has it. */
export interface PeersGround {
  /** Newest first. */
  readonly panelVersions: readonly PanelVersionSummary[];
  /** Newest first. */
  readonly versions: readonly PeerGroupSummary[];
  /** The version shown; null before the first one is saved. */
  readonly saved: PeerGroupReply | null;
  /** Companies of the draft's panel version. */
  readonly companies: readonly PanelCompany[];
  /** What leaving each peer out changes, by the newest fit of the version shown; null where there is none. */
  readonly without: StandingsWithout | null;
}

export interface StandingsWithout {
  /** First characters of the fit's hash. */
  readonly fitName: string;
  /** How it writes its standings: money, or of a fit in logs a percentage. */
  readonly kind: FigureKind;
  /** With every peer. */
  readonly standing: Bounded;
  /** The own company's standing without each peer; null where none can be estimated. */
  readonly byCompany: ReadonlyMap<string, number | null>;
}

/** What leaving each peer out changes, by a fit; null where it has no standing. */
export function standingsWithout(result: FitResult): StandingsWithout | null {
  if (result.standing === null) return null;
  const { form } = result.specification;
  const shown = (estimate: number) => asDifference({ estimate, low: null, high: null }, form);
  return {
    fitName: result.hash.slice(0, 6),
    kind: differenceKind(form),
    standing: asDifference(result.standing, form),
    byCompany: new Map(
      result.withoutCompany.map(({ company, standing }) => [
        company,
        standing === null ? null : shown(standing).estimate,
      ]),
    ),
  };
}
