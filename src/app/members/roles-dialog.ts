import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import type { Role } from '@contract';
import type { ShownProblem } from '../ui/problem';
import { ProblemNotice } from '../ui/problem-notice';
import type { Member } from './members-store';
import { RolePicker } from './role-picker';

export interface RolesDialogData {
  readonly member: Member;
  /** @returns the problem that kept the roles as they were, or null. */
  readonly save: (roles: readonly Role[]) => Promise<ShownProblem | null>;
}

/** Changes the roles of one member; stays open and says so when they cannot be changed. */
@Component({
  selector: 'kv-roles-dialog',
  imports: [MatButtonModule, MatDialogModule, ProblemNotice, RolePicker],
  template: `
    <h2 mat-dialog-title>Roles of {{ data.member.name }}</h2>
    <mat-dialog-content>
      <kv-role-picker
        [legend]="data.member.isYou ? 'What you may do' : 'What they may do'"
        [roles]="roles()"
        [isMissing]="roles().length === 0"
        (rolesChanged)="roles.set($event)"
      />
      @if (data.member.isYou && !roles().includes('billing_admin')) {
        <p>Without the billing admin role this page closes for you.</p>
      }
      @if (problem(); as found) {
        <kv-problem-notice [problem]="found" />
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button mat-button type="button" mat-dialog-close>Cancel</button>
      <button
        mat-flat-button
        type="button"
        [disabled]="isSaving() || roles().length === 0"
        (click)="save()"
      >
        Save roles
      </button>
    </mat-dialog-actions>
  `,
  styles: `
    :host {
      --mat-dialog-supporting-text-color: var(--kv-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RolesDialog {
  readonly #dialog = inject<MatDialogRef<RolesDialog>>(MatDialogRef);
  protected readonly data = inject<RolesDialogData>(MAT_DIALOG_DATA);

  protected readonly roles = signal<readonly Role[]>(this.data.member.roles);
  protected readonly isSaving = signal(false);
  protected readonly problem = signal<ShownProblem | null>(null);

  protected async save(): Promise<void> {
    this.isSaving.set(true);
    const problem = await this.data.save(this.roles());
    this.isSaving.set(false);
    this.problem.set(problem);
    if (problem === null) this.#dialog.close();
  }
}
