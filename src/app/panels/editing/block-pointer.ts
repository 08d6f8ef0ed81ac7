import { type Direction, type GridPlace, isOneCell } from './cell-block';
import { gridHeadHeight } from '../grid-settings';
import { type Box, edgeScroller } from './edge-scroller';
import type { GridBlock } from './grid-block';

export interface BlockPointerGround {
  readonly block: () => GridBlock | null;
  readonly columnIds: () => readonly string[];
  /** Whether a finger selects; else it scrolls. */
  readonly touchSelects: () => boolean;
}

/**
 * Selects blocks with the mouse: drag, or Shift and click. Where a finger selects, it drags, or touches the cell at one
 * end and the cell at the other. A block that is dragged past an edge of the grid goes on cell by cell.
 *
 * @returns takes the listeners away.
 */
export function followPointer(host: HTMLElement, ground: BlockPointerGround): () => void {
  const { block, columnIds, touchSelects } = ground;
  const page = host.ownerDocument;
  const listening = new AbortController();
  const { signal } = listening;
  /** Where the pointer went down, and whether it has left that cell. */
  let drag: { readonly from: GridPlace; readonly id: number; isDrawn: boolean } | null = null;

  const placeOf = (target: EventTarget | null): GridPlace | null => {
    const cell = target instanceof Element ? target.closest('.ag-cell[col-id]') : null;
    const row = Number(cell?.closest('[row-index]')?.getAttribute('row-index') ?? NaN);
    const column = columnIds().indexOf(cell?.getAttribute('col-id') ?? '');
    const isEdited = cell?.classList.contains('ag-cell-inline-editing') ?? false;
    const isHere = cell !== null && host.contains(cell);
    return !isHere || Number.isNaN(row) || column === -1 || isEdited ? null : { row, column };
  };
  const begin = (isTouch: boolean): void => {
    if (drag === null || drag.isDrawn) return;
    drag.isDrawn = true;
    // The mouse has begun its block in going down.
    if (isTouch) block()?.goTo(drag.from);
  };
  const scroller = edgeScroller(
    () => cellsBox(host),
    (way: Direction) => block()?.draw(way, 'one'),
  );
  const stop = (): void => {
    drag = null;
    scroller.stop();
  };

  host.addEventListener(
    'pointerdown',
    (event) => {
      const isTouch = event.pointerType === 'touch';
      const isMouse = event.pointerType === 'mouse' && event.button === 0;
      const place = isMouse || (isTouch && touchSelects()) ? placeOf(event.target) : null;
      if (place === null || !event.isPrimary) return;
      if (isMouse && event.shiftKey) {
        event.preventDefault();
        event.stopPropagation();
        block()?.drawTo(place);
        return;
      }
      drag = { from: place, id: event.pointerId, isDrawn: false };
      if (isMouse) block()?.begin(place);
    },
    // Before the grid, which would take Shift and click for a click.
    { signal, capture: true },
  );
  page.addEventListener(
    'pointermove',
    (event) => {
      if (event.pointerId !== drag?.id) return;
      const isTouch = event.pointerType === 'touch';
      if ((event.buttons & 1) === 0) {
        stop();
        return;
      }
      const place = placeOf(page.elementFromPoint(event.clientX, event.clientY));
      const { from } = drag;
      const isElsewhere = place?.row !== from.row || place.column !== from.column;
      if (isElsewhere) begin(isTouch);
      if (place !== null && drag.isDrawn) block()?.drawTo(place);
      if (drag.isDrawn) scroller.follow(event, isTouch ? fingerWidth : 0);
    },
    { signal },
  );
  page.addEventListener(
    'pointerup',
    (event) => {
      if (event.pointerId !== drag?.id) return;
      const { from, isDrawn } = drag;
      stop();
      if (event.pointerType === 'touch' && !isDrawn) touch(block(), from);
    },
    { signal },
  );
  page.addEventListener('pointercancel', stop, { signal });
  return () => {
    stop();
    listening.abort();
  };
}

/** So near to an edge a finger is past it: it may not come further on a small screen. */
const fingerWidth = 28;

/** Where the cells show: the grid under its head, as far as that is in the window. */
function cellsBox(host: HTMLElement): Box | null {
  const viewport = host.querySelector('.ag-grid-viewport');
  if (viewport === null) return null;
  const { left, top, right, bottom } = viewport.getBoundingClientRect();
  const { clientWidth, clientHeight } = host.ownerDocument.documentElement;
  return {
    left: Math.max(0, left),
    top: Math.max(0, top + gridHeadHeight),
    right: Math.min(clientWidth, right),
    bottom: Math.min(clientHeight, bottom),
  };
}

/** The first touch begins a block, the next one draws it. */
function touch(grid: GridBlock | null, place: GridPlace): void {
  const block = grid?.block() ?? null;
  if (block !== null && isOneCell(block)) grid?.drawTo(place);
  else grid?.goTo(place);
}
