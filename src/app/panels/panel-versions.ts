import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { PanelVersionSummary } from '@contract';
import { PanelsApi } from '../api/panels-api';
import { NumberFormat } from '../ui/number-format';
import { yearSpan } from './panel-finding';

/** Every panel version: who brought it in, when, from which file and why. */
@Component({
  selector: 'kv-panel-versions',
  imports: [DatePipe, RouterLink],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Panel versions">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col">Version</th>
            <th scope="col">Years</th>
            <th scope="col" class="kv-number">Companies</th>
            <th scope="col" class="kv-number">Rows</th>
            <th scope="col">Brought in</th>
            <th scope="col" class="note">Note</th>
            <th scope="col">File as it was uploaded</th>
          </tr>
        </thead>
        <tbody>
          @for (version of versions(); track version.id) {
            <tr [class.kv-total-row]="version.id === shownId()">
              <th scope="row">
                <a
                  [routerLink]="['/panel', version.id]"
                  [attr.aria-current]="version.id === shownId() ? 'page' : null"
                  >{{ version.panelName }} v{{ version.number }}</a
                >
                @if (version.id === shownId()) {
                  <span class="kv-caption">shown here</span>
                }
              </th>
              <td>{{ years(version.firstYear, version.lastYear) }}</td>
              <td class="kv-number">{{ numbers.figure(version.companies, 'count') }}</td>
              <td class="kv-number">{{ numbers.figure(version.rows, 'count') }}</td>
              <td>
                {{ version.createdAt | date: 'd MMM y, HH:mm' }}
                <span class="kv-caption">by {{ version.createdBy }}</span>
              </td>
              <td class="note">{{ version.note || 'No note' }}</td>
              <td>
                <a
                  [href]="address(version.file.id)"
                  download
                  [attr.aria-label]="
                    'Download ' + version.file.name + ' of version ' + version.number
                  "
                  >{{ version.file.name }}</a
                >
                <span class="kv-caption" [title]="'SHA-256 ' + version.file.sha256">
                  {{ kilobytes(version.file.byteSize) }} · SHA-256
                  <span class="kv-number">{{ version.file.sha256.slice(0, 12) }}</span>
                </span>
              </td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    .kv-caption {
      display: block;
      font-weight: 400;
    }
    th[scope='row'],
    td {
      white-space: nowrap;
    }
    .note {
      min-inline-size: 200px;
      max-inline-size: 360px;
      white-space: normal;
      overflow-wrap: anywhere;
    }
    .kv-total-row td {
      font-weight: 400;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelVersions {
  readonly #panels = inject(PanelsApi);
  protected readonly numbers = inject(NumberFormat);

  readonly versions = input.required<readonly PanelVersionSummary[]>();
  /** The version that the page shows. */
  readonly shownId = input.required<string>();

  protected readonly years = yearSpan;

  protected address(fileId: string): string {
    return this.#panels.fileAddress(fileId);
  }

  protected kilobytes(byteSize: number): string {
    return byteSize < 1000
      ? `${byteSize} bytes`
      : `${Math.round(byteSize / 1000).toLocaleString('en')} kB`;
  }
}
