import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import type { EditionWarning } from '@contract';
import { Mark } from '../ui/mark';
import { Sentence, type SentenceFigureWanted } from '../ui/sentence';

/**
 * The warnings of an edition. Whoever is to sign finds the serious ones closed and opens each; for everybody else, and
 * on paper, all stand open.
 */
@Component({
  selector: 'kv-edition-warnings',
  imports: [Mark, Sentence],
  template: `
    <ul>
      @for (warning of warnings(); track warning.id) {
        <li [class.folded]="isFolded(warning)">
          <kv-mark kind="caution" />
          <div>
            <h3>
              @if (hasToOpen(warning)) {
                <button
                  type="button"
                  class="kv-link"
                  [attr.data-warning]="warning.id"
                  [attr.aria-expanded]="!isFolded(warning)"
                  (click)="toggle(warning)"
                >
                  {{ warning.title }}
                </button>
                <span class="kv-caption">{{
                  opened().includes(warning.id) ? 'serious, opened by you' : 'serious, open it'
                }}</span>
              } @else {
                {{ warning.title }}
                @if (warning.isSerious) {
                  <span class="kv-caption">serious</span>
                }
              }
            </h3>
            <p class="words">
              <kv-sentence [sentence]="warning.sentence" (opened)="figureOpened.emit($event)" />
            </p>
          </div>
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      display: grid;
      gap: 12px;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: 10px;
      font-size: 13px;
      line-height: 20px;
    }
    li > div {
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    kv-mark {
      margin-block-start: 2px;
    }
    h3 {
      font-size: 13px;
    }
    h3 .kv-caption {
      margin-inline-start: 8px;
      font-weight: 400;
    }
    .kv-link {
      padding-block: 2px;
      font-weight: 500;
    }
    @media screen {
      .folded .words {
        display: none;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionWarnings {
  readonly #element = inject<ElementRef<HTMLElement>>(ElementRef);

  readonly warnings = input.required<readonly EditionWarning[]>();
  /** Those that the person has opened, by id. */
  readonly opened = input<readonly string[]>([]);
  /** Whether the person is to sign, and so has to open the serious ones. */
  readonly isToOpen = input(false);
  readonly warningOpened = output<string>();
  readonly figureOpened = output<SentenceFigureWanted>();

  /** Those that stand open on the screen. */
  readonly #unfolded = signal<ReadonlySet<string>>(new Set());
  readonly #left = computed(() =>
    this.warnings().filter(({ id, isSerious }) => isSerious && !this.opened().includes(id)),
  );

  /** Takes the person to the first serious warning that is not opened. */
  focusNext(): void {
    const next = this.#left().at(0);
    if (next === undefined) return;
    const selector = `[data-warning="${CSS.escape(next.id)}"]`;
    this.#element.nativeElement.querySelector<HTMLElement>(selector)?.focus();
  }

  protected hasToOpen({ isSerious }: EditionWarning): boolean {
    return this.isToOpen() && isSerious;
  }

  protected isFolded(warning: EditionWarning): boolean {
    return this.hasToOpen(warning) && !this.#unfolded().has(warning.id);
  }

  protected toggle(warning: EditionWarning): void {
    const { id } = warning;
    const isOpening = this.isFolded(warning);
    this.#unfolded.update((now) => {
      const next = new Set(now);
      if (isOpening) next.add(id);
      else next.delete(id);
      return next;
    });
    if (isOpening && !this.opened().includes(id)) this.warningOpened.emit(id);
  }
}
