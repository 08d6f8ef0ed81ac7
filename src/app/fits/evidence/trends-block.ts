import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import type { Evidence, FitReply, FitResult } from '@contract';
import { IntervalRows } from '../../charts/interval-rows/interval-rows';
import { Figure } from '../../ui/figure';
import { NumberFormat } from '../../ui/number-format';
import { EvidenceBlock } from './evidence-block';
import { chartText } from './chart-words';
import { type FigureChoice, choiceUnit, choiceWord, slopeChoices } from './figure-choice';
import { FigureSwitch } from './figure-switch';
import { Finding } from './finding';
import { trendMeaning, trendRows, trendTitle } from './trend-words';

/** "Could it be only trends?": first differences beside the fit, and how far errors persist. */
@Component({
  selector: 'kv-trends-block',
  imports: [EvidenceBlock, Figure, FigureSwitch, Finding, IntervalRows],
  template: `
    <kv-evidence-block [meaning]="meaning()">
      <kv-figure-switch
        legend="Slope shown"
        [choices]="choices()"
        [chosen]="chosen()"
        (chosenChange)="chosen.set($event)"
      />
      @let drawn = picture();
      <kv-interval-rows
        [text]="drawn.text"
        [rows]="drawn.rows"
        [figureName]="drawn.word"
        rowName="estimator"
      >
        <kv-finding chartHeading [text]="drawn.text" />
      </kv-interval-rows>
      @if (result().standing; as standing) {
        <dl>
          <div>
            <dt>Persistence of errors from one year to the next, all companies</dt>
            <dd><kv-figure kind="plain" [value]="standing.persistence" /></dd>
          </div>
          <div>
            <dt>The same, {{ standing.company }} alone</dt>
            <dd><kv-figure kind="plain" [value]="standing.ownPersistence" /></dd>
          </div>
        </dl>
        <p class="kv-caption">0 is none, 1 an error that never fades.</p>
      }
    </kv-evidence-block>
  `,
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrendsBlock {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  readonly evidence = input.required<Evidence>();

  protected readonly chosen = signal<FigureChoice>(0);
  protected readonly choices = computed(() => slopeChoices(this.result()));
  protected readonly meaning = computed(() => trendMeaning(this.evidence(), this.result()));
  protected readonly picture = computed(() => {
    const choice = this.chosen();
    const index = choice === 'standing' ? 0 : choice;
    const [evidence, result] = [this.evidence(), this.result()];
    const title = trendTitle(evidence, result, { index, numbers: this.#numbers });
    const words = { panel: this.reply().panelVersion, numbers: this.#numbers };
    return {
      rows: trendRows(evidence, result, index),
      word: choiceWord(result, index),
      text: chartText({ reply: this.reply(), result }, title, choiceUnit(result, index, words)),
    };
  });
}
