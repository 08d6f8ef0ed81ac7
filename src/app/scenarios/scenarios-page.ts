import { Clipboard } from '@angular/cdk/clipboard';
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
import { CautionLine } from '../ui/caution-line';
import { EmptyState } from '../ui/empty-state';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { chosenFigure } from '../ui/plan/chosen-figure';
import { PlanTable, type PlannedFigureWanted } from '../ui/plan/plan-table';
import { decidingYear, planFinding } from '../ui/plan/plan-words';
import { planLineage } from '../ui/plan/planned-figure';
import { ProblemNotice } from '../ui/problem-notice';
import { UndoNotice } from '../ui/undo-notice';
import { DraftKeeper } from './draft-keeper';
import { PlanDesk } from './plan-desk';
import { PlanEntry } from './plan-entry';
import { mostCompared } from './results/compared-plans';
import { PageComparison } from './results/page-comparison';
import { PlanParts } from './results/plan-parts';
import { PlanPath } from './results/plan-path';
import { PlanResults } from './results/plan-results';
import { PlanSensitivity } from './results/plan-sensitivity';
import { ReachValue } from './results/reach-value';
import { UncertainPlan } from './results/uncertain-plan';
import { ScenarioEdits } from './scenario-edits';
import { ScenarioList } from './scenario-list';
import { ScenarioName, nameProblem } from './scenario-name';
import { ScenarioNotices } from './scenario-notices';
import { ScenarioShelf } from './scenario-shelf';
import { ScenarioState } from './scenario-state';
import { ScenarioStore } from './scenario-store';
import { storedFigures } from './scenario-text';
import { contextOf } from './scenario-words';
import { BothVersions } from './versions/both-versions';
import { CopiedNotice } from './versions/copied-notice';
import { ScenarioVersions } from './versions/scenario-versions';

/** What would our plan do to the expected value? */
@Component({
  selector: 'kv-scenarios-page',
  imports: [
    CautionLine,
    BothVersions,
    CopiedNotice,
    EmptyState,
    MatButton,
    PageComparison,
    PageHeader,
    PlanEntry,
    PlanParts,
    PlanPath,
    PlanSensitivity,
    PlanTable,
    ProblemNotice,
    ReachValue,
    RouterLink,
    ScenarioList,
    ScenarioName,
    ScenarioNotices,
    ScenarioVersions,
    UncertainPlan,
  ],
  templateUrl: './scenarios-page.html',
  styleUrl: './scenarios-page.css',
  providers: [
    DraftKeeper,
    ScenarioState,
    ScenarioEdits,
    ScenarioShelf,
    ScenarioStore,
    PlanDesk,
    PlanResults,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenariosPage {
  readonly #destroyRef = inject(DestroyRef);
  readonly #clipboard = inject(Clipboard);
  readonly #context = inject(PageContext);
  readonly #lineage = inject(LineageStore);
  readonly #locale = inject(LOCALE_ID);
  readonly #numbers = inject(NumberFormat);
  readonly #router = inject(Router);
  readonly #undo = inject(UndoNotice);
  readonly #shelf = inject(ScenarioShelf);
  protected readonly edits = inject(ScenarioEdits);
  protected readonly desk = inject(PlanDesk);
  protected readonly results = inject(PlanResults);
  protected readonly store = inject(ScenarioStore);

  /** A saved scenario, from the path. */
  readonly scenarioId = input<string>();
  /** The fit of a new plan, from the query. */
  readonly fit = input<string>();

  protected readonly mostBeside = mostCompared - 1;
  protected readonly isTried = signal(false);
  protected readonly linkSaid = signal('');
  /** The newest fit, where the scenario stands on an older one. */
  protected readonly newestFit = computed(() => {
    const ground = this.store.ground();
    const newest = ground?.desk.fit?.id;
    return newest === ground?.fit.fit.id ? undefined : newest;
  });
  protected readonly drawn = signal<readonly string[]>([]);
  protected readonly last = computed(() => decidingYear(this.store.reading()?.years ?? []) ?? null);
  protected readonly finding = computed(() => {
    const [ground, last] = [this.store.ground(), this.last()];
    if (ground === null || last === null) return 'Scenarios';
    return planFinding(this.results.name(), ground.basis, last, this.#numbers);
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
        name: this.results.name(),
        years: years.map((year) => ({ ...year, familiar: year.familiar.kind })),
      },
    ];
  });
  protected readonly others = computed(() => {
    const ground = this.store.ground();
    return ground?.scenarios.filter(({ id }) => id !== ground.saved?.id) ?? [];
  });
  /** Saved ones beside the plan on the page, as many as can be compared with it. */
  protected readonly compared = computed(() =>
    this.others()
      .filter(({ id }) => this.drawn().includes(id))
      .slice(0, this.mostBeside),
  );
  /** The plans of the chart, the one on the page first. */
  protected readonly drawnPlans = computed(() => [
    ...this.plans(),
    ...this.compared().map(storedFigures),
  ]);
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

  protected async copyOnto(scenario: ScenarioReply, fitId: string): Promise<void> {
    await this.#follow(() => this.#shelf.copyOnto(scenario, fitId));
  }

  protected copyLink(): void {
    const isCopied = this.#clipboard.copy(location.href);
    this.linkSaid.set(isCopied ? 'Link copied' : 'The link could not be copied');
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
