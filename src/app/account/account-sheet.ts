import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Logo } from '../ui/logo';

/** The sheet that signing in, signing up and joining are written on, with one line on what Kinvale is for. */
@Component({
  selector: 'kv-account-sheet',
  imports: [Logo],
  template: `
    <div class="sheet kv-sheet">
      <kv-logo />
      <h1>{{ heading() }}</h1>
      <ng-content />
    </div>
    <p class="purpose kv-caption">
      Kinvale shows a finance department where the market places its company among its peers, how
      sure that is, and what a plan would change.
    </p>
  `,
  styleUrl: './account-sheet.css',
  host: { role: 'main' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountSheet {
  readonly heading = input.required<string>();
}
