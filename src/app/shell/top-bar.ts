import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { Preferences, Session } from '@contract';
import { PersonMenu } from './person-menu';
import { UnitSwitch } from './unit-switch';

/** Whose workspace, whose figures, in which currency and unit; and the person's menu. */
@Component({
  selector: 'kv-top-bar',
  imports: [PersonMenu, UnitSwitch],
  template: `
    <p class="words">
      <span class="workspace">{{ session().workspace.name }}</span>
      @if (ownCompany()) {
        <span class="own">own company {{ ownCompany() }} · {{ currency() }}</span>
      }
    </p>
    @if (currency()) {
      <kv-unit-switch
        [unit]="session().preferences.unit"
        (unitChanged)="preferencesChanged.emit({ unit: $event })"
      />
    }
    <kv-person-menu
      [name]="session().person.name"
      [email]="session().person.email"
      [roles]="session().roles"
      [preferences]="session().preferences"
      (preferencesChanged)="preferencesChanged.emit($event)"
      (signedOut)="signedOut.emit()"
    />
  `,
  styles: `
    :host {
      display: flex;
      align-items: center;
      gap: 12px 24px;
      min-block-size: 56px;
      padding-inline: 32px;
      border-block-end: var(--kv-rule);
    }
    .words {
      flex: 1;
      display: flex;
      flex-wrap: wrap;
      gap: 0 24px;
      min-inline-size: 0;
    }
    .words span {
      overflow-wrap: anywhere;
    }
    .workspace {
      font-weight: 500;
    }
    .own {
      color: var(--kv-soft-ink);
    }
    @media (width < 720px) {
      :host {
        gap: 12px;
        padding: 8px 16px;
      }
      .own {
        font-size: 12px;
        line-height: 16px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TopBar {
  readonly session = input.required<Session>();
  /** Empty where the page is about no company. */
  readonly ownCompany = input('');
  /** ISO 4217; empty where the page shows no money of the model: then there is no unit to switch. */
  readonly currency = input('');

  readonly preferencesChanged = output<Partial<Preferences>>();
  readonly signedOut = output();
}
