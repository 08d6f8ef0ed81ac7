import { DOCUMENT } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  input,
  viewChild,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { SignIn } from '@contract';
import { AccountsApi } from '../api/accounts-api';
import { ProblemNotice } from '../ui/problem-notice';
import { AccountSheet } from './account-sheet';
import { byContract, errorWords } from '../ui/contract-validator';
import { EntryForm } from './entry-form';
import { PasswordField } from './password-field';
import { safeNext } from './safe-next';

/** Signs in, and leads to the page that was asked for, or to the first page of the person's roles. */
@Component({
  selector: 'kv-sign-in-page',
  imports: [
    AccountSheet,
    MatButtonModule,
    MatFormFieldModule,
    MatInputModule,
    PasswordField,
    ProblemNotice,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './sign-in-page.html',
  styleUrl: './entry-form.css',
  providers: [EntryForm],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  readonly #accounts = inject(AccountsApi);
  readonly #origin = inject(DOCUMENT).location.origin;
  protected readonly entry = inject(EntryForm);

  /** Where the person wanted to go; from the address, so not to be trusted. */
  readonly next = input<string>();

  private readonly element = viewChild.required<ElementRef<HTMLElement>>('element');

  protected readonly words = errorWords;
  protected readonly wanted = computed(() => safeNext(this.next(), this.#origin));
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', [byContract(SignIn.shape.email, 'expected your e-mail address')]],
    password: ['', [byContract(SignIn.shape.password, 'expected your password')]],
  });

  protected async signIn(): Promise<void> {
    const { email, password } = this.form.controls;
    await this.entry.submit({
      fields: [
        { label: 'E-mail address', pointer: '/email', control: email },
        { label: 'Password', pointer: '/password', control: password },
      ],
      form: this.element(),
      send: () => this.#accounts.signIn(this.form.getRawValue()),
      next: this.wanted(),
      wrongPassword: { control: password, words: 'does not go with this e-mail address' },
    });
  }
}
