import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** Splits a sentence where it names the own company, so that the name can be set in its colour. */
export function namedParts(
  sentence: string,
  own: string,
): readonly { readonly text: string; readonly isOwn: boolean }[] {
  if (own === '') return [{ text: sentence, isOwn: false }];
  return sentence
    .split(own)
    .flatMap((text, index) =>
      index === 0
        ? [{ text, isOwn: false }]
        : [
            { text: own, isOwn: true },
            { text, isOwn: false },
          ],
    )
    .filter((part) => part.text !== '');
}

/**
 * The head of a page: its finding in words, the line that says unit, years and fit, and its actions.
 *
 * `<kv-page-header [finding]="…" [own]="'Velmara'" [source]="'EUR m · 95 % intervals'"><button …></kv-page-header>`
 */
@Component({
  selector: 'kv-page-header',
  template: `
    <div class="words">
      <h1>
        @for (part of parts(); track $index) {
          <span [class.kv-own]="part.isOwn">{{ part.text }}</span>
        }
      </h1>
      @if (source()) {
        <p class="kv-caption">{{ source() }}</p>
      }
    </div>
    <div class="actions kv-no-print"><ng-content /></div>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: flex-start;
      justify-content: space-between;
      gap: 16px 32px;
    }
    .words {
      flex: 1 1 320px;
      display: grid;
      gap: 4px;
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 8px;
    }
    .actions:empty {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageHeader {
  readonly finding = input.required<string>();
  /** The own company's name as it stands in the finding. */
  readonly own = input('');
  /** Unit, years and fit: `EUR m · 95 % intervals · 14 companies, FY2008–FY2025`. */
  readonly source = input('');

  protected readonly parts = computed(() => namedParts(this.finding(), this.own()));
}
