import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { SentencePart } from '@figures';
import { NumberFormat } from './number-format';
import { sentenceRuns } from './sentence-runs';

/** A figure of a sentence that the person wants to see through. */
export interface SentenceFigureWanted {
  readonly figure: string;
  /** In the panel's unit, as the sentence has it. */
  readonly value: number;
}

/**
 * A sentence whose figures follow the unit shown; each that has a lineage is a button that asks for it.
 *
 * `<kv-sentence [sentence]="content.headline" (opened)="openFigure($event)" />`
 */
@Component({
  selector: 'kv-sentence',
  template: `@for (run of runs(); track $index) {
    @if (run.kind === 'figure' && isLinked()) {
      <button
        type="button"
        aria-haspopup="dialog"
        title="Linked to its figure. Select to see how it came about."
        [textContent]="run.text"
        (click)="opened.emit(run)"
      ></button>
    } @else {
      <span [class.kv-own]="run.kind === 'own'" [textContent]="run.text"></span>
    }
  }`,
  styles: `
    :host {
      overflow-wrap: anywhere;
    }
    button {
      appearance: none;
      min-block-size: 24px;
      padding: 0;
      border: 0;
      background: none;
      font: inherit;
      letter-spacing: inherit;
      text-align: start;
      color: inherit;
      text-decoration: underline dotted 1px var(--kv-edge);
      text-underline-offset: 3px;
      cursor: pointer;
    }
    button:hover {
      text-decoration: underline solid 1px currentColor;
    }
    @media print {
      button {
        text-decoration: none;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Sentence {
  readonly #numbers = inject(NumberFormat);

  readonly sentence = input.required<readonly SentencePart[]>();
  /** Whether its figures open their lineage. */
  readonly isLinked = input(true);
  readonly opened = output<SentenceFigureWanted>();

  protected readonly runs = computed(() =>
    sentenceRuns(this.sentence(), {
      currency: this.#numbers.currency(),
      panelUnit: this.#numbers.panelUnit(),
      unit: this.#numbers.unit(),
      locale: this.#numbers.locale(),
    }),
  );
}
