import {
  diamondPath,
  type ExpectedPathData,
  expectedPathLayout,
  figureFormats,
  type FigureKind,
  type GapYear,
  gapPathLayout,
  type IntervalFigure,
  type NumberWriter,
  type StandingChartData,
  standingChartLayout,
} from '../../figures';
import { ChartPainter } from './chart-painter';
import type { PageFlow } from './page-flow';
import * as colour from './print-colours';

/** Width for which layouts are made; the page scales it to its own. */
const layoutWidth = 760;

interface Drawn {
  readonly numbers: NumberWriter;
  readonly kind: FigureKind;
}

/** Where every company stands, as on the screen. */
export function drawStanding(
  flow: PageFlow,
  data: StandingChartData,
  { numbers, kind }: Drawn,
): void {
  const seen = data.intercepts.flatMap(({ estimate, low, high }) => [estimate, low, high]);
  const layout = standingChartLayout(data, layoutWidth, figureFormats(numbers, kind, seen));
  const paint = painter(flow, layout);
  for (const row of layout.rows)
    if (row.isOwn) {
      const height = Math.max(16, layout.rowHeight);
      paint.rect(0, row.y - height / 2, layout.width, height, colour.copperWash);
    }
  for (const tick of layout.ticks) {
    paint.line(tick.position, layout.plot.top, tick.position, layout.plot.bottom, hair);
    paint.text(tick.label, tick.position, layout.plot.top - 10, soft('middle'));
  }
  paint.line(layout.zeroX, layout.plot.top, layout.zeroX, layout.plot.bottom, {
    colour: colour.edge,
    width: 1,
  });
  if (layout.mean !== null) {
    const { x, label } = layout.mean;
    paint.line(x, layout.plot.top - 4, x, layout.plot.bottom + 6, {
      colour: colour.softInk,
      width: 1,
      dash: [2, 3],
    });
    paint.text(label.text, label.x, label.y, { colour: colour.softInk, anchor: label.anchor });
  }
  for (const row of layout.rows) {
    if (row.interval !== null)
      paint.line(
        row.interval.from,
        row.y,
        row.interval.to,
        row.y,
        row.isOwn ? ownInterval : peerInterval,
      );
    if (row.isOwn)
      paint.path(diamondPath(layout.markRadius + 1.5), { fill: colour.copper, at: row });
    else
      paint.circle(row.x, row.y, layout.markRadius, colour.paper, {
        colour: colour.slate,
        width: 1.5,
      });
    if (!row.isLabelled) continue;
    const named = row.isOwn ? ({ face: 'strong', colour: colour.copper } as const) : {};
    paint.text(row.name, layout.nameX, row.y + 4, { size: 13, anchor: 'end', ...named });
    if (layout.valueX !== null)
      paint.text(row.value, layout.valueX, row.y + 4, {
        face: row.isOwn ? 'figures-strong' : 'figures',
        anchor: 'end',
        colour: row.isOwn ? colour.copper : colour.ink,
      });
    if (layout.boundsX !== null)
      paint.text(row.bounds, layout.boundsX, row.y + 4, {
        face: 'figures',
        anchor: 'end',
        colour: colour.softInk,
      });
  }
}

