import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { EditionAccess as Access } from '@contract';
import { counted } from '../ui/phrases';

/** Who looked at the edition and who took it out. */
@Component({
  selector: 'kv-edition-access',
  imports: [DatePipe],
  template: `
    <details>
      <summary>{{ summary() }}</summary>
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Who viewed and exported">
        <table class="kv-table">
          <thead>
            <tr>
              <th scope="col">Person</th>
              <th scope="col">What</th>
              <th scope="col">When</th>
            </tr>
          </thead>
          <tbody>
            @for (each of access(); track $index) {
              <tr>
                <th scope="row">{{ each.by }}</th>
                <td>
                  {{ each.kind }}
                  @if (each.format) {
                    as {{ each.format.toUpperCase() }}
                  }
                </td>
                <td>{{ each.at | date: 'd MMM y, HH:mm' }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    </details>
  `,
  styles: `
    summary {
      min-block-size: 24px;
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionAccess {
  /** Newest first. */
  readonly access = input.required<readonly Access[]>();

  protected readonly summary = computed(() => {
    const people = new Set(this.access().map(({ by }) => by)).size;
    const exports = this.access().filter(({ kind }) => kind === 'exported').length;
    return `${counted(people, 'person', 'people')} opened it, ${counted(exports, 'export')}`;
  });
}
