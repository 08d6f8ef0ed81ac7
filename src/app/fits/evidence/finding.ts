import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { ChartText } from '../../charts/chart-text';

/** The heading of a chart: its finding, and under it unit, intervals and years. */
@Component({
  selector: 'kv-finding',
  template: `
    <h4>{{ text().title }}</h4>
    <p class="kv-caption">{{ text().caption }}</p>
  `,
  styles: `
    :host {
      display: block;
    }
    h4 {
      margin: 0;
      font: 500 13px / 20px var(--kv-words);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Finding {
  readonly text = input.required<ChartText>();
}
