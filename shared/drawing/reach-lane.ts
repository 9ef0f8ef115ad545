import { formatQuantity } from '../model/quantity-format';
import { isVisible, visibleColor } from './line-swatch';
import { isAidShown, type ReachDistances, type ReachSide } from './reach';
import { AXIS_TO_M, type ReachMetrics, widthOf, xOf } from './reach-axis';
import { type Box, coordinate, hatchPath, linePath, type Shape, textWidth } from './shapes';

export interface Lane {
  readonly side: ReachSide;
  readonly color: 'skin' | 'eye' | 'aid';
  readonly word: string;
  readonly y: number;
  readonly height: number;
  readonly distanceM: number;
  readonly x: number;
  readonly beyondAxis: boolean;
}

const MAX_TICKS = 12;

const FADED = 0.4;

export function lanesOf(reach: ReachDistances, metrics: ReachMetrics): Lane[] {
  const { lanes, base } = metrics;
  const aidedY = base - lanes.aided;
  const eyeY = aidedY - lanes.eye;
  const skinY = eyeY - lanes.skin;
  // prettier-ignore
  const all = [
    { side: 'aided', color: 'aid', word: 'Aided', y: aidedY, height: lanes.aided, distanceM: isAidShown(reach) ? (reach.aidedDistanceM ?? 0) : 0 },
    { side: 'eye', color: 'eye', word: 'Eye', y: eyeY, height: lanes.eye, distanceM: reach.eyeDistanceM },
    { side: 'skin', color: 'skin', word: 'Skin', y: skinY, height: lanes.skin, distanceM: reach.skinDistanceM },
  ] as const;
  return all
    .filter(({ distanceM }) => distanceM > 0)
    .map((lane) => ({
      ...lane,
      x: xOf(lane.distanceM, metrics),
      beyondAxis: lane.distanceM > AXIS_TO_M,
    }));
}

export function laneTop({ base, lanes }: ReachMetrics): number {
  return base - lanes.skin - lanes.eye - lanes.aided;
}

export function laneShapes(lane: Lane, metrics: ReachMetrics, wallX: number | null): Shape[] {
  const { left } = metrics;
  const near = wallX === null || wallX >= lane.x ? lane.x : Math.max(wallX, left);
  return [
    ...laneBox(lane, { from: left, to: near, opacity: 1 }, metrics),
    ...(near < lane.x ? laneBox(lane, { from: near, to: lane.x, opacity: FADED }, metrics) : []),
  ];
}

interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly opacity: number;
}

function laneBox(lane: Lane, { from, to, opacity }: Stretch, metrics: ReachMetrics): Shape[] {
  const { y, height, color } = lane;
  const box = { x: coordinate(from), y, width: coordinate(to - from), height };
  if (box.width <= 0) return [];
  const edge = linePath(from, y + metrics.px / 2, to, y + metrics.px / 2);
  return [
    { kind: 'rect', ...box, fill: 'sheet' },
    ...lanePattern(lane, box, metrics).map((shape) => ({
      ...shape,
      opacity: (shape.opacity ?? 1) * opacity,
    })),
    { kind: 'path', d: edge, stroke: color, strokeWidth: metrics.px, opacity },
  ];
}

type PaintedShape = Exclude<Shape, { kind: 'text' }>;

function lanePattern({ side }: Lane, box: Box, metrics: ReachMetrics): PaintedShape[] {
  const { period, dotPeriod, px, size } = metrics;
  if (side === 'skin') {
    const solid: PaintedShape = { kind: 'rect', ...box, fill: 'skin' };
    if (size === 'row') return [solid];
    const d = gridPath(box, period / 2);
    return [solid, { kind: 'path', d, stroke: 'sheet', strokeWidth: px, opacity: 0.38 }];
  }
  if (side === 'eye') {
    const strokeWidth = size === 'row' ? 1.7 : size === 'page' ? 2.6 : 2.1 * px;
    return [
      { kind: 'rect', ...box, fill: 'eye', opacity: 0.16 },
      { kind: 'path', d: hatchPath(box, period), stroke: 'eye', strokeWidth },
    ];
  }
  const radius = size === 'row' ? 1 : 0.17 * dotPeriod;
  return [
    { kind: 'rect', ...box, fill: 'aid', opacity: 0.07 },
    {
      kind: 'path',
      d: dotRows(box, dotPeriod),
      stroke: 'aid',
      strokeWidth: 2 * radius,
      // A dash of no length with a round cap is a dot.
      dash: [0, dotPeriod],
      roundCap: true,
    },
  ];
}

function gridPath(box: Box, step: number) {
  let d = '';
  for (let x = Math.ceil(box.x / step) * step; x < box.x + box.width; x += step) {
    d += linePath(x, box.y, x, box.y + box.height);
  }
  for (let y = box.y + step; y < box.y + box.height - 0.1; y += step) {
    d += linePath(box.x, y, box.x + box.width, y);
  }
  return d;
}

