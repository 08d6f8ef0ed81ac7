import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Member } from './members-store';
import { rolesText } from './role-words';

/** Members with what they may do. */
@Component({
  selector: 'kv-member-table',
  imports: [DatePipe],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Members, table">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col">Name</th>
            <th scope="col">Roles</th>
            <th scope="col" class="since">Since</th>
            <th scope="col"><span class="kv-visually-hidden">What you can do</span></th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.member.personId) {
            <tr>
              <th scope="row">
                <span class="name"
                  >{{ row.member.name }}{{ row.member.isYou ? ' (you)' : '' }}</span
                >
                <span class="kv-caption">{{ row.member.email }}</span>
              </th>
              <td>{{ row.roles }}</td>
              <td class="since">{{ row.member.joinedAt | date: 'd MMM y' }}</td>
              <td>
                <span class="actions">
                  <button
                    type="button"
                    class="kv-link"
                    [attr.aria-label]="'Change roles of ' + row.member.name"
                    (click)="changeWanted.emit(row.member)"
                  >
                    Change roles
                  </button>
                  @if (!row.member.isYou) {
                    <button
                      type="button"
                      class="kv-link"
                      [attr.aria-label]="'Remove ' + row.member.name"
                      (click)="removalWanted.emit(row.member)"
                    >
                      Remove
                    </button>
                  }
                </span>
              </td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    th[scope='row'] {
      overflow-wrap: anywhere;
    }
    .name {
      display: block;
      font-weight: 500;
    }
    .since {
      white-space: nowrap;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      justify-content: end;
      gap: 0 16px;
    }
    @media (width < 720px) {
      .since {
        display: none;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MemberTable {
  readonly members = input.required<readonly Member[]>();
  readonly changeWanted = output<Member>();
  readonly removalWanted = output<Member>();

  protected readonly rows = computed(() =>
    this.members().map((member) => ({ member, roles: rolesText(member.roles) })),
  );
}
