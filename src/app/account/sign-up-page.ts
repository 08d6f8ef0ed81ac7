import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  inject,
  viewChild,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { SignUp } from '@contract';
import { AccountsApi } from '../api/accounts-api';
import { ProblemNotice } from '../ui/problem-notice';
import { AccountSheet } from './account-sheet';
import { byContract, errorWords } from '../ui/contract-validator';
import { EntryForm } from './entry-form';
import { PasswordField } from './password-field';

/** Creates an account and a workspace, whose founder is its analyst and billing admin. */
@Component({
  selector: 'kv-sign-up-page',
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
  templateUrl: './sign-up-page.html',
  styleUrl: './entry-form.css',
  providers: [EntryForm],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignUpPage {
  readonly #accounts = inject(AccountsApi);
  protected readonly entry = inject(EntryForm);

  private readonly element = viewChild.required<ElementRef<HTMLElement>>('element');

  protected readonly words = errorWords;
  protected readonly form = inject(NonNullableFormBuilder).group({
    workspaceName: ['', [byContract(SignUp.shape.workspaceName, 'expected a name')]],
    name: ['', [byContract(SignUp.shape.name, 'expected your name')]],
    email: ['', [byContract(SignUp.shape.email, 'expected your e-mail address')]],
    password: ['', [byContract(SignUp.shape.password, 'expected at least 12 characters')]],
  });

  protected async signUp(): Promise<void> {
    const { workspaceName, name, email, password } = this.form.controls;
    await this.entry.submit({
      fields: [
        { label: 'Workspace', pointer: '/workspaceName', control: workspaceName },
        { label: 'Your name', pointer: '/name', control: name },
        { label: 'E-mail address', pointer: '/email', control: email },
        { label: 'Password', pointer: '/password', control: password },
      ],
      form: this.element(),
      send: () => this.#accounts.signUp(this.form.getRawValue()),
      next: null,
    });
  }
}
