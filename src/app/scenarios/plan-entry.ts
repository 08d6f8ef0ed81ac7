import { Clipboard } from '@angular/cdk/clipboard';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { isSameOutlook, usualOutlook } from '../ui/plan/asked-plan';
import { isUncertain } from '../ui/plan/change-asked';
import { FamiliarNotes } from '../ui/plan/familiar-notes';
import { PlanAssumptions } from '../ui/plan/plan-assumptions';
import { PlanEditor } from '../ui/plan/plan-editor';
import { capitalised } from '../ui/plan/plan-words';
import { PlanGrid } from './grid/plan-grid';
import { OutlookForm } from './outlook/outlook-form';
import { PlanDesk } from './plan-desk';
import { RangeEntry } from './ranges/range-entry';
import { RuleLines } from './rules/rule-lines';
import { ScenarioEdits } from './scenario-edits';
import { ScenarioStore } from './scenario-store';

/** The plan's input side: grid and sliders of one state, rules, outlook, ranges, and how familiar it is. */
@Component({
  selector: 'kv-plan-entry',
  imports: [
    FamiliarNotes,
    OutlookForm,
    PlanAssumptions,
    PlanEditor,
    PlanGrid,
    RangeEntry,
    RuleLines,
  ],
  templateUrl: './plan-entry.html',
  styleUrl: './plan-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanEntry {
  readonly #clipboard = inject(Clipboard);
  protected readonly desk = inject(PlanDesk);
  protected readonly edits = inject(ScenarioEdits);
  protected readonly store = inject(ScenarioStore);

  private readonly grid = viewChild(PlanGrid);

  /** Which of the two is shown where there is no room for both. */
  protected readonly view = signal<'table' | 'sliders'>('table');
  protected readonly said = signal('');
  protected readonly isUncertain = computed(() => isUncertain(this.store.text()));
  protected readonly isOutlookChosen = computed(() => {
    const ground = this.store.ground();
    return ground !== null && !isSameOutlook(this.store.text().outlook, usualOutlook(ground.basis));
  });
  protected readonly badLines = computed(() => {
    const labels = this.store.ground()?.labels ?? [];
    return (this.desk.pasted()?.bad ?? []).map(
      ({ year, regressor, reason, text }) =>
        `${capitalised(labels[regressor])} FY${year}: ${reason}; found ${text || 'nothing'}`,
    );
  });

  protected undo(): void {
    const words = this.edits.undo();
    this.desk.forgetPasted();
    if (words !== null) this.said.set(`Undone: ${words}`);
  }

  protected redo(): void {
    const words = this.edits.redo();
    if (words !== null) this.said.set(`Done again: ${words}`);
  }

  protected copyTable(): void {
    const text = this.grid()?.text(true) ?? '';
    this.said.set(this.#clipboard.copy(text) ? 'Table copied' : 'The table could not be copied');
  }
}
