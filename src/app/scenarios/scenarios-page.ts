import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  LOCALE_ID,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import type { ScenarioReply } from '@contract';
import type { ExpectedPathChoice } from '@figures';
import { LineageStore } from '../api/lineage-store';
import { DifferenceBars } from '../charts/difference-bars/difference-bars';
import { ExpectedPath } from '../charts/expected-path/expected-path';
import { CautionLine } from '../ui/caution-line';
import { EmptyState } from '../ui/empty-state';
import { levelKind, logUnit } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { withYearSet } from '../ui/plan/change-plan';
import { chosenFigure } from '../ui/plan/chosen-figure';
import { FamiliarNotes } from '../ui/plan/familiar-notes';
import { differenceData, expectedPathData } from '../ui/plan/plan-data';
import { PlanAssumptions } from '../ui/plan/plan-assumptions';
import { PlanEditor } from '../ui/plan/plan-editor';
import { PlanTable, type PlannedFigureWanted } from '../ui/plan/plan-table';
import { decidingYear, expectedName, planFinding } from '../ui/plan/plan-words';
import { planLineage } from '../ui/plan/planned-figure';
import type { PlannedYear } from '../ui/plan/read-plan';
import { ProblemNotice } from '../ui/problem-notice';
import { UndoNotice } from '../ui/undo-notice';
import { DraftKeeper } from './draft-keeper';
import { ScenarioEdits } from './scenario-edits';
import { ScenarioList } from './scenario-list';
import { ScenarioName, nameProblem } from './scenario-name';
import { ScenarioNotices } from './scenario-notices';
import { ScenarioShelf } from './scenario-shelf';
import { ScenarioState } from './scenario-state';
import { ScenarioStore } from './scenario-store';
import { storedFigures } from './scenario-text';
import { contextOf } from './scenario-words';
import { shortHash } from '../ui/phrases';

const unnamed = 'This plan';

