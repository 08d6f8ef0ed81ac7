import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Invitation } from './members-store';
import { rolesText } from './role-words';

/** Invitations that nobody has accepted yet. */
@Component({
  selector: 'kv-invitation-table',
  imports: [DatePipe],
  template: `
    @if (rows().length === 0) {
      <p>No invitation is open.</p>
    } @else {
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Open invitations, table">
        <table class="kv-table">
          <thead>
            <tr>
              <th scope="col">E-mail address</th>
              <th scope="col">Roles</th>
              <th scope="col">Link works until</th>
              <th scope="col"><span class="kv-visually-hidden">What you can do</span></th>
            </tr>
          </thead>
          <tbody>
            @for (row of rows(); track row.invitation.id) {
              <tr>
                <th scope="row">{{ row.invitation.email }}</th>
                <td>{{ row.roles }}</td>
                <td>
                  {{
                    row.invitation.isExpired
                      ? 'expired'
                      : (row.invitation.expiresAt | date: 'd MMM y, HH:mm')
                  }}
                </td>
                <td class="action">
                  <button
                    type="button"
                    class="kv-link"
                    [attr.aria-label]="'Withdraw the invitation to ' + row.invitation.email"
                    (click)="withdrawalWanted.emit(row.invitation)"
                  >
                    Withdraw
                  </button>
                </td>
              </tr>
            }
          </tbody>
        </table>
      </div>
      <p class="kv-caption">A link is shown once only. For a new one, withdraw and invite again.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      min-inline-size: 0;
    }
    th[scope='row'] {
      overflow-wrap: anywhere;
    }
    .action {
      text-align: end;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvitationTable {
  readonly invitations = input.required<readonly Invitation[]>();
  readonly withdrawalWanted = output<Invitation>();

  protected readonly rows = computed(() =>
    this.invitations().map((invitation) => ({ invitation, roles: rolesText(invitation.roles) })),
  );
}
