import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/**
 * The line under a chart that says what the pointer or the keyboard is at; screen readers hear it from the point
 * itself. Its room is kept free, so that nothing moves under the pointer.
 */
@Component({
  selector: 'kv-chart-readout',
  template: '{{ words() }}',
  styles: `
    :host {
      display: block;
      min-block-size: 20px;
      font-size: 12px;
      line-height: 20px;
    }
  `,
  host: { class: 'readout', 'aria-hidden': 'true' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChartReadout {
  /** Empty where nothing is asked. */
  readonly words = input.required<string>();
}
