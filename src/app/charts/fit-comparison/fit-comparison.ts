import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { IntervalFigure, IntervalRow } from '@figures';
import type { FigureKind } from '../../ui/number-format';
import type { ChartText } from '../chart-text';
import { IntervalRows } from '../interval-rows/interval-rows';

export interface ComparedFit {
  /** `6f3a91, 12 Nov 2026`. */
  readonly name: string;
  /** Null where the fit gives no standing; `reason` says why. */
  readonly standing: IntervalFigure | null;
  readonly reason?: string;
}

/** The own company's standing under one fit and under another, on one scale. */
@Component({
  selector: 'kv-fit-comparison',
  imports: [IntervalRows],
  template: `
    <kv-interval-rows
      marks="own"
      rowName="fit"
      figureName="standing"
      [text]="text()"
      [rows]="rows()"
      [kind]="kind()"
    >
      <ng-content select="[chartHeading]" ngProjectAs="[chartHeading]" />
    </kv-interval-rows>
  `,
  styles: ':host { display: block; min-inline-size: 0; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitComparison {
  readonly text = input.required<ChartText>();
  /** The fit in question first: its mark is filled. */
  readonly fits = input.required<readonly ComparedFit[]>();
  readonly kind = input<FigureKind>('money');

  protected readonly rows = computed(() =>
    this.fits().map(({ name, standing, reason }, place): IntervalRow => ({
      name,
      figure: standing,
      reason: reason ?? 'no standing',
      isMarked: place === 0,
    })),
  );
}