function dotRows(box: Box, period: number) {
  const rows = Math.max(1, Math.floor(box.height / period));
  const gap = box.height / rows;
  const from = Math.ceil(box.x / period) * period;
  return Array.from({ length: rows }, (_, row) => box.y + gap * (row + 0.5))
    .map((y) => (from < box.x + box.width ? linePath(from, y, box.x + box.width, y) : ''))
    .join('');
}

export function lineTicks(
  reach: ReachDistances,
  lanes: readonly Lane[],
  metrics: ReachMetrics,
): Shape[] {
  const eye = lanes.find((lane) => lane.side === 'eye');
  const lines = (reach.lines ?? []).filter((line) => line.eyeDistanceM > 0);
  if (!eye || lines.length < 2) return [];
  const isRow = metrics.size === 'row';
  const [ground, mark] = isRow ? [2.4, 1.2] : [5 * metrics.px, 2.6 * metrics.px];
  return lines.slice(0, MAX_TICKS).flatMap((line): Shape[] => {
    const x = xOf(line.eyeDistanceM, metrics);
    const d = linePath(x, eye.y + metrics.px, x, eye.y + eye.height);
    const color = isVisible(line.wavelengthNm) ? visibleColor(line.wavelengthNm) : 'ink';
    return [
      { kind: 'path', d, stroke: 'sheet', strokeWidth: ground },
      { kind: 'path', d, stroke: color, strokeWidth: mark },
    ];
  });
}

export function sillShapes(lane: Lane, metrics: ReachMetrics): Shape[] {
  const { base: y, px, size } = metrics;
  const isRow = size === 'row';
  const top = lane.y - (isRow ? 2 : 5 * px);
  const jamb: Shape = {
    kind: 'path',
    d: linePath(lane.x, top, lane.x, y),
    stroke: lane.color,
    strokeWidth: isRow ? 1.6 : 2 * px,
  };
  const foot = footPath(lane.x, metrics);
  if (lane.side === 'aided') {
    return [jamb, { kind: 'path', d: foot.d, fill: 'sheet', stroke: 'aid', strokeWidth: 1.2 * px }];
  }
  const shapes: Shape[] = [jamb, { kind: 'path', d: foot.d, fill: lane.color }];
  if (lane.side === 'eye') return shapes;
  const under = foot.bottom + (isRow ? 0.6 : 2.5 * px);
  const second = linePath(lane.x - foot.half, under, lane.x + foot.half, under);
  const strokeWidth = isRow ? 0.8 : 1.6 * px;
  return [...shapes, { kind: 'path', d: second, stroke: 'skin', strokeWidth }];
}

export function footPath(x: number, { base: y, foot, size }: ReachMetrics) {
  const isRow = size === 'row';
  const top = isRow ? 2.5 : 0.7 * foot;
  const half = isRow ? 4 : 1.15 * foot;
  const bottom = y + foot;
  const d = polygon([
    [x - top, y],
    [x + top, y],
    [x + half, bottom],
    [x - half, bottom],
  ]);
  return { d, half, bottom };
}

export function chevron(lane: Lane, metrics: ReachMetrics): Shape {
  const { px, size } = metrics;
  const depth = size === 'row' ? 3.5 : 7 * px;
  const x = lane.x + 2 * px;
  const middle = lane.y + lane.height / 2;
  const end = lane.y + lane.height - px;
  const d = `M${coordinate(x)} ${coordinate(lane.y + px)}L${coordinate(x + depth)} ${coordinate(middle)}L${coordinate(x)} ${coordinate(end)}`;
  return { kind: 'path', d, stroke: lane.color, strokeWidth: size === 'row' ? 1.4 : 2 * px };
}

/** Name and distance where the lane has ended; left of the jamb when there is no room. */
export function words(lane: Lane, metrics: ReachMetrics, wallX: number | null): Shape[] {
  const { text: size, px } = metrics;
  if (size === 0) return [];
  const value = lane.beyondAxis ? '> 100\u202fkm' : formatQuantity(lane.distanceM, 'm', 'up').text;
  const width = textWidth(`${lane.word} ${value}`, size);
  const fits = !lane.beyondAxis && lane.x + 6 * px + width <= widthOf(metrics);
  const x = fits ? lane.x + 6 * px : lane.x - 6 * px;
  const left = fits ? x : x - width;
  const box = { x: left - 2 * px, y: lane.y + 2 * px, width: width + 4 * px };
  const ground: Shape = { kind: 'rect', ...box, height: lane.height - 3 * px, fill: 'sheet' };
  const label: Shape = {
    kind: 'text',
    x,
    y: lane.y + lane.height / 2 + size * 0.34,
    size,
    anchor: fits ? 'start' : 'end',
    parts: [
      { text: `${lane.word} `, fill: lane.color, bold: true },
      { text: value, fill: 'ink', bold: true },
    ],
    halo: 3 * px,
  };
  const isCrossed = wallX !== null && wallX > box.x && wallX < box.x + box.width;
  return fits && !isCrossed ? [label] : [ground, label];
}

export function polygon(points: readonly (readonly number[])[]): string {
  const corners = points.map(([x = 0, y = 0]) => `${coordinate(x)} ${coordinate(y)}`);
  return `M${corners.join('L')}Z`;
}
