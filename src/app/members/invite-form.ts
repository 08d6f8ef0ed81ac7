import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  afterNextRender,
  inject,
  output,
  signal,
  viewChild,
} from '@angular/core';
import {
  type AbstractControl,
  NonNullableFormBuilder,
  ReactiveFormsModule,
  type ValidationErrors,
} from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { EmailAddress, type Role } from '@contract';
import type { ShownProblem } from '../ui/problem';
import { ProblemNotice } from '../ui/problem-notice';
import { MembersStore } from './members-store';
import { RolePicker } from './role-picker';

/** Invites one person by a link that is shown once. */
@Component({
  selector: 'kv-invite-form',
  imports: [
    MatButtonModule,
    MatFormFieldModule,
    MatInputModule,
    ProblemNotice,
    ReactiveFormsModule,
    RolePicker,
  ],
  templateUrl: './invite-form.html',
  styles: `
    form {
      display: grid;
      gap: 16px;
      max-inline-size: 560px;
    }
    mat-form-field {
      inline-size: 100%;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InviteForm {
  readonly #store = inject(MembersStore);

  readonly closed = output();

  private readonly email = viewChild.required<ElementRef<HTMLInputElement>>('email');

  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', [emailOfContract]],
  });
  protected readonly roles = signal<readonly Role[]>([]);
  protected readonly isTried = signal(false);
  protected readonly isSending = signal(false);
  protected readonly problem = signal<ShownProblem | null>(null);

  constructor() {
    afterNextRender(() => this.email().nativeElement.focus());
  }

  protected async invite(): Promise<void> {
    this.isTried.set(true);
    this.form.markAllAsTouched();
    if (this.form.invalid || this.roles().length === 0 || this.isSending()) return;
    this.isSending.set(true);
    const problem = await this.#store.invite(this.form.getRawValue().email.trim(), this.roles());
    this.isSending.set(false);
    this.problem.set(problem);
    if (problem === null) this.closed.emit();
  }
}

/** The contract's own rule, so that the form and the server agree. */
function emailOfContract(control: AbstractControl<string>): ValidationErrors | null {
  return EmailAddress.safeParse(control.value.trim()).success ? null : { contract: true };
}
