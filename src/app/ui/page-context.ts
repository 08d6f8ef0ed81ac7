import { Injectable, signal } from '@angular/core';
import type { MoneyUnit } from '@figures';

/** One step of the lineage line: panel version, peer group version, fit, scenario. */
export interface LineageStep {
  /** `Panel`, `Peers`, `Fit`, or a scenario's name. */
  readonly label: string;
  /** `v4`, or the first characters of a hash. */
  readonly version?: string;
  /** `FY2008–FY2025`, `13 companies`. */
  readonly detail?: string;
  /** Where the step opens. */
  readonly link: string;
}

/** Said in words where something in the lineage has a newer version. */
export interface StaleNotice {
  readonly text: string;
  readonly action?: { readonly label: string; readonly link: string };
}

export interface ShownContext {
  readonly ownCompany?: string;
  readonly currency?: string;
  readonly unit?: MoneyUnit;
  readonly lineage?: readonly LineageStep[];
  readonly stale?: StaleNotice | null;
}

/**
 * What a page tells the frame around it: whose figures these are, in which currency, and where they come from.
 * A page calls `show` when its data is there; the shell clears it on leaving the page.
 * The page's title needs it from the start, so it must not draw the chart layouts in: NumberFormat builds on it.
 */
@Injectable({ providedIn: 'root' })
export class PageContext {
  readonly #ownCompany = signal('');
  readonly #lineage = signal<readonly LineageStep[]>([]);
  readonly #stale = signal<StaleNotice | null>(null);

  readonly ownCompany = this.#ownCompany.asReadonly();
  /** ISO 4217 code of the panel; empty where no money is shown. */
  readonly currency = signal('');
  /** The unit of the panel's numbers. */
  readonly panelUnit = signal<MoneyUnit>('units');
  readonly lineage = this.#lineage.asReadonly();
  readonly stale = this.#stale.asReadonly();

  /** Replaces the whole context; what is left out is empty. */
  show(context: ShownContext): void {
    this.#ownCompany.set(context.ownCompany ?? '');
    this.currency.set(context.currency ?? '');
    this.panelUnit.set(context.unit ?? 'units');
    this.#lineage.set(context.lineage ?? []);
    this.#stale.set(context.stale ?? null);
  }

  clear(): void {
    this.show({});
  }
}
