import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import type { LineageReply } from '@contract';
import { originLines } from './origin-words';

const linesAtFirst = 20;

/** The cells of a lineage that are other than the file has them, each with its rate or its correction. */
@Component({
  selector: 'kv-cell-origins',
  template: `
    @if (lines().length > 0) {
      <h3>Cells that differ from the file</h3>
      <ul>
        @for (line of lines().slice(0, room()); track line.place) {
          <li>
            {{ line.place }}. <span>{{ line.words }}</span>
          </li>
        }
      </ul>
      @if (lines().length > room()) {
        <button type="button" class="kv-link" (click)="room.set(lines().length)">
          Show the other {{ lines().length - room() }} cells
        </button>
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      justify-items: start;
      gap: 4px;
    }
    ul {
      margin: 0;
      padding-inline-start: 16px;
    }
    span {
      color: var(--kv-soft-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellOrigins {
  readonly lineage = input.required<LineageReply>();

  protected readonly lines = computed(() => originLines(this.lineage()));
  protected readonly room = linkedSignal({
    source: () => this.lineage().figure,
    computation: () => linesAtFirst,
  });
}
