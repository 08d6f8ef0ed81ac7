import type { GridPlace } from './cell-block';
import type { GridBlock } from './grid-block';

const scrollEveryMs = 40;

/**
 * Selects blocks with the mouse: drag, or Shift and click. Dragging past the upper or lower edge goes on row by row.
 * Touch is left to scrolling.
 *
 * @returns takes the listeners away.
 */
export function followPointer(
  host: HTMLElement,
  block: () => GridBlock | null,
  columnIds: () => readonly string[],
): () => void {
  const listening = new AbortController();
  const { signal } = listening;
  let isDragging = false;
  let scrolling: ReturnType<typeof setInterval> | undefined;

  const placeOf = (target: EventTarget | null): GridPlace | null => {
    const cell = target instanceof Element ? target.closest('.ag-cell[col-id]') : null;
    const row = Number(cell?.closest('[row-index]')?.getAttribute('row-index') ?? NaN);
    const column = columnIds().indexOf(cell?.getAttribute('col-id') ?? '');
    const isEdited = cell?.classList.contains('ag-cell-inline-editing') ?? false;
    return Number.isNaN(row) || column === -1 || isEdited ? null : { row, column };
  };
  const stopScrolling = (): void => {
    clearInterval(scrolling);
    scrolling = undefined;
  };
  const stop = (): void => {
    isDragging = false;
    stopScrolling();
  };

  host.addEventListener(
    'pointerdown',
    (event) => {
      const isMouse = event.pointerType === 'mouse' && event.button === 0;
      const place = isMouse ? placeOf(event.target) : null;
      if (place === null) return;
      if (event.shiftKey) {
        event.preventDefault();
        event.stopPropagation();
        block()?.drawTo(place);
      } else {
        isDragging = true;
        block()?.begin(place);
      }
    },
    // Before the grid, which would take Shift and click for a click.
    { signal, capture: true },
  );
  host.addEventListener(
    'mouseover',
    (event) => {
      const place = isDragging ? placeOf(event.target) : null;
      if (place !== null) block()?.drawTo(place);
    },
    { signal },
  );
  host.ownerDocument.addEventListener(
    'mousemove',
    (event) => {
      if (!isDragging) return;
      if ((event.buttons & 1) === 0) {
        stop();
        return;
      }
      const box = host.querySelector('.ag-body-viewport')?.getBoundingClientRect();
      if (box === undefined) return;
      const way = event.clientY < box.top ? 'up' : event.clientY > box.bottom ? 'down' : null;
      if (way === null) stopScrolling();
      else scrolling ??= setInterval(() => block()?.draw(way, 'one'), scrollEveryMs);
    },
    { signal },
  );
  host.ownerDocument.addEventListener('mouseup', stop, { signal });
  return () => {
    stop();
    listening.abort();
  };
}
