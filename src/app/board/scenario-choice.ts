import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ScenarioReply } from '@contract';
import { withMoved } from './composition';

export const mostScenarios = 4;

/** Which scenarios stand on the edition, and in which order. */
@Component({
  selector: 'kv-scenario-choice',
  imports: [RouterLink],
  template: `
    <fieldset>
      <legend>Scenarios, up to {{ mostScenarios }}</legend>
      @for (scenario of scenarios(); track scenario.id) {
        <label>
          <input
            type="checkbox"
            [checked]="chosen().includes(scenario.id)"
            [disabled]="!chosen().includes(scenario.id) && chosen().length >= mostScenarios"
            (change)="toggle(scenario.id)"
          />
          <span>{{ scenario.name }}, version {{ scenario.version }}</span>
        </label>
      } @empty {
        <p class="kv-caption">
          No scenario of this fit is saved.
          <a [routerLink]="['/scenarios']" [queryParams]="{ fit: fitId() }">Plan one</a>
        </p>
      }
    </fieldset>
    @if (inOrder().length > 1) {
      <p id="kv-order-title">Order on the edition; the first one leads</p>
      <ol aria-labelledby="kv-order-title">
        @for (scenario of inOrder(); track scenario.id; let first = $first; let last = $last) {
          <li [attr.data-id]="scenario.id">
            <span>{{ scenario.name }}</span>
            <button
              type="button"
              class="kv-link"
              [attr.aria-label]="'Earlier: ' + scenario.name"
              [attr.aria-disabled]="first"
              (click)="move(scenario, -1)"
            >
              Earlier
            </button>
            <button
              type="button"
              class="kv-link"
              [attr.aria-label]="'Later: ' + scenario.name"
              [attr.aria-disabled]="last"
              (click)="move(scenario, 1)"
            >
              Later
            </button>
          </li>
        }
      </ol>
      <p role="status" class="kv-visually-hidden">{{ said() }}</p>
    }
  `,
  styleUrls: ['./choices.css', './scenario-choice.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioChoice {
  readonly #element = inject<ElementRef<HTMLElement>>(ElementRef);
  readonly #injector = inject(Injector);

  readonly fitId = input.required<string>();
  readonly scenarios = input.required<readonly ScenarioReply[]>();
  /** Ids in the order of the edition. */
  readonly chosen = input.required<readonly string[]>();
  readonly chosenChanged = output<string[]>();

  protected readonly mostScenarios = mostScenarios;
  protected readonly said = signal('');
  protected readonly inOrder = computed(() =>
    this.chosen().flatMap((id) => this.scenarios().filter((each) => each.id === id)),
  );

  protected toggle(id: string): void {
    const chosen = this.chosen();
    this.chosenChanged.emit(
      chosen.includes(id) ? chosen.filter((each) => each !== id) : [...chosen, id],
    );
  }

  /** The button keeps the focus wherever its line goes. */
  protected move({ id, name }: ScenarioReply, by: -1 | 1): void {
    const moved = withMoved(this.chosen(), id, by);
    this.said.set(`${name} is number ${moved.indexOf(id) + 1} of ${moved.length}`);
    this.chosenChanged.emit(moved);
    const focus = () => {
      const buttons = this.#element.nativeElement.querySelectorAll<HTMLButtonElement>(
        `li[data-id="${id}"] button`,
      );
      buttons.item(by === -1 ? 0 : 1).focus();
    };
    afterNextRender(focus, { injector: this.#injector });
  }
}
