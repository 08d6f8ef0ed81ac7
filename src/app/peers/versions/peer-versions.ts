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
            @if (rows().length > 1) {
              <th scope="col"><span class="kv-visually-hidden">Compare</span></th>
            }
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
              <td class="whole">{{ version.createdAt | date: 'd MMM y, HH:mm' }}</td>
              @if (rows().length > 1) {
                <td class="whole">
                  @if (version.beside; as beside) {
                    <a
                      routerLink="/peers/compare"
                      [queryParams]="{ a: beside.a.id, b: beside.b.id }"
                      [attr.aria-label]="
                        'Version ' + beside.a.number + ' beside version ' + beside.b.number
                      "
                      >Beside version {{ beside.other.number }}</a
                    >
                  }
                </td>
              }
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
    .whole {
      white-space: nowrap;
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
    const shown = this.versions().find(({ id }) => id === this.shownId()) ?? this.versions()[0];
    return this.versions().map((version, place, all) => {
      const panel = panels.get(version.panelVersionId);
      return {
        ...version,
        beside: pairOf(version, version === shown ? all[place + 1] : shown),
        panel: panel === undefined ? 'n/a' : `${panel.panelName} v${panel.number}`,
      };
    });
  });
}

/** The older one of the two first; null where there is no other. */
function pairOf(version: PeerGroupSummary, other: PeerGroupSummary | undefined) {
  if (other === undefined) return null;
  const [a, b] = version.number < other.number ? [version, other] : [other, version];
  return { a, b, other };
}
