import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import type { Bootstrap, Evidence, FitReply, FitResult } from '@contract';
import { IntervalRows } from '../../charts/interval-rows/interval-rows';
import { NumberFormat } from '../../ui/number-format';
import { BootstrapOffer } from './bootstrap-offer';
import { EvidenceBlock } from './evidence-block';
import { chartText } from './chart-words';
import { type FigureChoice, choiceUnit, choiceWord, slopeChoices } from './figure-choice';
import { FigureSwitch } from './figure-switch';
import { Finding } from './finding';
import {
  covarianceLines,
  covarianceRows,
  intervalsMeaning,
  intervalsTitle,
} from './interval-choice-words';

/** "Which intervals?": every covariance side by side. */
@Component({
  selector: 'kv-intervals-block',
  imports: [BootstrapOffer, EvidenceBlock, FigureSwitch, Finding, IntervalRows],
  templateUrl: './intervals-block.html',
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class IntervalsBlock {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  readonly evidence = input.required<Evidence>();
  readonly bootstrap = input.required<Bootstrap | null>();
  readonly mayRun = input.required<boolean>();

  /** With the seed to start from. */
  readonly bootstrapStarted = output<number>();
  readonly bootstrapCancelled = output();

  protected readonly chosen = signal<FigureChoice>(0);
  protected readonly choices = computed(() => slopeChoices(this.result()));
  readonly #index = computed(() => {
    const choice = this.chosen();
    return choice === 'standing' ? 0 : choice;
  });
  protected readonly meaning = computed(() =>
    intervalsMeaning(this.evidence(), this.result(), {
      index: this.#index(),
      numbers: this.#numbers,
    }),
  );
  protected readonly picture = computed(() => {
    const [evidence, result, index] = [this.evidence(), this.result(), this.#index()];
    const title = intervalsTitle(evidence, result, { index, numbers: this.#numbers });
    const words = { panel: this.reply().panelVersion, numbers: this.#numbers };
    return {
      rows: covarianceRows(evidence, result, index),
      word: choiceWord(result, index),
      text: chartText({ reply: this.reply(), result }, title, choiceUnit(result, index, words)),
    };
  });
  protected readonly lines = computed(() =>
    covarianceLines(this.evidence(), this.#index(), this.#numbers),
  );
  /** By draws the bootstrap is run when asked for; few companies have all their signs looked at with the evidence. */
  protected readonly isBootstrapByDraws = computed(() => {
    const wild = this.evidence().covariances.find(({ code }) => code === 'wild');
    return this.bootstrap() !== null || wild?.slopes === null;
  });
}