/** Actual and expected value until now, and what the plans make of it. */
export function drawExpectedPath(
  flow: PageFlow,
  data: ExpectedPathData,
  { numbers, kind }: Drawn,
): void {
  const seen = [
    ...data.ownYears.flatMap(({ actual, fitted }) => [actual, fitted]),
    ...data.plans.flatMap(({ years }) => years.map(({ estimate }) => estimate)),
  ];
  const layout = expectedPathLayout(data, layoutWidth, figureFormats(numbers, kind, seen));
  const paint = painter(flow, layout);
  paint.path(layout.bandArea, { fill: colour.plumWash });
  paint.path(layout.intervalArea, {
    fill: layout.bandArea === '' ? colour.plumWash : colour.plumWashStrong,
  });
  for (const tick of layout.yTicks) {
    paint.text(tick.label, layout.plot.left - 10, tick.position + 4, soft('end'));
    paint.line(layout.plot.left, tick.position, layout.plot.right, tick.position, grid);
  }
  for (const year of layout.years)
    paint.text(year.label, year.position, layout.yearsY, soft('middle'));
  if (layout.planX !== null)
    paint.line(layout.planX, 4, layout.planX, layout.plot.bottom + 6, hair);
  if (layout.planLabel !== null)
    paint.text(layout.planLabel.text, layout.planLabel.x, layout.planLabel.y);
  paint.path(layout.fittedPath, { stroke: { colour: colour.ink, width: 1.75, dash: [6, 4] } });
  paint.path(layout.actualPath, { stroke: { colour: colour.copper, width: 2 } });
  paint.path(layout.basePath, { stroke: { colour: colour.softInk, width: 1.75, dash: [1.5, 4] } });
  for (const plan of layout.plans) {
    if (plan.interval !== null) {
      const { x, from, to } = plan.interval;
      paint.line(x, from, x, to, { colour: colour.plum, width: 1.25 });
      paint.path(plan.mark, { fill: colour.plum, at: plan.interval });
    }
    paint.path(plan.path, { stroke: { colour: colour.plum, width: 2, dash: [3, 3] } });
    for (const point of plan.points) paint.path(plan.mark, { fill: colour.plum, at: point });
  }
  for (const label of layout.seriesLabels)
    paint.text(label.text, label.x, label.y, {
      anchor: label.anchor,
      ...(label.series === 'actual' ? ({ face: 'strong', colour: colour.copper } as const) : {}),
    });
  for (const label of layout.endLabels) {
    paint.path(label.leader, { stroke: { colour: colour.edge, width: 0.75 } });
    const style =
      label.kind === 'plan'
        ? ({ face: 'strong', colour: colour.plum } as const)
        : { colour: colour.softInk };
    paint.text(label.name, label.x, label.y, style);
    paint.text(label.value, label.valueX, label.valueY, style);
  }
}

/** The gap to the peers, year by year, with the standing and its interval. */
export function drawGapPath(
  flow: PageFlow,
  years: readonly GapYear[],
  standing: IntervalFigure | null,
  { numbers, kind }: Drawn,
): void {
  const seen = [
    ...years.map(({ gap }) => gap),
    standing?.estimate ?? null,
    standing?.low ?? null,
    standing?.high ?? null,
  ];
  const layout = gapPathLayout(years, standing, layoutWidth, figureFormats(numbers, kind, seen));
  const paint = painter(flow, layout);
  const { left, right } = layout.plot;
  const band = layout.standing?.band;
  if (band) paint.rect(left, band.top, right - left, band.bottom - band.top, '#eceae4');
  for (const tick of layout.yTicks) {
    paint.text(tick.label, left - 10, tick.position + 4, soft('end'));
    paint.line(
      left,
      tick.position,
      right,
      tick.position,
      tick.value === 0 ? { colour: colour.edge, width: 1 } : grid,
    );
  }
  for (const year of layout.years)
    paint.text(year.label, year.position, layout.height - 6, soft('middle'));
  if (layout.standing !== null) {
    const { y } = layout.standing;
    paint.line(left, y, right, y, { colour: colour.ink, width: 1.75, dash: [6, 4] });
  }
  paint.path(layout.path, { stroke: { colour: colour.copper, width: 2 } });
  for (const point of layout.points) paint.path(diamondPath(4), { fill: colour.copper, at: point });
  if (layout.standing !== null) paint.rimmed(layout.standing.label.text, layout.standing.label);
}

const hair = { colour: colour.hairline, width: 1 };
const grid = { colour: colour.hairline, width: 1, dash: [1, 4] } as const;
const ownInterval = { colour: colour.copper, width: 2.5 };
const peerInterval = { colour: colour.slate, width: 1.25 };

function soft(anchor: 'middle' | 'end') {
  return { face: 'figures', colour: colour.softInk, anchor } as const;
}

/** A painter at the place of the flow, which goes on under the chart. */
function painter(
  flow: PageFlow,
  layout: { readonly width: number; readonly height: number },
): ChartPainter {
  const height = (layout.height * flow.width) / layout.width;
  flow.need(height + 8);
  const paint = new ChartPainter(flow, flow.left, flow.y, {
    layoutWidth: layout.width,
    width: flow.width,
  });
  flow.y += height + 8;
  return paint;
}
