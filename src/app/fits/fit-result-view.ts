import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import type { FitReply, FitResult } from '@contract';
import { LineageStore } from '../api/lineage-store';
import type { ChartText } from '../charts/chart-text';
import { GapPath } from '../charts/gap-path/gap-path';
import { SlopeIntervals } from '../charts/slope-intervals/slope-intervals';
import { StandingChart } from '../charts/standing-chart/standing-chart';
import { CautionLine } from '../ui/caution-line';
import { Figure } from '../ui/figure';
import {
  type Bounded,
  asDifference,
  asShownGaps,
  differenceKind,
  differenceUnit,
  levelKind,
} from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { RemarkList } from '../ui/remark-list';
import { CompaniesTable } from './companies-table';
import { covarianceName } from '../ui/covariance-words';
import { driftFinding, warningRemarks } from './evidence-words';
import { EvidenceSection } from './evidence/evidence-section';
import { EvidenceStore } from './evidence/evidence-store';
import { HeadingLink } from './evidence/heading-link';
import { ReplicationLink } from './evidence/replication-link';
import { placesText, regressorsText } from './fit-words';
import { GoodnessList } from './goodness-list';
import { SampleNotes } from './sample-notes';
import { slopeChange, slopeRemark, slopeSentence } from './slope-words';
import { SlopesTable } from './slopes-table';
import { levelsSource, meanOfPeers, rankedCount, standingFinding } from './standing-words';
import { YearEffectsTable } from './year-effects-table';
import { confidenceText, shortHash, yearsText } from '../ui/phrases';

/** A fit that is done: the standing first, then what it rests on. */
@Component({
  selector: 'kv-fit-result-view',
  imports: [
    CautionLine,
    CompaniesTable,
    DatePipe,
    EvidenceSection,
    Figure,
    GapPath,
    GoodnessList,
    HeadingLink,
    RemarkList,
    ReplicationLink,
    SampleNotes,
    SlopeIntervals,
    SlopesTable,
    StandingChart,
    YearEffectsTable,
  ],
  templateUrl: './fit-result-view.html',
  styleUrl: './fit-result-view.css',
  providers: [EvidenceStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitResultView {
  readonly #lineage = inject(LineageStore);
  readonly #evidence = inject(EvidenceStore);
  protected readonly numbers = inject(NumberFormat);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();

  protected readonly ownCompany = computed(() => this.reply().fit.ownCompany);
  readonly #form = computed(() => this.result().specification.form);
  protected readonly levelKind = computed(() => levelKind(this.#form()));
  protected readonly differenceKind = computed(() => differenceKind(this.#form()));
  /** Of the standing, the gap path and the drift. */
  protected readonly unit = computed(() => differenceUnit(this.#form(), this.numbers));
  protected readonly standing = computed(() => this.#asShown(this.result().standing));
  protected readonly driftFigure = computed(() => this.#asShown(this.result().drift));
  protected readonly gapPath = computed(() => asShownGaps(this.result().gapPath, this.#form()));
  protected readonly meanOfPeers = computed(() => meanOfPeers(this.result(), this.ownCompany()));
  protected readonly places = computed(() => {
    const { standing } = this.result();
    return standing?.rankSet == null
      ? null
      : placesText(standing.rankSet, rankedCount(this.result()));
  });
  protected readonly levelsName = computed(() =>
    this.#form() === 'log' ? 'Company levels in logs' : 'Company levels',
  );
  protected readonly regressors = computed(() => regressorsText(this.result()));
  protected readonly slopes = computed(() =>
    this.result().slopes.map((slope, index) => {
      const reading = { ...this.result().specification, index };
      return {
        ...slope,
        name: slopeChange(slope, reading),
        figure: `slope.${index}`,
        sentence: slopeSentence(slope, reading, this.numbers),
        remark: slopeRemark(slope, reading, this.reply().panelVersion),
      };
    }),
  );
  protected readonly drift = computed(() =>
    driftFinding(this.result(), this.ownCompany(), this.numbers),
  );
  /** What the evidence comes to; null while there is none, when the warnings stand in its place. */
  protected readonly verdict = computed(() => {
    const view = this.#evidence.view();
    return view.kind === 'ready' ? view.evidence.verdict : null;
  });
  protected readonly remarks = computed(() => warningRemarks(this.result()));
  protected readonly covariance = computed(() => covarianceName(this.reply().fit.slopes));
  protected readonly hash = computed(() => shortHash(this.reply().fit.hash));
  protected readonly texts = computed(() => {
    const result = this.result();
    const { fit, panelVersion, peerGroup } = this.reply();
    const caption = levelsSource(result, this.numbers);
    const readAs = this.#form() === 'log' ? 'percent for 1 % more · ' : '';
    const source = `Fit ${shortHash(fit.hash)} · ${panelVersion.panelName} v${panelVersion.number} · peer group v${peerGroup.number} · engine ${result.engine}`;
    const years = yearsText(result.sample.firstYear, result.sample.lastYear);
    const percent = confidenceText(result.specification.confidence);
    const of = (title: string, own = caption): ChartText => ({ title, caption: own, source });
    return {
      standing: of(standingFinding(result, fit.ownCompany, this.numbers)),
      slopes: of('What goes with market value', `${readAs}${percent} intervals · ${years}`),
      gapPath: of(this.drift(), `${this.unit()} · ${percent} intervals · ${years}`),
    };
  });

  constructor() {
    effect(() => {
      const fitId = this.reply().fit.id;
      untracked(() => {
        this.#evidence.show(fitId);
      });
    });
  }

  /** Digits that an estimate shares with its bounds. */
  protected digitsOf({ estimate, low, high }: Bounded): number {
    return this.numbers.columnDigits([estimate, low, high], this.differenceKind());
  }

  protected open(figure: string): void {
    this.#lineage.open({ fitId: this.reply().fit.id }, figure);
  }

  protected openCompany(company: string): void {
    const index = this.result().intercepts.findIndex((row) => row.company === company);
    if (index >= 0) this.open(`intercept.${index}`);
  }

  #asShown(value: Bounded | null): Bounded | null {
    return value === null ? null : asDifference(value, this.#form());
  }
}