/** What would our plan do to the expected value? */
@Component({
  selector: 'kv-scenarios-page',
  imports: [
    CautionLine,
    DifferenceBars,
    EmptyState,
    ExpectedPath,
    FamiliarNotes,
    MatButton,
    PageHeader,
    PlanAssumptions,
    PlanEditor,
    PlanTable,
    ProblemNotice,
    RouterLink,
    ScenarioList,
    ScenarioName,
    ScenarioNotices,
  ],
  templateUrl: './scenarios-page.html',
  styleUrl: './scenarios-page.css',
  providers: [DraftKeeper, ScenarioState, ScenarioEdits, ScenarioShelf, ScenarioStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenariosPage {
  readonly #destroyRef = inject(DestroyRef);
  readonly #context = inject(PageContext);
  readonly #lineage = inject(LineageStore);
  readonly #locale = inject(LOCALE_ID);
  readonly #numbers = inject(NumberFormat);
  readonly #router = inject(Router);
  readonly #undo = inject(UndoNotice);
  readonly #shelf = inject(ScenarioShelf);
  protected readonly edits = inject(ScenarioEdits);
  protected readonly store = inject(ScenarioStore);

  /** A saved scenario, from the path. */
  readonly scenarioId = input<string>();
  /** The fit of a new plan, from the query. */
  readonly fit = input<string>();

  protected readonly isTried = signal(false);
  protected readonly drawn = signal<readonly string[]>([]);
  protected readonly name = computed(() => this.store.text().name.trim() || unnamed);
  protected readonly form = computed(() => this.store.ground()?.basis.form);
  protected readonly partsKind = computed(() => levelKind(this.form()));
  protected readonly partsName = computed(() =>
    this.form() === 'log' ? `difference, ${logUnit}` : 'difference',
  );
  protected readonly last = computed(() => decidingYear(this.store.reading()?.years ?? []) ?? null);
  protected readonly finding = computed(() => {
    const [ground, last] = [this.store.ground(), this.last()];
    if (ground === null || last === null) return 'Scenarios';
    return planFinding(this.name(), ground.basis, last, this.#numbers);
  });
  protected readonly confidence = computed(() => {
    const share = this.store.ground()?.basis.confidence ?? 0;
    return `${Math.round(share * 1000) / 10} % intervals`;
  });
  protected readonly caption = computed(
    () => `${this.#numbers.unitLabel()} · ${this.confidence()}`,
  );
  protected readonly source = computed(() => {
    const ground = this.store.ground();
    if (ground === null) return '';
    const { basis, fit } = ground;
    return `${this.caption()} · against the base, which holds FY${basis.last.year} · standing held fixed · fit ${shortHash(fit.fit.hash)}`;
  });
  protected readonly saveLabel = computed(() => {
    const saved = this.store.ground()?.saved ?? null;
    return saved === null ? 'Save scenario' : `Save as version ${saved.version + 1}`;
  });
  protected readonly draftWords = computed(() => {
    if (!this.store.isChanged()) return this.store.ground()?.saved === null ? '' : 'Saved';
    const state = this.store.draftState();
    if (state === 'keeping') return 'Keeping your draft…';
    return state === 'kept' ? 'Not saved; kept as your draft' : 'Not saved';
  });
  protected readonly plans = computed(() => {
    const years = this.store.reading()?.years ?? [];
    return [
      {
        name: this.name(),
        years: years.map((year) => ({ ...year, familiar: year.familiar.kind })),
      },
    ];
  });
  protected readonly others = computed(() => {
    const ground = this.store.ground();
    return ground?.scenarios.filter(({ id }) => id !== ground.saved?.id) ?? [];
  });
  /** The plans of the chart, the one on the page first. */
  protected readonly drawnPlans = computed(() => {
    const compared = this.others().filter(({ id }) => this.drawn().includes(id));
    return [...this.plans(), ...compared.map(storedFigures)];
  });
  protected readonly path = computed(() => {
    const [ground, reading] = [this.store.ground(), this.store.reading()];
    if (ground === null || reading === null) return null;
    const ownYears = ground.fit.result?.ownYears ?? [];
    return expectedPathData(ownYears, reading.bases, this.drawnPlans());
  });
  protected readonly pathText = computed(() => ({
    title: this.finding(),
    caption: `Market value, ${this.caption()} of the ${expectedName(this.form()).toLowerCase()}`,
    source: this.source(),
  }));
  protected readonly parts = computed(() => {
    const [ground, last] = [this.store.ground(), this.last()];
    return ground === null || last === null
      ? null
      : differenceData(last, ground.labels, ground.basis.lag);
  });
  protected readonly partsText = computed(() => {
    const title = `What makes the difference to the base in FY${this.last()?.year ?? ''}`;
    const source = this.source();
    // Shares do not add up, logs do.
    return this.form() === 'log'
      ? {
          title: `${title}, in ${logUnit}`,
          caption: `${logUnit}, whose parts add up: 0.1 is 10.5 % more · ${this.confidence()}`,
          source,
        }
      : { title, caption: this.caption(), source };
  });

  constructor() {
    effect(() => {
      const address = { scenarioId: this.scenarioId() ?? null, fitId: this.fit() ?? null };
      untracked(() => this.store.open(address));
    });
    effect(() => {
      const ground = this.store.ground();
      if (ground === null) return;
      untracked(() => this.#context.show(contextOf(ground, this.#locale)));
    });
  }

  protected changePlan(plan: readonly PlannedYear[]): void {
    this.edits.change({ plan }, { words: 'the plan' });
  }

  protected setInside({ year, values }: PlannedYear): void {
    this.changePlan(withYearSet(this.store.text().plan, year, values));
  }

  protected openFigure(wanted: PlannedFigureWanted): void {
    const ground = this.store.ground();
    if (ground === null) return;
    const { key, ...planned } = planLineage(wanted, ground.labels, ground.basis);
    this.#lineage.open({ fitId: ground.fit.fit.id }, key, planned);
  }

  /** A year of the chart: what the model expected of it, or expects of it under the plan that was chosen. */
  protected openYear(choice: ExpectedPathChoice): void {
    const ground = this.store.ground();
    if (ground === null) return;
    const planned = chosenFigure(
      this.store.reading()?.basis ?? ground.basis,
      this.drawnPlans(),
      choice,
      this.store.text().outlook,
    );
    if (planned !== undefined) this.openFigure(planned);
    if (choice.kind === 'actual')
      this.#lineage.open({ fitId: ground.fit.fit.id }, `fitted.${choice.year}`);
  }

  protected toggleDrawn(id: string): void {
    this.drawn.update((ids) =>
      ids.includes(id) ? ids.filter((other) => other !== id) : [...ids, id],
    );
  }

  protected async save(): Promise<void> {
    if (this.#hasNameProblem()) return;
    await this.#follow(() => this.store.save());
  }

  protected async saveAsCopy(): Promise<void> {
    if (this.#hasNameProblem()) return;
    await this.#follow(() => this.store.saveAsCopy());
  }

  protected async copy(scenario: ScenarioReply): Promise<void> {
    await this.#follow(() => this.#shelf.copy(scenario));
  }

  protected async remove(scenario: ScenarioReply): Promise<void> {
    const isOpen = scenario.id === this.store.ground()?.saved?.id;
    const { url } = this.#router;
    if (!(await this.#shelf.remove(scenario))) return;
    if (isOpen && this.#isStillAt(url))
      await this.#router.navigate(['/scenarios'], { queryParams: { fit: scenario.fitId } });
    await this.#undo.show(`Deleted “${scenario.name}”`, () => void this.#restore(scenario, isOpen));
  }

  async #restore(scenario: ScenarioReply, opens: boolean): Promise<void> {
    const restored = async () => ((await this.#shelf.restore(scenario)) ? scenario : null);
    await (opens ? this.#follow(restored) : restored());
  }

  #hasNameProblem(): boolean {
    this.isTried.set(true);
    return nameProblem(this.store.text().name) !== '';
  }

  /** Goes to the scenario that comes of the work, unless the person has gone elsewhere meanwhile. */
  async #follow(work: () => Promise<ScenarioReply | null>): Promise<void> {
    const { url } = this.#router;
    const scenario = await work();
    if (scenario === null || !this.#isStillAt(url)) return;
    this.isTried.set(false);
    await this.#router.navigate(['/scenarios', scenario.id]);
  }

  #isStillAt(url: string): boolean {
    return !this.#destroyRef.destroyed && this.#router.url === url;
  }
}
