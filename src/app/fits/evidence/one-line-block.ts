import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import type { Evidence, FitReply, FitResult } from '@contract';
import { CompanyLines } from '../../charts/company-lines/company-lines';
import { Figure } from '../../ui/figure';
import { NumberFormat } from '../../ui/number-format';
import { poolabilityCaution } from '../evidence-words';
import { testText } from '../fit-words';
import { outcomeAxis, regressorAxis } from './axis-words';
import { EvidenceBlock } from './evidence-block';
import { chartText } from './chart-words';
import { type FigureChoice, choiceUnit, slopeChoices } from './figure-choice';
import { FigureSwitch } from './figure-switch';
import { Finding } from './finding';
import { comparedSlopes, linesTitle, oneLineMeaning } from './one-line-words';

/** "Does one line for all do?" */
@Component({
  selector: 'kv-one-line-block',
  imports: [CompanyLines, EvidenceBlock, Figure, FigureSwitch, Finding],
  templateUrl: './one-line-block.html',
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OneLineBlock {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  /** Null while there is none: the test stands without its picture. */
  readonly evidence = input.required<Evidence | null>();

  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();
  readonly companySelected = output<string>();

  protected readonly chosen = signal<FigureChoice>(0);
  protected readonly choices = computed(() =>
    slopeChoices(this.result()).map(({ choice, label }) => ({
      choice,
      label: label.replace(/^Slope on/, 'Against'),
    })),
  );
  protected readonly meaning = computed(() => oneLineMeaning(this.result(), this.#numbers));
  protected readonly caution = computed(() => poolabilityCaution(this.result()));
  protected readonly levels = computed(() =>
    this.result().specification.effects === 'company'
      ? 'company levels'
      : 'company levels and year effects',
  );
  protected readonly test = computed(() => testText(this.result().poolability, this.#numbers));
  protected readonly ownCompany = computed(() => this.reply().fit.ownCompany);
  protected readonly slopes = computed(() => {
    const evidence = this.evidence();
    return evidence === null ? null : comparedSlopes(evidence, this.result(), this.#numbers);
  });
  protected readonly picture = computed(() => {
    const place = this.chosen();
    const evidence = this.evidence();
    const lines = evidence?.lines.at(place === 'standing' ? 0 : place);
    if (evidence === null || lines === undefined || place === 'standing') return null;
    const result = this.result();
    const panel = this.reply().panelVersion;
    const title = linesTitle(evidence, result, { index: place, numbers: this.#numbers });
    return {
      ...lines,
      text: chartText(
        { reply: this.reply(), result },
        title,
        choiceUnit(result, place, { panel, numbers: this.#numbers }),
      ),
      across: regressorAxis(result, place, { panel, numbers: this.#numbers }),
      up: outcomeAxis(result, panel, this.#numbers),
      points: evidence.residuals.points.map(({ company, regressors, actual }) => ({
        company,
        x: regressors[place],
        y: actual,
      })),
    };
  });
}
