import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import type { ImportFinding } from '@contract';
import { Mark } from '../../ui/mark';

const shownAtFirst = 50;

/** What the check found, row by row: where it stands, what stands there, what it means. */
@Component({
  selector: 'kv-finding-table',
  imports: [Mark],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Findings, line by line">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col">Weight</th>
            <th scope="col" class="kv-number">Line</th>
            <th scope="col">Column</th>
            <th scope="col">Found</th>
            <th scope="col" class="meaning">What it means</th>
          </tr>
        </thead>
        <tbody>
          @for (finding of shown(); track $index) {
            <tr>
              <td class="state">
                <kv-mark [kind]="finding.isBlocking ? 'error' : 'caution'" />
                {{ finding.isBlocking ? 'keeps the file out' : 'worth knowing' }}
              </td>
              <td class="kv-number">{{ finding.row }}</td>
              <td>{{ finding.column }}</td>
              <td class="found">
                @if (finding.found === '') {
                  <span class="empty">empty cell</span>
                } @else {
                  <span class="kv-number">{{ finding.found }}</span>
                }
              </td>
              <td class="meaning">{{ finding.detail }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    @if (hidden() > 0) {
      <button type="button" class="kv-link" (click)="isWhole.set(true)">
        Show the other {{ hidden() }}
      </button>
    }
    @if (count() > findings().length) {
      <p class="kv-caption">
        The first {{ findings().length }} of {{ count().toLocaleString('en') }} findings are listed.
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      justify-items: start;
      gap: 8px;
      min-inline-size: 0;
    }
    .kv-table-scroll {
      inline-size: 100%;
    }
    .state {
      white-space: nowrap;
    }
    kv-mark {
      margin-inline-end: 4px;
    }
    .found {
      min-inline-size: 96px;
      max-inline-size: 240px;
      overflow-wrap: break-word;
    }
    .empty {
      color: var(--kv-soft-ink);
    }
    .meaning {
      min-inline-size: 240px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingTable {
  /** Those that keep the file out come first. */
  readonly findings = input.required<readonly ImportFinding[]>();
  /** Of all findings, listed or not. */
  readonly count = input.required<number>();

  protected readonly isWhole = linkedSignal({
    source: this.findings,
    computation: () => false,
  });
  protected readonly shown = computed(() =>
    this.isWhole() ? this.findings() : this.findings().slice(0, shownAtFirst),
  );
  protected readonly hidden = computed(() => this.findings().length - this.shown().length);
}
