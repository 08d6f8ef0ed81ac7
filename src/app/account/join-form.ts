import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { type InvitationView, Password, PersonName } from '@contract';
import { AccountsApi } from '../api/accounts-api';
import { ProblemNotice } from '../ui/problem-notice';
import { byContract, errorWords } from '../ui/contract-validator';
import { EntryForm } from './entry-form';
import type { EntryField } from './entry-problem';
import { PasswordField } from './password-field';
import { sentencesOf } from './role-sentences';

/** What the link opens, and the fields that joining needs: those of a new account, or the password of an existing one. */
@Component({
  selector: 'kv-join-form',
  imports: [
    DatePipe,
    MatButtonModule,
    MatFormFieldModule,
    MatInputModule,
    PasswordField,
    ProblemNotice,
    ReactiveFormsModule,
  ],
  templateUrl: './join-form.html',
  styleUrls: ['./entry-form.css', './join-form.css'],
  providers: [EntryForm],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JoinForm {
  readonly #accounts = inject(AccountsApi);
  protected readonly entry = inject(EntryForm);

  readonly invitation = input.required<InvitationView>();
  /** The link's secret. */
  readonly token = input.required<string>();
  /** E-mail address of who is signed in now; empty when nobody is. */
  readonly signedInAs = input('');
  readonly linkClosed = output();

  private readonly element = viewChild.required<ElementRef<HTMLElement>>('element');

  protected readonly words = errorWords;
  protected readonly sentences = computed(() => sentencesOf(this.invitation().roles));
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', [byContract(PersonName, 'expected your name')]],
    password: ['', [byContract(Password, 'expected a password')]],
  });

  protected async join(): Promise<void> {
    const { name, password } = this.form.controls;
    const isNew = !this.invitation().hasAccount;
    const fields: readonly EntryField[] = [
      ...(isNew ? [{ label: 'Your name', pointer: '/name', control: name }] : []),
      { label: 'Password', pointer: '/password', control: password },
    ];
    const problem = await this.entry.submit({
      fields,
      form: this.element(),
      send: () =>
        this.#accounts.acceptInvitation({
          token: this.token(),
          password: password.value,
          ...(isNew ? { name: name.value } : {}),
        }),
      next: null,
      wrongPassword: { control: password, words: 'not the password of your account' },
    });
    if (problem?.slug === 'gone') this.linkClosed.emit();
  }
}
