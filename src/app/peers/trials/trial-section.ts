import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  ElementRef,
  Injector,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { CautionLine } from '../../ui/caution-line';
import { catchLostFocus } from '../../ui/lost-focus';
import { Mark } from '../../ui/mark';
import { NumberFormat } from '../../ui/number-format';
import { ProblemNotice } from '../../ui/problem-notice';
import { ProgressLine } from '../../ui/progress-line';
import { PeersStore } from '../peers-store';
import { trialChanges } from './trial-changes';
import { TrialStore } from './trial-store';
import { TrialTable } from './trial-table';
import {
  baseText,
  groupsFitted,
  notTriedText,
  trialCaption,
  trialFinding,
  trialState,
} from './trial-words';

/** What leaving each member out, and taking each of the nearest candidates in, would change before anything is saved. */
@Component({
  selector: 'kv-trial-section',
  imports: [CautionLine, Mark, MatButton, ProblemNotice, ProgressLine, TrialTable],
  templateUrl: './trial-section.html',
  styleUrl: './trial-section.css',
  providers: [TrialStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrialSection {
  readonly #document = inject(DOCUMENT);
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);
  readonly #injector = inject(Injector);
  readonly #numbers = inject(NumberFormat);
  readonly #peers = inject(PeersStore);
  protected readonly store = inject(TrialStore);

  /** Panel, version and years. */
  readonly source = input('');
  /** A company to be moved in or out. */
  readonly moved = output<{ readonly company: string; readonly isIncluded: boolean }>();

  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');

  protected readonly groupsFitted = groupsFitted;
  protected readonly shown = computed(() => {
    const trial = this.store.trial();
    if (trial === null) return null;
    const changes = trialChanges(trial);
    const { form, furtherRegressors } = trial.asked.specification;
    return {
      changes,
      form,
      regressors: ['capex', 'book equity', ...furtherRegressors],
      caption: trialCaption(trial, this.source(), this.#numbers),
      base: baseText(trial, changes, this.#numbers),
      notTried: notTriedText(trial),
      progress: trial.progress,
    };
  });
  protected readonly title = computed(() => {
    const shown = this.shown();
    return shown === null ? 'What each choice would change' : trialFinding(shown.changes);
  });
  protected readonly state = computed(() => {
    const trial = this.store.trial();
    return trial === null ? '' : trialState(trial, this.store.overtakenBy());
  });
  protected readonly action = computed(() => {
    const trial = this.store.trial();
    if (trial === null) return this.store.problem() === null ? 'Compute the changes' : '';
    const isThere = trial.state === 'done' && this.store.overtakenBy() === null;
    return isThere ? '' : 'Compute for this choice';
  });
  /** Who is still on the side that they were tried from. */
  protected readonly sides = computed(() => {
    const view = this.#peers.view();
    const choices = view.kind === 'ready' ? [...view.draft.choices] : [];
    const on = (isIncluded: boolean) =>
      new Set(choices.filter(([, each]) => each.isIncluded === isIncluded).map(([name]) => name));
    return { inside: on(true), outside: on(false) };
  });
  /** That it began and that it is done, for the ear. */
  protected readonly said = signal('');

  constructor() {
    let wasUnderWay = false;
    effect(() => {
      const isUnderWay = this.store.isUnderWay();
      untracked(() => {
        if (isUnderWay !== wasUnderWay) this.#tellTurn(isUnderWay);
        wasUnderWay = isUnderWay;
      });
    });
  }

  /** The button that starts it leaves as it begins, the one that cancels it as it ends: the focus stays in the section. */
  #tellTurn(isUnderWay: boolean): void {
    const isDone = this.store.trial()?.state === 'done';
    this.said.set(
      isUnderWay ? 'The changes are being computed.' : isDone ? 'The changes are computed.' : '',
    );
    if (this.#host.nativeElement.contains(this.#document.activeElement))
      catchLostFocus(this.#injector, () => this.heading().nativeElement);
  }
}
