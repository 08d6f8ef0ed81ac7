import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import type { FitReply, FitResult } from '@contract';
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
import { withoutEachCompany } from './left-out';
import { leftOutMeaning, leftOutTitle } from './left-out-words';

/** "Who drives it?": standing and slopes without each company. */
@Component({
  selector: 'kv-drivers-block',
  imports: [EvidenceBlock, FigureSwitch, Finding, LeaveOneOut],
  template: `
    <kv-evidence-block [meaning]="meaning()">
      <kv-figure-switch
        legend="Shown without each company"
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
          (companySelected)="companySelected.emit($event)"
        >
          <kv-finding chartHeading [text]="drawn.text" />
        </kv-leave-one-out>
        <p class="kv-caption kv-no-print">Select a peer to see why it is one.</p>
      }
    </kv-evidence-block>
  `,
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DriversBlock {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();

  readonly companySelected = output<string>();

  protected readonly choices = computed(() => figureChoices(this.result()));
  protected readonly chosen = linkedSignal((): FigureChoice => this.choices()[0].choice);
  readonly #left = computed(() => {
    const full = chosenFigure(this.result(), this.chosen());
    return full === null ? [] : withoutEachCompany(this.result(), this.chosen(), full);
  });
  protected readonly meaning = computed(() =>
    leftOutMeaning(
      this.result(),
      { choice: this.chosen(), left: this.#left(), many: 'companies' },
      this.#numbers,
    ),
  );
  protected readonly picture = computed(() => {
    const [result, choice, left] = [this.result(), this.chosen(), this.#left()];
    const full = chosenFigure(result, choice);
    if (full === null || left.length === 0) return null;
    const kind = kindOf(result, choice);
    const title = leftOutTitle(result, { choice, left, one: 'company' }, this.#numbers);
    const words = { panel: this.reply().panelVersion, numbers: this.#numbers };
    return {
      left,
      full,
      kind,
      fullName: `all ${result.sample.companies} companies`,
      word: choiceWord(result, choice),
      text: chartText({ reply: this.reply(), result }, title, choiceUnit(result, choice, words)),
    };
  });
}
