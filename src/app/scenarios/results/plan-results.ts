import { Injectable, computed, inject } from '@angular/core';
import type { PlanOutlook, PlanUncertainty } from '@contract';
import type { PredictionBasis } from '@prediction';
import { NumberFormat } from '../../ui/number-format';
import { confidenceText, shortHash } from '../../ui/phrases';
import { isUncertain } from '../../ui/plan/change-asked';
import type { PlanReading, PlannedYear } from '../../ui/plan/read-plan';
import { ScenarioState } from '../scenario-state';
import { outlookWords } from '../outlook/outlook-words';

/** The plan on the page with what it is read by and what it comes to. */
export interface ShownResults {
  /** `This plan` while it has no name. */
  readonly name: string;
  /** At the confidence of the outlook. */
  readonly basis: PredictionBasis;
  readonly labels: readonly string[];
  readonly plan: readonly PlannedYear[];
  readonly outlook: PlanOutlook;
  readonly uncertainty: PlanUncertainty | null;
  readonly reading: PlanReading;
  /** Unit and confidence: `EUR m · 95 % intervals`. */
  readonly caption: string;
  /** The line under an export. */
  readonly source: string;
}

const unnamed = 'This plan';

/** What every result of the plan on the page is made from; null until there is a plan. */
@Injectable()
export class PlanResults {
  readonly #numbers = inject(NumberFormat);
  readonly #state = inject(ScenarioState);

  /** Whether any amount of the plan has a low and a high. */
  readonly isUncertain = computed(() => isUncertain(this.#state.text()));
  readonly name = computed(() => this.#state.text().name.trim() || unnamed);
  readonly caption = computed(() =>
    resultCaption(this.#numbers.unitLabel(), this.#state.text().outlook),
  );
  readonly source = computed(() => {
    const ground = this.#state.ground();
    return ground === null
      ? ''
      : resultSource(this.#numbers.unitLabel(), ground.basis, {
          outlook: this.#state.text().outlook,
          hash: ground.fit.fit.hash,
        });
  });
  readonly shown = computed((): ShownResults | null => {
    const [ground, reading] = [this.#state.ground(), this.#state.reading()];
    if (ground === null || reading === null) return null;
    const { plan, outlook, uncertainty } = this.#state.text();
    return {
      name: this.name(),
      basis: reading.basis,
      labels: ground.labels,
      plan,
      outlook,
      uncertainty,
      reading,
      caption: this.caption(),
      source: this.source(),
    };
  });
}

export function resultCaption(unit: string, { confidence }: Pick<PlanOutlook, 'confidence'>) {
  return `${unit} · ${confidenceText(confidence)} intervals`;
}

export function resultSource(
  unit: string,
  basis: PredictionBasis,
  { outlook, hash }: { readonly outlook: PlanOutlook; readonly hash: string | null },
): string {
  return `${unit} · ${outlookWords(outlook, basis)} · against the base, which holds FY${basis.last.year} · standing held fixed · fit ${shortHash(hash)}`;
}
