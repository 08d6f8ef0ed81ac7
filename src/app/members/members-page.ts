import { DOCUMENT } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { ProblemNotice } from '../ui/problem-notice';
import { ConfirmDialog, type ConfirmDialogData } from './confirm-dialog';
import { InvitationTable } from './invitation-table';
import { InviteForm } from './invite-form';
import { MemberTable } from './member-table';
import { type Invitation, type Member, MembersStore } from './members-store';
import { NewLinkSheet } from './new-link';
import { roleWords } from './role-words';
import { RolesDialog, type RolesDialogData } from './roles-dialog';

/** Who can do what? For billing admins; holds no model data. */
@Component({
  selector: 'kv-members-page',
  imports: [
    InvitationTable,
    InviteForm,
    MatButtonModule,
    MemberTable,
    NewLinkSheet,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './members-page.html',
  styleUrl: './members-page.css',
  providers: [MembersStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MembersPage {
  readonly #document = inject(DOCUMENT);
  readonly #injector = inject(Injector);
  readonly #dialog = inject(MatDialog);
  readonly #router = inject(Router);
  protected readonly store = inject(MembersStore);

  private readonly title = viewChild.required<ElementRef<HTMLElement>>('title');
  private readonly inviteButton = viewChild<string, ElementRef<HTMLElement>>('inviteButton', {
    read: ElementRef,
  });

  protected readonly roleWords = roleWords;
  protected readonly isInviting = signal(false);
  protected readonly headline = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return 'Members';
    const { members, invitations } = view.reply;
    const open = invitations.filter((invitation) => !invitation.isExpired).length;
    const people = `${members.length} ${members.length === 1 ? 'member' : 'members'}`;
    return open === 0 ? people : `${people}, ${open} invited`;
  });

  constructor() {
    void this.store.load();
  }

  protected startInviting(): void {
    this.store.forgetLink();
    this.isInviting.set(true);
  }

  /** The sheet with the link takes the focus when there is one; else it goes back to where inviting began. */
  protected stopInviting(): void {
    this.isInviting.set(false);
    if (this.store.link() === null) this.#focusInviteButton();
  }

  protected putLinkAway(): void {
    this.store.forgetLink();
    this.#focusInviteButton();
  }

  protected changeRoles(member: Member): void {
    const data: RolesDialogData = {
      member,
      save: async (roles) => {
        const { problem, leaveTo } = await this.store.changeRoles(member, roles);
        if (leaveTo !== null) await this.#router.navigateByUrl(leaveTo);
        return problem;
      },
    };
    this.#dialog.open(RolesDialog, dialogOf(data));
  }

  protected remove(member: Member): Promise<void> {
    return this.#confirm({
      title: `Remove ${member.name}?`,
      consequence:
        'They are signed out at once and can no longer open this workspace. What they made stays.',
      action: 'Remove member',
      run: () => this.store.remove(member),
    });
  }

  protected withdraw(invitation: Invitation): Promise<void> {
    return this.#confirm({
      title: `Withdraw the invitation to ${invitation.email}?`,
      consequence: 'The link that was made for it opens nothing any more.',
      action: 'Withdraw invitation',
      run: () => this.store.withdraw(invitation),
    });
  }

  /** The row that asked may be gone afterwards: then reading goes on at the top of the page. */
  async #confirm(data: ConfirmDialogData): Promise<void> {
    const dialog = this.#dialog.open(ConfirmDialog, dialogOf(data));
    await firstValueFrom(dialog.afterClosed());
    if (this.#document.activeElement === this.#document.body) this.title().nativeElement.focus();
  }

  #focusInviteButton(): void {
    afterNextRender(() => this.inviteButton()?.nativeElement.focus(), { injector: this.#injector });
  }
}

function dialogOf<T>(data: T): MatDialogConfig<T> {
  const config = new MatDialogConfig<T>();
  config.data = data;
  config.maxWidth = 560;
  return config;
}
