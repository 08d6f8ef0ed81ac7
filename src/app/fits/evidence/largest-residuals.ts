import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { FitReply, FitResult, ResidualSummary } from '@contract';
import { levelKind } from '../../ui/model-form';
import { NumberFormat } from '../../ui/number-format';
import { lineText, rowLinkText } from '../../ui/phrases';
import { regressorWord } from '../fit-words';
import { outcomeAxis, regressorAxis } from './axis-words';

/** The rows that the model misses most, each with its cells and the way to its row of the panel. */
@Component({
  selector: 'kv-largest-residuals',
  imports: [RouterLink],
  templateUrl: './largest-residuals.html',
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LargestResiduals {
  readonly #numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  readonly residuals = input.required<ResidualSummary>();

  protected readonly regressors = computed(() => {
    const panel = this.reply().panelVersion;
    return this.result().slopes.map((_, index) =>
      regressorAxis(this.result(), index, { panel, numbers: this.#numbers }),
    );
  });
  protected readonly outcome = computed(() =>
    outcomeAxis(this.result(), this.reply().panelVersion, this.#numbers),
  );
  protected readonly rows = computed(() => {
    const kind = levelKind(this.result().specification.form);
    const { largest } = this.residuals();
    const digits = this.#numbers.columnDigits(
      largest.flatMap(({ actual, residual }) => [actual, residual]),
      kind,
    );
    const level = (value: number): string => this.#numbers.figure(value, kind, digits);
    const plain = (value: number | null): string => this.#numbers.figure(value, 'plain', 2);
    return largest.map((row) => ({
      company: row.company,
      year: row.year,
      line: lineText(row.fileRow),
      linkText: rowLinkText(row),
      isOwn: row.company === this.reply().fit.ownCompany,
      cells: row.regressors.map((value, index) =>
        this.#numbers.figure(value, this.regressors()[index].kind),
      ),
      actual: level(row.actual),
      fitted: level(row.fitted),
      residual: level(row.residual),
      studentised: plain(row.studentised),
      leverage: plain(row.leverage),
      cook: plain(row.cook),
    }));
  });
  /** How far each regressor follows from the others within companies. */
  protected readonly inflation = computed(() =>
    this.residuals()
      .varianceInflation.map(
        ({ name, value }, index) =>
          `${regressorWord(name, index)} ${this.#numbers.headline(value, 'plain')}`,
      )
      .join(', '),
  );
}
