import type { Direction } from './cell-block';

const everyMs = 40;

export interface EdgeScroller {
  /** @param margin  CSS pixels within the box that count as past its edge. */
  readonly follow: (
    point: { readonly clientX: number; readonly clientY: number },
    margin: number,
  ) => void;
  readonly stop: () => void;
}

/** Steps on, 25 times a second, for as long as a pointer is past an edge of a box. */
export function edgeScroller(
  boxOf: () => Box | null,
  step: (way: Direction) => void,
): EdgeScroller {
  let ways: readonly Direction[] = [];
  let running: ReturnType<typeof setInterval> | undefined;
  const stop = (): void => {
    clearInterval(running);
    running = undefined;
  };
  return {
    stop,
    follow: ({ clientX, clientY }, margin) => {
      const box = boxOf();
      ways = box === null ? [] : waysPast(box, clientX, clientY, margin);
      if (ways.length === 0) stop();
      else
        running ??= setInterval(() => {
          ways.forEach(step);
        }, everyMs);
    },
  };
}

/** In CSS pixels of the window. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** In which directions a point is past a box's edges. */
export function waysPast(box: Box, x: number, y: number, margin: number): readonly Direction[] {
  const ways: Direction[] = [];
  if (y < box.top + margin) ways.push('up');
  if (y > box.bottom - margin) ways.push('down');
  if (x < box.left + margin) ways.push('left');
  if (x > box.right - margin) ways.push('right');
  return ways;
}
