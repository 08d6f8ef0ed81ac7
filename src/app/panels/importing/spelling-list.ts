import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import type { FileMending, ImportCheck } from '@contract';
import { counted, listed } from '../../ui/phrases';
import { openSpellings, readApart, readAsOne, renamedGroups } from './mending';

const shownAtOnce = 10;

/** Names that may be one company: offered as one, and read as one only when the analyst says so. */
@Component({
  selector: 'kv-spelling-list',
  template: `
    @for (group of shown(); track group[0].company) {
      <fieldset>
        <legend class="kv-visually-hidden">Spellings of {{ group[0].company }}</legend>
        <div class="actions">
          @for (each of group; track each.company) {
            @if (isChoice(group, each)) {
              <label class="choice">
                <input
                  type="radio"
                  [name]="'spelling-' + group[0].company"
                  [checked]="nameOf(group) === each.company"
                  (change)="choose(group[0].company, each.company)"
                />
                <span
                  >{{ each.company }} <span class="rows">{{ rowWords(each.rows) }}</span></span
                >
              </label>
            } @else {
              <span class="choice"
                >{{ each.company }} <span class="rows">{{ rowWords(each.rows) }}</span></span
              >
            }
          }
          <button type="button" class="kv-link" (click)="accept(group)">
            Read as one: {{ nameOf(group) }}
          </button>
        </div>
      </fieldset>
    }
    @if (hidden() > 0) {
      <button type="button" class="kv-link" (click)="limit.set(limit() + 10)">
        Show more of the other {{ hidden() }} groups
      </button>
    }
    @for (group of renamed(); track group.to) {
      <p>
        {{ fromWords(group.from) }} {{ group.from.length === 1 ? 'is' : 'are' }} read as
        {{ group.to }}.
        <button
          type="button"
          class="kv-link"
          [attr.aria-label]="'Read ' + fromWords(group.from) + ' apart again'"
          (click)="mendingChanged.emit(apart(group.to))"
        >
          Read apart again
        </button>
      </p>
    }
  `,
  styleUrl: './entries.css',
  styles: `
    fieldset {
      padding-block-end: 8px;
      border-block-end: var(--kv-rule);
    }
    .rows {
      font-size: 12px;
      color: var(--kv-soft-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpellingList {
  readonly spellings = input.required<ImportCheck['spellings']>();
  readonly mending = input.required<FileMending>();
  readonly mendingChanged = output<FileMending>();

  readonly #chosen = linkedSignal({
    source: this.spellings,
    computation: (): Readonly<Record<string, string>> => ({}),
  });
  protected readonly open = computed(() => openSpellings(this.spellings(), this.mending()));
  protected readonly limit = linkedSignal({
    source: this.spellings,
    computation: () => shownAtOnce,
  });
  protected readonly shown = computed(() => this.open().slice(0, this.limit()));
  protected readonly hidden = computed(() => this.open().length - this.shown().length);
  protected readonly renamed = computed(() => renamedGroups(this.mending()));

  /** The name that the group would be read as: the likeliest, or the one chosen. */
  protected nameOf(group: ImportCheck['spellings'][number]): string {
    const [first] = group;
    return this.#chosen()[first.company] ?? first.company;
  }

  /** A name of the panel that the file does not have cannot be read as another: its rows are no rows of the file. */
  protected isChoice(
    group: ImportCheck['spellings'][number],
    { rows }: ImportCheck['spellings'][number][number],
  ): boolean {
    const known = group.filter((each) => each.rows === 0);
    return known.length === 0 || (known.length > 1 && rows === 0);
  }

  protected choose(group: string, name: string): void {
    this.#chosen.update((chosen) => ({ ...chosen, [group]: name }));
  }

  protected accept(group: ImportCheck['spellings'][number]): void {
    const names = group.filter(({ rows }) => rows > 0).map(({ company }) => company);
    this.mendingChanged.emit(readAsOne(this.mending(), names, this.nameOf(group)));
  }

  protected apart(to: string): FileMending {
    return readApart(this.mending(), to);
  }

  protected rowWords(rows: number): string {
    return rows === 0 ? 'in the panel' : counted(rows, 'row');
  }

  protected fromWords(names: readonly string[]): string {
    return listed(names);
  }
}
