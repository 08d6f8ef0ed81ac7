import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { EditionContent } from '@contract';
import type { ExpectedPathChoice } from '@figures';
import { expectedValue, heldRegressors } from '@prediction';
import type { PlannedFigure } from '../api/lineage-store';
import { ExpectedPath } from '../charts/expected-path/expected-path';
import { Figure } from '../ui/figure';
import { asDifference, differenceKind } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { chosenFigure } from '../ui/plan/chosen-figure';
import { PlanAssumptions } from '../ui/plan/plan-assumptions';
import { expectedPathData } from '../ui/plan/plan-data';
import { PlanTable, type PlannedFigureWanted } from '../ui/plan/plan-table';
import { decidingYear, expectedName, planFinding } from '../ui/plan/plan-words';
import { planLineage } from '../ui/plan/planned-figure';
import { type Remark, RemarkList } from '../ui/remark-list';
import { Sentence, type SentenceFigureWanted } from '../ui/sentence';
import { EditionLevels } from './edition-levels';
import { EditionLines } from './edition-lines';
import { EditionPeers } from './edition-peers';
import {
  confidentialityWords,
  labelsOf,
  modelText,
  placesText,
  sampleText,
  shareText,
} from './edition-words';
import { plannedIn } from './planned-in';

/** A figure of the edition whose lineage is wanted. */
export interface EditionFigure {
  readonly key: string;
  readonly planned?: PlannedFigure;
}

/**
 * One edition on one sheet, from its frozen content and nothing else; what follows it (signature, or what keeps it
 * from being published) goes into the slot.
 */
@Component({
  selector: 'kv-edition-sheet',
  imports: [
    DatePipe,
    EditionLevels,
    EditionLines,
    EditionPeers,
    ExpectedPath,
    Figure,
    PlanAssumptions,
    PlanTable,
    RemarkList,
    Sentence,
  ],
  templateUrl: './edition-sheet.html',
  styleUrl: './edition-sheet.css',
  host: { class: 'kv-sheet' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionSheet {
  readonly #numbers = inject(NumberFormat);

  readonly content = input.required<EditionContent>();
  /** SHA-256 of the content; empty while it is not frozen. */
  readonly sha256 = input('');
  /** Under another page's heading, so that the sentence is no heading of the first level. */
  readonly isPreview = input(false);
  /** Whether the headline is being edited in its place: what edits it goes into the slot `editionHeadline`. */
  readonly isHeadlineOpen = input(false);
  readonly figureOpened = output<EditionFigure>();

  protected readonly confidentialityWords = confidentialityWords;
  readonly #form = computed(() => this.content().fit.specification.form);
  protected readonly isLog = computed(() => this.#form() === 'log');
  protected readonly differenceKind = computed(() => differenceKind(this.#form()));
  protected readonly standing = computed(() => {
    const { standing } = this.content().fit;
    return standing === null ? null : asDifference(standing, this.#form());
  });
  protected readonly model = computed(() => modelText(this.content().fit.specification));
  protected readonly expectedName = computed(() => expectedName(this.#form()).toLowerCase());
  protected readonly longestPlan = computed(() =>
    Math.max(0, ...this.plans().map(({ years }) => years.length)),
  );
  protected readonly labels = computed(() => labelsOf(this.content()));
  protected readonly level = computed(() => shareText(this.content().fit.specification.confidence));
  protected readonly unit = this.#numbers.unitLabel;
  protected readonly places = computed(() => placesText(this.content().fit));
  protected readonly sample = computed(() => sampleText(this.content().fit));
  protected readonly caption = computed(() => `${this.unit()} · ${this.level()} intervals`);
  protected readonly warnings = computed(() =>
    this.content().fit.warnings.map(({ detail }): Remark => ({ kind: 'caution', text: detail })),
  );
  protected readonly plans = computed(() =>
    this.content().scenarios.map(({ name, note, plan, years }) => ({
      name,
      note,
      years: years.map((year, index) => ({ ...year, values: plan[index].values })),
    })),
  );
  protected readonly planTitle = computed(() => {
    const [first] = this.plans();
    const last = first && decidingYear(first.years);
    if (last === undefined) return 'Actual and expected market value';
    const { ownCompany } = this.content();
    const form = this.#form();
    return planFinding(first.name, { company: ownCompany, form }, last, this.#numbers);
  });
  protected readonly path = computed(() => {
    const { fit } = this.content();
    if (fit.prediction === null || fit.ownYears === null) return null;
    const base = expectedValue(fit.prediction, heldRegressors(fit.prediction));
    return expectedPathData(fit.ownYears, base, this.plans());
  });

  protected readonly pathText = computed(() => {
    const { number, fit } = this.content();
    return {
      title: this.planTitle(),
      caption: this.caption(),
      source: `Edition ${number}, fit ${fit.hash.slice(0, 6)}`,
    };
  });

  /** A year of the chart: what the model expected of it, or expects of it under the plan that was chosen. */
  protected openYear(choice: ExpectedPathChoice): void {
    if (choice.kind === 'actual') this.figureOpened.emit({ key: `fitted.${choice.year}` });
    const basis = this.content().fit.prediction;
    const planned = basis === null ? undefined : chosenFigure(basis, this.plans(), choice);
    if (planned !== undefined) this.openPlanned(planned);
  }

  /** A figure of a sentence; one of a plan with what only the edition knows of it. */
  protected openWritten({ figure, value }: SentenceFigureWanted): void {
    const planned = plannedIn(this.plans(), figure, value, this.#form());
    if (planned === undefined) this.figureOpened.emit({ key: figure });
    else this.openPlanned(planned);
  }

  protected openPlanned(wanted: PlannedFigureWanted): void {
    const basis = this.content().fit.prediction;
    if (basis === null) return;
    const { key, ...planned } = planLineage(wanted, this.labels(), basis);
    this.figureOpened.emit({ key, planned });
  }
}
