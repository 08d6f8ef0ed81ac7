import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import type { Evidence, FitReply, FitResult } from '@contract';
import { IntervalRows } from '../../charts/interval-rows/interval-rows';
import { NumberFormat } from '../../ui/number-format';
import { EvidenceBlock } from './evidence-block';
import { chartText } from './chart-words';
import { type FigureChoice, choiceUnit, choiceWord, figureChoices, kindOf } from './figure-choice';
import { FigureSwitch } from './figure-switch';
import { Finding } from './finding';
import { modelRows, modelsMeaning, modelsTitle } from './model-words';

/** "What if the model were another?": standing and slopes under each specification. */
@Component({
  selector: 'kv-models-block',
  imports: [EvidenceBlock, FigureSwitch, Finding, IntervalRows],
  template: `
    @let drawn = picture();
    <kv-evidence-block [meaning]="drawn.meaning">
      <kv-figure-switch
        legend="Shown in each model"
        [choices]="choices()"
        [chosen]="chosen()"
        (chosenChange)="chosen.set($event)"
      />
      <kv-interval-rows
        [text]="drawn.text"
        [rows]="drawn.rows"
        [marks]="chosen() === 'standing' ? 'own' : 'model'"
        [kind]="drawn.kind"
        [figureName]="drawn.word"
        rowName="model"
      >
        <kv-finding chartHeading [text]="drawn.text" />
      </kv-interval-rows>
    </kv-evidence-block>
  `,
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ModelsBlock {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  readonly evidence = input.required<Evidence>();

  protected readonly choices = computed(() => figureChoices(this.result()));
  protected readonly chosen = linkedSignal((): FigureChoice => this.choices()[0].choice);
  protected readonly picture = computed(() => {
    const [result, choice] = [this.result(), this.chosen()];
    const { alternatives } = this.evidence();
    const numbers = this.#numbers;
    const kind = kindOf(result, choice);
    const title = modelsTitle(result, alternatives, { choice, numbers });
    const words = { panel: this.reply().panelVersion, numbers: this.#numbers };
    return {
      kind,
      rows: modelRows(result, alternatives, { choice, numbers }),
      word: choiceWord(result, choice),
      meaning: modelsMeaning(result, alternatives, choice),
      text: chartText({ reply: this.reply(), result }, title, choiceUnit(result, choice, words)),
    };
  });
}
