import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import type { EditionContent } from '@contract';
import type { ExpectedPathChoice } from '@figures';
import type { PlannedFigure } from '../api/lineage-store';
import { ExpectedPath } from '../charts/expected-path/expected-path';
import { Figure } from '../ui/figure';
import { Mark } from '../ui/mark';
import { asDifference, differenceKind } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { counted } from '../ui/phrases';
import { chosenFigure } from '../ui/plan/chosen-figure';
import { PlanAssumptions } from '../ui/plan/plan-assumptions';
import { PlanTable, type PlannedFigureWanted } from '../ui/plan/plan-table';
import { decidingYear, expectedName, planFinding } from '../ui/plan/plan-words';
import { planLineage } from '../ui/plan/planned-figure';
import { regressorKind } from '../ui/plan/regressor-labels';
import { Sentence, type SentenceFigureWanted } from '../ui/sentence';
import { BlockComments } from './block-comments';
import { EditionChanges } from './edition-changes';
import { EditionLevels } from './edition-levels';
import { EditionLines } from './edition-lines';
import { editionBandName, editionPath } from './edition-path';
import { EditionPeers } from './edition-peers';
import { EditionWarnings } from './edition-warnings';
import {
  confidentialityMeaning,
  confidentialityWords,
  labelsOf,
  modelText,
  placesText,
  sampleText,
  shareText,
} from './edition-words';
import { planMaking } from './plan-making';
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
    BlockComments,
    DatePipe,
    EditionChanges,
    EditionLevels,
    EditionLines,
    EditionPeers,
    EditionWarnings,
    ExpectedPath,
    Figure,
    Mark,
    PlanAssumptions,
    PlanTable,
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
  /** Warnings that the person has opened, by id. */
  readonly openedWarnings = input<readonly string[]>([]);
  /** Whether the person is to sign, and so has to open the serious warnings. */
  readonly isToOpen = input(false);
  readonly figureOpened = output<EditionFigure>();
  readonly warningOpened = output<string>();

  private readonly warnings = viewChild(EditionWarnings);

  protected readonly confidentialityMeaning = confidentialityMeaning;
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
  protected readonly warningsTitle = computed(() => {
    const { warnings } = this.content();
    const serious = warnings.filter(({ isSerious }) => isSerious).length;
    return `${counted(warnings.length, 'warning')}, ${serious} serious`;
  });
  protected readonly moneyColumns = computed(() => {
    const { outcome, slopes } = this.content().fit;
    const money = slopes.filter((_, index) => regressorKind(index) === 'money');
    return [outcome, ...money.map(({ name }) => name)];
  });
  protected readonly plans = computed(() => {
    const { scenarios, fit } = this.content();
    const hasYearEffects = fit.yearEffects !== null;
    return scenarios.map((scenario) => {
      const { name, note, version, plan, years } = scenario;
      return {
        name,
        note,
        version,
        making: planMaking(scenario, this.labels(), hasYearEffects, this.#numbers),
        years: years.map((year, index) => ({ ...year, values: plan[index].values })),
      };
    });
  });
  protected readonly planTitle = computed(() => {
    const [first] = this.plans();
    const last = first && decidingYear(first.years);
    if (last === undefined) return 'Actual and expected market value';
    const { ownCompany } = this.content();
    const form = this.#form();
    return planFinding(first.name, { company: ownCompany, form }, last, this.#numbers);
  });
  protected readonly path = computed(() => editionPath(this.content()));
  protected readonly bandName = computed(() => editionBandName(this.content()));

  protected readonly pathText = computed(() => {
    const { number, fit } = this.content();
    return {
      title: this.planTitle(),
      caption: this.caption(),
      source: `Edition ${number}, fit ${fit.hash.slice(0, 6)}`,
    };
  });

  /** Takes the person to the first serious warning that is not opened. */
  focusNextWarning(): void {
    this.warnings()?.focusNext();
  }

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
