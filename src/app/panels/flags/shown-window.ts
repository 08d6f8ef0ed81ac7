import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { counted, yearsText } from '../../ui/phrases';
import { FlagsStore } from './flags-store';

/** Says above the rows that only some companies and years are shown, and leads back to all. */
@Component({
  selector: 'kv-shown-window',
  template: `
    @if (words(); as words) {
      <p>
        {{ words }}
        <button type="button" class="kv-link" (click)="store.showAll()">
          Show all companies and years
        </button>
      </p>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShownWindow {
  protected readonly store = inject(FlagsStore);

  protected readonly words = computed(() => {
    const only = this.store.only();
    if (only === null) return '';
    const who = counted(only.companies.length, 'company', 'companies');
    return `Only the fully covered ${who}, ${yearsText(only.firstYear, only.lastYear)}, are shown.`;
  });
}
