import type { Direction } from './cell-block';

/** What a key asks of the block of cells that is selected. */
export type BlockCommand =
  | { readonly kind: 'draw'; readonly direction: Direction; readonly far: 'one' | 'all' }
  | { readonly kind: 'select-figures' }
  | { readonly kind: 'collapse' }
  | { readonly kind: 'empty' };

const directions: Readonly<Partial<Record<string, Direction>>> = {
  ArrowUp: 'up',
  ArrowDown: 'down',
  ArrowLeft: 'left',
  ArrowRight: 'right',
};

/** Undefined for a key that is the grid's own. */
export function blockCommand(
  event: Pick<KeyboardEvent, 'key' | 'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey'>,
): BlockCommand | undefined {
  const { key, shiftKey, altKey } = event;
  const hasControl = event.ctrlKey || event.metaKey;
  const direction = directions[key];
  if (altKey) return undefined;
  if (direction !== undefined && shiftKey)
    return { kind: 'draw', direction, far: hasControl ? 'all' : 'one' };
  if (hasControl && !shiftKey && key.toLowerCase() === 'a') return { kind: 'select-figures' };
  if (hasControl || shiftKey) return undefined;
  if (key === 'Escape') return { kind: 'collapse' };
  if (key === 'Delete' || key === 'Backspace') return { kind: 'empty' };
  return undefined;
}
