import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { Role } from '@contract';
import { Mark } from '../ui/mark';
import { roleWords } from './role-words';

let pickers = 0;

/** Roles to choose from, each with what it opens. */
@Component({
  selector: 'kv-role-picker',
  imports: [Mark],
  template: `
    <fieldset [attr.aria-describedby]="isMissing() ? errorId : null">
      <legend>{{ legend() }}</legend>
      @for (word of words; track word.role) {
        <label>
          <input
            type="checkbox"
            [checked]="roles().includes(word.role)"
            (change)="toggle(word.role)"
          />
          <span>
            <span class="name">{{ word.name }}</span>
            <span class="kv-caption">{{ word.explanation }}</span>
          </span>
        </label>
      }
      @if (isMissing()) {
        <p class="error" role="alert" [id]="errorId">
          <kv-mark kind="error" /> Choose at least one role.
        </p>
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      display: grid;
      gap: 4px;
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
      margin-block-end: 4px;
      font-weight: 500;
    }
    label {
      display: flex;
      gap: 12px;
      padding-block: 4px;
    }
    label > span {
      display: grid;
    }
    input {
      flex: none;
      inline-size: 18px;
      block-size: 18px;
      margin: 1px 0 0;
      accent-color: var(--kv-spruce);
    }
    .error {
      display: flex;
      gap: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RolePicker {
  readonly legend = input.required<string>();
  readonly roles = input.required<readonly Role[]>();
  /** Says that one has to be chosen. */
  readonly isMissing = input(false);
  readonly rolesChanged = output<readonly Role[]>();

  protected readonly words = roleWords;
  protected readonly errorId = `kv-role-picker-error-${pickers++}`;

  protected toggle(role: Role): void {
    const held = this.roles();
    this.rolesChanged.emit(
      roleWords
        .map((word) => word.role)
        .filter((each) => (each === role ? !held.includes(each) : held.includes(each))),
    );
  }
}
