import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import type { Evidence, FitReply, FitResult } from '@contract';
import { LeaveOneOut } from '../../charts/leave-one-out/leave-one-out';
import { NumberFormat } from '../../ui/number-format';
import { EvidenceBlock } from './evidence-block';
import { chartText } from './chart-words';
import {
  type FigureChoice,
  choiceUnit,
  choiceWord,
  chosenFigure,
  figureChoices,
  kindOf,
} from './figure-choice';
import { FigureSwitch } from './figure-switch';
import { Finding } from './finding';
import { withoutEachYear } from './left-out';
import { leftOutConsequence, leftOutTitle } from './left-out-words';
import { driftMeaning } from './steady-words';

/** "Is the standing steady?": the drift of the gap, and the figures without each year. */
@Component({
  selector: 'kv-steady-block',
  imports: [EvidenceBlock, FigureSwitch, Finding, LeaveOneOut],
  template: `
    <kv-evidence-block [meaning]="meaning()">
      <p class="kv-caption">The path of the gap, year by year, is drawn above.</p>
      <kv-figure-switch
        legend="Shown without each year"
        [choices]="choices()"
        [chosen]="chosen()"
        (chosenChange)="chosen.set($event)"
      />
      @if (picture(); as drawn) {
        <kv-leave-one-out
          [text]="drawn.text"
          [leftOut]="drawn.left"
          [full]="drawn.full"
          [fullName]="drawn.fullName"
          [marks]="chosen() === 'standing' ? 'own' : 'model'"
          [kind]="drawn.kind"
          [figureName]="drawn.word"
          [most]="40"
          [isChoice]="false"
          rowName="year"
        >
          <kv-finding chartHeading [text]="drawn.text" />
        </kv-leave-one-out>
      } @else {
        <p>{{ evidence().withoutYearReason ?? 'No year can be left out.' }}</p>
      }
      @if (takenAlong(); as words) {
        <p class="kv-caption">{{ words }}</p>
      }
    </kv-evidence-block>
  `,
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SteadyBlock {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  readonly evidence = input.required<Evidence>();

  protected readonly choices = computed(() => figureChoices(this.result()));
  protected readonly chosen = linkedSignal((): FigureChoice => this.choices()[0].choice);
  protected readonly picture = computed(() => {
    const [result, choice] = [this.result(), this.chosen()];
    const full = chosenFigure(result, choice);
    const left = withoutEachYear(result, this.evidence().withoutYear, choice);
    if (full === null || left.length === 0) return null;
    const kind = kindOf(result, choice);
    const title = leftOutTitle(result, { choice, left, one: 'year' }, this.#numbers);
    const words = { panel: this.reply().panelVersion, numbers: this.#numbers };
    return {
      left,
      full,
      kind,
      fullName: `all ${result.sample.years} years`,
      word: choiceWord(result, choice),
      consequence: leftOutConsequence(result, { choice, left, many: 'years' }),
      text: chartText({ reply: this.reply(), result }, title, choiceUnit(result, choice, words)),
    };
  });
  protected readonly meaning = computed(() =>
    [driftMeaning(this.result(), this.#numbers), this.picture()?.consequence ?? '']
      .filter((part) => part !== '')
      .join(' '),
  );
  /** Companies that a year would take with it. */
  protected readonly takenAlong = computed(() => {
    const taken = this.evidence().withoutYear.filter(({ leftOut }) => (leftOut ?? []).length > 0);
    if (taken.length === 0) return '';
    const words = taken.map(({ year, leftOut }) => `${year}: ${(leftOut ?? []).join(', ')}`);
    return `Companies left with fewer than two rows drop out with a year. ${words.join('; ')}.`;
  });
}
