import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { LineageStore } from '../api/lineage-store';
import type { ChartText } from '../charts/chart-text';
import { FitComparison } from '../charts/fit-comparison/fit-comparison';
import { CautionLine } from '../ui/caution-line';
import { EmptyState } from '../ui/empty-state';
import { asDifference, differenceKind, differenceUnit } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { CompareFigures } from './compare-figures';
import { CompareStore } from './compare-store';
import {
  type FinishedFit,
  comparisonFinding,
  incomparableReason,
  memberDifference,
  specificationLines,
} from './compare-words';

import { inUnit } from './panel-money';
import { confidenceText, shortHash, yearsText } from '../ui/phrases';

/** Two fits side by side: how far the standing depends on what went in. */
@Component({
  selector: 'kv-compare-page',
  imports: [
    CautionLine,
    CompareFigures,
    EmptyState,
    FitComparison,
    MatButton,
    PageHeader,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './compare-page.html',
  styleUrls: ['./fit-home.css', './compare-page.css'],
  providers: [CompareStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComparePage {
  readonly #context = inject(PageContext);
  readonly #lineage = inject(LineageStore);
  protected readonly numbers = inject(NumberFormat);
  protected readonly store = inject(CompareStore);

  /** Ids of the two fits. */
  readonly a = input<string>();
  readonly b = input<string>();

  protected readonly shown = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return null;
    const { a, b } = view;
    return {
      a,
      b,
      finding: comparisonFinding(a, b, this.numbers),
      incomparable: incomparableReason(a, b),
      kind: differenceKind(a.reply.fit.form),
      lines: specificationLines(a, b),
      members: memberDifference(a.result, b.result),
      text: this.#text(a, b),
      standings: [this.#standing(a, a), this.#standing(b, a)],
    };
  });

  constructor() {
    effect(() => {
      const [a, b] = [this.a(), this.b()];
      untracked(() => void this.store.load(a, b));
    });
    effect(() => {
      const view = this.store.view();
      if (view.kind !== 'ready') return;
      const { fit, panelVersion } = view.a.reply;
      untracked(() => {
        this.#context.show({
          ownCompany: fit.ownCompany,
          currency: panelVersion.currency,
          unit: panelVersion.unit,
          lineage: [view.a, view.b].map(({ reply }, index) => ({
            label: index === 0 ? 'Fit' : 'beside fit',
            version: shortHash(reply.fit.hash),
            detail: `panel v${reply.panelVersion.number}, peers v${reply.peerGroup.number}`,
            link: `/fit/${reply.fit.id}`,
          })),
        });
      });
    });
  }

  protected readonly shortHash = shortHash;

  protected open({ reply }: FinishedFit, figure: string): void {
    this.#lineage.open({ fitId: reply.fit.id }, figure);
  }

  #text(a: FinishedFit, b: FinishedFit): ChartText {
    const confidences = [
      ...new Set([a, b].map(({ reply }) => confidenceText(reply.fit.confidence))),
    ];
    return {
      title: `Standing under fits ${shortHash(a.reply.fit.hash)} and ${shortHash(b.reply.fit.hash)}`,
      caption: `${this.#units(a, b)} · ${confidences.join(' and ')} intervals`,
      source: [a, b]
        .map(
          ({ reply, result }) =>
            `Fit ${shortHash(reply.fit.hash)}: ${reply.panelVersion.panelName} v${reply.panelVersion.number}, peer group v${reply.peerGroup.number}, ${yearsText(result.sample.firstYear, result.sample.lastYear)}`,
        )
        .join(' · '),
    };
  }

  #units(...fits: readonly FinishedFit[]): string {
    const units = fits.map(({ reply }) => differenceUnit(reply.fit.form, this.numbers));
    return [...new Set(units)].join(' beside ');
  }

  /** The standing in the first fit's unit, or as a percentage, so that one scale serves both. */
  #standing({ reply, result }: FinishedFit, first: FinishedFit) {
    const { standing, standingReason } = result;
    const { form } = reply.fit;
    return {
      name: `${shortHash(reply.fit.hash)}, ${reply.fit.ownCompany}`,
      standing:
        standing === null
          ? null
          : form === 'log'
            ? asDifference(standing, form)
            : inUnit(standing, reply.panelVersion.unit, first.reply.panelVersion.unit),
      ...(standingReason === undefined ? {} : { reason: standingReason }),
    };
  }
}
