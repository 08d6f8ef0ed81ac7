import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { PlacedText, PlacedTick, Plot } from '@figures';

/** The marks and names of both axes of a chart of one value against another; the chart hides them from screen readers. */
@Component({
  selector: 'g[kvValueAxes]',
  template: `
    @for (tick of chart().yTicks; track tick.value) {
      <svg:text
        class="figure soft"
        text-anchor="end"
        [attr.x]="chart().plot.left - 10"
        [attr.y]="tick.position + 4"
      >
        {{ tick.label }}
      </svg:text>
      <svg:line
        [attr.class]="tick.value === 0 ? 'zero' : 'grid'"
        [attr.x1]="chart().plot.left"
        [attr.x2]="chart().plot.right"
        [attr.y1]="tick.position"
        [attr.y2]="tick.position"
      />
    }
    @for (tick of chart().xTicks; track tick.value) {
      <svg:text
        class="figure soft"
        text-anchor="middle"
        [attr.x]="tick.position"
        [attr.y]="chart().plot.bottom + 18"
      >
        {{ tick.label }}
      </svg:text>
      <svg:line
        class="zero"
        [attr.x1]="tick.position"
        [attr.x2]="tick.position"
        [attr.y1]="chart().plot.bottom"
        [attr.y2]="chart().plot.bottom + 4"
      />
    }
    @for (title of [chart().xTitle, chart().yTitle]; track $index) {
      <svg:text
        class="soft"
        [attr.x]="title.x"
        [attr.y]="title.y"
        [attr.text-anchor]="title.anchor"
      >
        {{ title.text }}
      </svg:text>
    }
  `,
  styleUrl: './chart-marks.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ValueAxes {
  readonly chart = input.required<{
    readonly plot: Plot;
    readonly xTicks: readonly PlacedTick[];
    readonly yTicks: readonly PlacedTick[];
    readonly xTitle: PlacedText;
    readonly yTitle: PlacedText;
  }>();
}
