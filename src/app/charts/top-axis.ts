import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { PlacedTick, Plot } from '@figures';

/** The marks above rows that share one scale, and the line of zero; the chart hides them from screen readers. */
@Component({
  selector: 'g[kvTopAxis]',
  template: `
    @for (tick of chart().ticks; track tick.value) {
      <svg:text class="figure soft" text-anchor="middle" y="16" [attr.x]="tick.position">
        {{ tick.label }}
      </svg:text>
      <svg:line
        [attr.class]="lines()"
        [attr.x1]="tick.position"
        [attr.x2]="tick.position"
        [attr.y1]="chart().plot.top - 4"
        [attr.y2]="chart().plot.bottom"
      />
    }
    @if (chart().zeroX !== null) {
      <svg:line
        class="zero"
        [attr.x1]="chart().zeroX"
        [attr.x2]="chart().zeroX"
        [attr.y1]="chart().plot.top - 4"
        [attr.y2]="chart().plot.bottom"
      />
    }
  `,
  styleUrl: './chart-marks.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TopAxis {
  readonly chart = input.required<{
    readonly plot: Pick<Plot, 'top' | 'bottom'>;
    readonly ticks: readonly PlacedTick[];
    /** Null where zero is out of sight. */
    readonly zeroX: number | null;
  }>();
  /** How the lines of the marks are drawn: dotted, or as hairlines. */
  readonly lines = input<'grid' | 'hairline'>('grid');
}
