import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { FitReply, FitResult, IntervalEstimate } from '@contract';
import { LineageStore } from '../api/lineage-store';
import type { ChartText } from '../charts/chart-text';
import { GapPath } from '../charts/gap-path/gap-path';
import { SlopeIntervals } from '../charts/slope-intervals/slope-intervals';
import { StandingChart } from '../charts/standing-chart/standing-chart';
import { CautionLine } from '../ui/caution-line';
import { Figure } from '../ui/figure';
import { NumberFormat } from '../ui/number-format';
import { RemarkList } from '../ui/remark-list';
import { CompaniesTable } from './companies-table';
import { covarianceName } from '../ui/covariance-words';
import { driftFinding, poolabilityText, warningRemarks } from './evidence-words';
import { placesText, regressorWord, regressorsText, testText } from './fit-words';
import { GoodnessList } from './goodness-list';
import { SampleNotes } from './sample-notes';
import { slopeRemark, slopeSentence } from './slope-words';
import { SlopesTable } from './slopes-table';
import { meanOfPeers, rankedCount, standingFinding, standingSource } from './standing-words';
import { confidenceText, shortHash, yearsText } from '../ui/phrases';

/** A fit that is done: the standing first, then what it rests on. */
@Component({
  selector: 'kv-fit-result-view',
  imports: [
    CautionLine,
    CompaniesTable,
    DatePipe,
    Figure,
    GapPath,
    GoodnessList,
    RemarkList,
    SampleNotes,
    SlopeIntervals,
    SlopesTable,
    StandingChart,
  ],
  templateUrl: './fit-result-view.html',
  styleUrl: './fit-result-view.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitResultView {
  readonly #lineage = inject(LineageStore);
  protected readonly numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();

  protected readonly ownCompany = computed(() => this.reply().fit.ownCompany);
  protected readonly unit = this.numbers.unitLabel;
  protected readonly meanOfPeers = computed(() => meanOfPeers(this.result(), this.ownCompany()));
  protected readonly places = computed(() => {
    const { standing } = this.result();
    return standing?.rankSet == null
      ? null
      : placesText(standing.rankSet, rankedCount(this.result()));
  });
  protected readonly regressors = computed(() => regressorsText(this.result()));
  protected readonly slopes = computed(() =>
    this.result().slopes.map((slope, index) => ({
      ...slope,
      name: `1 more of ${regressorWord(slope.name, index)}`,
      figure: `slope.${index}`,
      sentence: slopeSentence(slope, index, this.numbers),
      remark: slopeRemark(slope, index, this.reply().panelVersion),
    })),
  );
  protected readonly poolability = computed(() => poolabilityText(this.result(), this.numbers));
  protected readonly poolabilityTest = computed(() =>
    testText(this.result().poolability, this.numbers),
  );
  protected readonly drift = computed(() =>
    driftFinding(this.result(), this.ownCompany(), this.numbers),
  );
  protected readonly remarks = computed(() => warningRemarks(this.result()));
  protected readonly covariance = computed(() => covarianceName(this.reply().fit.slopes));
  protected readonly hash = computed(() => shortHash(this.reply().fit.hash));
  protected readonly texts = computed(() => {
    const result = this.result();
    const { fit, panelVersion, peerGroup } = this.reply();
    const caption = standingSource(result, this.numbers);
    const source = `Fit ${shortHash(fit.hash)} · ${panelVersion.panelName} v${panelVersion.number} · peer group v${peerGroup.number} · engine ${result.engine}`;
    const years = yearsText(result.sample.firstYear, result.sample.lastYear);
    const percent = confidenceText(result.specification.confidence);
    const of = (title: string, own = caption): ChartText => ({ title, caption: own, source });
    return {
      standing: of(standingFinding(result, fit.ownCompany, this.numbers)),
      slopes: of('What goes with market value', `${percent} intervals · ${years}`),
      gapPath: of(this.drift(), `${this.unit()} · ${percent} intervals · ${years}`),
    };
  });

  /** Digits that an estimate shares with its bounds. */
  protected digitsOf({ estimate, low, high }: IntervalEstimate): number {
    return this.numbers.columnDigits([estimate, low, high]);
  }

  protected open(figure: string): void {
    this.#lineage.open({ fitId: this.reply().fit.id }, figure);
  }

  protected openCompany(company: string): void {
    const index = this.result().intercepts.findIndex((row) => row.company === company);
    if (index >= 0) this.open(`intercept.${index}`);
  }
}
