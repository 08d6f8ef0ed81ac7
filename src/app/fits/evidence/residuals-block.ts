import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router } from '@angular/router';
import type { Evidence, FitReply, FitResult } from '@contract';
import type { ResidualRow } from '@figures';
import { ResidualGroups } from '../../charts/residual-groups/residual-groups';
import { ResidualScatter } from '../../charts/residual-scatter/residual-scatter';
import { levelKind, levelUnit } from '../../ui/model-form';
import { NumberFormat } from '../../ui/number-format';
import { EvidenceBlock } from './evidence-block';
import { plainChartText } from './chart-words';
import { Finding } from './finding';
import { LargestResiduals } from './largest-residuals';
import { residualMeaning, scatterTitle, widestTitle } from './residual-words';

/** What the model leaves of each row: against what it expects, by company, by year, and the largest with their rows. */
@Component({
  selector: 'kv-residuals-block',
  imports: [EvidenceBlock, Finding, LargestResiduals, ResidualGroups, ResidualScatter],
  templateUrl: './residuals-block.html',
  styleUrl: './block.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResidualsBlock {
  readonly #numbers = inject(NumberFormat);
  readonly #router = inject(Router);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();
  readonly evidence = input.required<Evidence>();

  protected readonly residuals = computed(() => this.evidence().residuals);
  protected readonly ownCompany = computed(() => this.reply().fit.ownCompany);
  protected readonly kind = computed(() => levelKind(this.result().specification.form));
  protected readonly meaning = computed(() =>
    residualMeaning(this.residuals(), this.result(), this.#numbers),
  );
  protected readonly texts = computed(() => {
    const [reply, result, numbers] = [this.reply(), this.result(), this.#numbers];
    const { byCompany, byYear } = this.residuals();
    const unit = levelUnit(result.specification.form, numbers);
    const of = (title: string) => plainChartText({ reply, result }, title, unit);
    return {
      scatter: of(scatterTitle(this.residuals())),
      companies: of(widestTitle(byCompany, result, numbers)),
      years: of(widestTitle(byYear, result, numbers)),
    };
  });

  /** Leads to the row of the panel that a residual is of. */
  protected openRow({ company, year }: ResidualRow): void {
    void this.#router.navigate(['/panel', this.reply().panelVersion.id], {
      queryParams: { company, year },
    });
  }
}
