import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { PanelVersionSummary, PeerGroupSummary } from '@contract';

/** Every saved version of the peer group, newest first. */
@Component({
  selector: 'kv-peer-versions',
  imports: [DatePipe, RouterLink],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Peer group versions, table">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col">Version</th>
            <th scope="col">Own company</th>
            <th scope="col" class="kv-number">Peers</th>
            <th scope="col">Panel</th>
            <th scope="col">Note</th>
            <th scope="col">Saved by</th>
            <th scope="col">Saved on</th>
          </tr>
        </thead>
        <tbody>
          @for (version of rows(); track version.id) {
            <tr>
              <th scope="row">
                <a
                  [routerLink]="['/peers', version.id]"
                  [attr.aria-current]="version.id === shownId() ? 'true' : null"
                  >Version {{ version.number }}</a
                >
                @if (version.id === shownId()) {
                  <span class="kv-caption"> shown</span>
                }
              </th>
              <td>{{ version.ownCompany }}</td>
              <td class="kv-number">{{ version.peerCount }}</td>
              <td>{{ version.panel }}</td>
              <td class="note">{{ version.note || '–' }}</td>
              <td>{{ version.createdBy }}</td>
              <td>{{ version.createdAt | date: 'd MMM y, HH:mm' }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    .note {
      min-inline-size: 160px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeerVersions {
  readonly versions = input.required<readonly PeerGroupSummary[]>();
  readonly panelVersions = input.required<readonly PanelVersionSummary[]>();
  readonly shownId = input<string>();

  protected readonly rows = computed(() => {
    const panels = new Map(this.panelVersions().map((panel) => [panel.id, panel]));
    return this.versions().map((version) => {
      const panel = panels.get(version.panelVersionId);
      return {
        ...version,
        panel: panel === undefined ? 'n/a' : `${panel.panelName} v${panel.number}`,
      };
    });
  });
}
