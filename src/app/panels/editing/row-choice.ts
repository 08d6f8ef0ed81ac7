import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { flagCodes } from '@panel-data';
import { type CellFlags, type RowFilter, flagCounts, flagNames } from './row-filter';

/** Which rows the grid shows: all, those with gaps or changes, or those with a kind of flag. */
@Component({
  selector: 'kv-row-choice',
  template: `
    <label>
      Show
      <select #shown (change)="choose(shown.value)">
        <option value="all" [selected]="filter() === 'all'">all rows</option>
        <option value="gaps" [selected]="filter() === 'gaps'">rows with a missing cell</option>
        <option value="edited" [selected]="filter() === 'edited'">
          rows with changes not saved
        </option>
        @for (choice of flagChoices(); track choice.code) {
          <option [value]="choice.code" [selected]="filter() === choice.code">
            flagged: {{ choice.words }}
          </option>
        }
      </select>
    </label>
  `,
  styles: `
    label {
      display: flex;
      align-items: center;
      gap: 8px;
      min-block-size: 24px;
    }
    select {
      min-block-size: 32px;
      max-inline-size: 240px;
      padding-inline: 8px;
      background: var(--kv-paper);
      color: var(--kv-ink);
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      font: inherit;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RowChoice {
  readonly filter = input.required<RowFilter>();
  readonly flags = input.required<CellFlags>();
  readonly chosen = output<RowFilter>();

  protected readonly flagChoices = computed(() => {
    const counts = flagCounts(this.flags());
    const codes = flagCodes.filter((code) => counts.has(code) || code === this.filter());
    return codes.map((code) => ({
      code,
      words: `${flagNames[code]} (${(counts.get(code) ?? 0).toLocaleString('en')})`,
    }));
  });

  protected choose(value: string): void {
    const codes: readonly RowFilter[] = ['all', 'gaps', 'edited', ...flagCodes];
    this.chosen.emit(codes.find((code) => code === value) ?? 'all');
  }
}
