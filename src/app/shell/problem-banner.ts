import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { ProblemBannerState } from '../ui/problem';
import { ProblemNotice } from '../ui/problem-notice';

/** What went wrong and belongs to no one place on the page. */
@Component({
  selector: 'kv-problem-banner',
  imports: [ProblemNotice],
  template: `
    @if (state.problem(); as problem) {
      <kv-problem-notice [problem]="problem" [canDismiss]="true" (dismissed)="state.dismiss()" />
    }
  `,
  styles: `
    kv-problem-notice {
      padding: 12px 32px;
      background: var(--kv-raised);
      border-block-end: 2px solid var(--kv-brick);
    }
    @media (width < 720px) {
      kv-problem-notice {
        padding-inline: 16px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemBanner {
  protected readonly state = inject(ProblemBannerState);
}
