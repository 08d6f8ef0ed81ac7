import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Mark } from '../ui/mark';
import type { LineageStep, StaleNotice } from '../ui/page-context';

/** Where the page's figures come from, step by step, each a link; and in words what has a newer version. */
@Component({
  selector: 'kv-lineage-line',
  imports: [Mark, RouterLink],
  template: `
    <nav aria-label="Lineage">
      <ol>
        @for (step of steps(); track step.link) {
          <li>
            <a [routerLink]="step.link">
              <span>{{ step.label }}</span>
              @if (step.version) {
                <span class="version" [class.kv-number]="isHash(step.version)">{{
                  step.version
                }}</span>
              }
              @if (step.detail) {
                <span class="detail">{{ step.detail }}</span>
              }
            </a>
          </li>
        }
      </ol>
    </nav>
    @if (stale(); as notice) {
      <p>
        <kv-mark kind="caution" />
        {{ notice.text }}
        @if (notice.action; as action) {
          <a [routerLink]="action.link">{{ action.label }}</a>
        }
      </p>
    }
  `,
  styleUrl: './lineage-line.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineageLine {
  readonly steps = input.required<readonly LineageStep[]>();
  readonly stale = input<StaleNotice | null>(null);

  protected isHash(version: string): boolean {
    return /^[0-9a-f]{6,}$/.test(version);
  }
}
