import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { errorWords } from '../ui/contract-validator';

/** A password, hidden until the person wants to see it; password managers and pasting work. */
@Component({
  selector: 'kv-password-field',
  imports: [MatFormFieldModule, MatInputModule, ReactiveFormsModule],
  template: `
    <mat-form-field appearance="outline" hideRequiredMarker>
      <mat-label>{{ label() }}</mat-label>
      <input
        matInput
        required
        [type]="isShown() ? 'text' : 'password'"
        [formControl]="control()"
        [attr.autocomplete]="autocomplete()"
        [attr.name]="autocomplete()"
        autocapitalize="none"
        spellcheck="false"
      />
      <button
        matSuffix
        type="button"
        class="kv-link"
        [attr.aria-label]="isShown() ? 'Hide the password' : 'Show the password'"
        (click)="toggle()"
      >
        {{ isShown() ? 'Hide' : 'Show' }}
      </button>
      @if (hint()) {
        <mat-hint>{{ hint() }}</mat-hint>
      }
      <mat-error>{{ words(control()) }}</mat-error>
    </mat-form-field>
  `,
  styles: `
    mat-form-field {
      inline-size: 100%;
    }
    .kv-link {
      margin-inline: 8px 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordField {
  readonly control = input.required<FormControl<string>>();
  readonly label = input('Password');
  /** Whether this is the password of an account, or one that is chosen now. */
  readonly purpose = input.required<'current' | 'new'>();

  protected readonly words = errorWords;
  protected readonly isShown = signal(false);
  protected readonly autocomplete = computed(() => `${this.purpose()}-password`);
  protected readonly hint = computed(() =>
    this.purpose() === 'new' ? 'At least 12 characters, any you like' : '',
  );

  protected toggle(): void {
    this.isShown.update((isShown) => !isShown);
  }
}
