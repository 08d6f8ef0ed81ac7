import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { Mark } from '../../ui/mark';

const mostListed = 12;

/** Names the companies without a written reason, and what that keeps from happening. */
@Component({
  selector: 'kv-missing-reasons',
  imports: [Mark],
  template: `
    <kv-mark kind="caution" />
    <span>
      An edition cannot be published before each of these has a reason:
      @for (company of companies().slice(0, most); track company) {
        @if (isReadOnly()) {
          {{ company }}{{ $last ? '' : ', ' }}
        } @else {
          <button type="button" class="kv-link" (click)="asked.emit(company)">
            {{ company }}</button>{{ $last ? '' : ', ' }}
        }
      }
      @if (companies().length > most) {
        and {{ companies().length - most }} more
      }
    </span>
  `,
  styles: `
    :host {
      display: flex;
      gap: 10px;
    }
    kv-mark {
      margin-block-start: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MissingReasons {
  readonly companies = input.required<readonly string[]>();
  readonly isReadOnly = input(false);
  /** Asks for the place where a company's reason is written. */
  readonly asked = output<string>();

  protected readonly most = mostListed;
}
