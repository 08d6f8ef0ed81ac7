import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedTick,
  type Plot,
  type Stretch,
  hasBounds,
} from './figure-types';
import { clippedWords, wrappedWords } from './text-width';
import { placedTicks, snugScale } from './value-axis';

/** One input at an end of its spread: what is expected there, or why nothing is. */
export interface SensitivityPoint {
  /** The input's value there, as it is written: `1,200`. */
  readonly at: string;
  readonly expected: IntervalFigure | null;
  readonly reason?: string;
  /** In words, where the plan would leave what is familiar; else empty. */
  readonly remark: string;
}

export interface SensitivityRow {
  readonly name: string;
  readonly low: SensitivityPoint;
  readonly high: SensitivityPoint;
}

export interface PlacedSensitivityEnd {
  readonly end: 'low' | 'high';
  /** `at 20: 2,540 (2,400 to 2,700)`, with the remark; or why there is none. */
  readonly words: string;
  readonly lines: readonly { readonly text: string; readonly y: number }[];
  /** From the planned value to the end; null where there is none. */
  readonly bar: { readonly x: number; readonly width: number } | null;
  readonly x: number | null;
  readonly interval: Stretch | null;
  readonly intervalY: number;
  /** Of the end's lines of words. */
  readonly top: number;
  readonly height: number;
}

export interface PlacedSensitivityRow {
  readonly name: string;
  readonly label: string;
  readonly textY: number;
  readonly barY: number;
  readonly ends: readonly PlacedSensitivityEnd[];
}

export interface SensitivityLayout {
  readonly width: number;
  readonly height: number;
  readonly barHeight: number;
  readonly plot: Plot;
  readonly ticks: readonly PlacedTick[];
  /** Where the plan as it is stands. */
  readonly plannedX: number;
  /** Stretches of the upright lines, top to bottom: broken where words would cross them. */
  readonly upright: readonly Stretch[];
  readonly rows: readonly PlacedSensitivityRow[];
}

const top = 26;
const barHeight = 12;
const lineHeight = 16;
const intervalGap = 6;

/**
 * How far an expected value moves when one input goes over a spread: a bar from the planned value to either end, the
 * interval of each end beneath it, and under them what the ends come to in words. In the order given.
 *
 * @param planned  the expected value of the plan as it is.
 */
export function sensitivityLayout(
  rows: readonly SensitivityRow[],
  planned: number,
  width: number,
  formats: FigureFormats,
): SensitivityLayout {
  const edges = { left: 8, right: width - 8 };
  const seen = rows.flatMap(({ low, high }) =>
    [low, high].flatMap(({ expected }) =>
      expected === null ? [] : [expected.estimate, expected.low, expected.high],
    ),
  );
  const scale = snugScale([planned, ...seen], [edges.left, edges.right]);
  const plannedX = scale(planned);
  let rowTop = top;
  const placed = rows.map((row): PlacedSensitivityRow => {
    const textY = rowTop + 16;
    const barY = rowTop + 24;
    let endTop = barY + barHeight + 2 * intervalGap + 4;
    const ends = (['low', 'high'] as const).map((end, place): PlacedSensitivityEnd => {
      const point = row[end];
      const { expected } = point;
      const words = wordsOf(point, formats);
      const lines = wrappedWords(words, width - 24).map((text, line) => ({
        text,
        y: endTop + 12 + line * lineHeight,
      }));
      const x = expected === null ? null : scale(expected.estimate);
      const placedEnd: PlacedSensitivityEnd = {
        end,
        words,
        lines,
        bar: x === null ? null : { x: Math.min(x, plannedX), width: Math.abs(x - plannedX) },
        x,
        interval:
          expected !== null && hasBounds(expected)
            ? { from: scale(expected.low), to: scale(expected.high) }
            : null,
        intervalY: barY + barHeight + (place + 1) * intervalGap,
        top: endTop,
        height: lines.length * lineHeight,
      };
      endTop += placedEnd.height;
      return placedEnd;
    });
    rowTop = endTop + 10;
    return { name: row.name, label: clippedWords(row.name, width, 13), textY, barY, ends };
  });
  const plot: Plot = { ...edges, top, bottom: rowTop };
  return {
    width,
    height: rowTop,
    barHeight,
    plot,
    ticks: placedTicks(scale, Math.max(2, Math.round(width / 110)), formats.tick),
    plannedX,
    upright: placed.map(({ barY }) => ({
      from: barY - 4,
      to: barY + barHeight + 2 * intervalGap + 4,
    })),
    rows: placed,
  };
}

function wordsOf({ at, expected, reason, remark }: SensitivityPoint, formats: FigureFormats) {
  const figures =
    expected === null
      ? (reason ?? 'no expected value')
      : `${formats.value(expected.estimate)} (${formats.bounds(expected)})`;
  return `at ${at}: ${figures}${remark === '' ? '' : `, ${remark}`}`;
}
