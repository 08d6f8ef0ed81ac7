import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { EditionChanges as Changes, ModelForm } from '@contract';
import { asDifference } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { counted, listed } from '../ui/phrases';

type FigureChange = Changes['figures'][number];

/** What is other than in the edition signed last: figures, peers, cells of the panel, specification. */
@Component({
  selector: 'kv-edition-changes',
  imports: [DatePipe, RouterLink],
  templateUrl: './edition-changes.html',
  styles: `
    :host {
      display: grid;
      gap: 12px;
      min-inline-size: 0;
      font-size: 13px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionChanges {
  readonly #numbers = inject(NumberFormat);

  readonly changes = input.required<Changes>();
  readonly form = input.required<ModelForm>();
  /** Columns of the panel that hold money, by their headers. */
  readonly moneyColumns = input<readonly string[]>([]);
  readonly figureOpened = output<{ readonly figure: string; readonly value: number }>();

  protected readonly figures = computed(() =>
    this.changes().figures.map((change) => ({
      label: change.label,
      figure: change.figure,
      before: this.#written(change, change.before, change.beforeText),
      after: this.#written(change, change.after, change.afterText),
      value: change.after?.estimate ?? 0,
    })),
  );
  protected readonly peers = computed(() => {
    const { peersAdded, peersRemoved } = this.changes();
    if (peersAdded.length + peersRemoved.length === 0) return 'The peers are the same.';
    return [
      ...(peersAdded.length > 0 ? [`Peers added: ${listed(peersAdded)}.`] : []),
      ...(peersRemoved.length > 0 ? [`Peers left out: ${listed(peersRemoved)}.`] : []),
    ].join(' ');
  });
  protected readonly cells = computed(() => {
    const { panelCells } = this.changes();
    if (panelCells === null) return 'The panel is another one, so its cells are not compared.';
    const { addedRows, removedRows, changedCells } = panelCells;
    if (addedRows + removedRows + changedCells === 0) return 'No cell of the panel changed.';
    return `In the panel ${counted(changedCells, 'cell')} changed, ${counted(addedRows, 'row')} added, ${counted(removedRows, 'row')} removed.`;
  });

  protected cellText(column: string | null, value: number | null): string {
    const isMoney = column !== null && this.moneyColumns().includes(column);
    return this.#numbers.figure(value, isMoney ? 'money' : 'plain');
  }

  #written(
    { label, kind }: FigureChange,
    value: FigureChange['before'],
    text: string | null,
  ): string {
    if (kind === 'text') return text ?? 'none';
    if (value === null) return 'none';
    const shown = label === 'standing' ? asDifference(value, this.form()) : value;
    return this.#numbers.interval(shown, kind, 3);
  }
}
