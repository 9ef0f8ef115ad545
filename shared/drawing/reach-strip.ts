import { formatQuantity } from '../model/quantity-format';
import type { Reach, ReachDistances, ReachSide } from './reach';
import { AXIS_DECADES, AXIS_LABELS, METRICS, type ReachMetrics, widthOf, xOf } from './reach-axis';
import {
  chevron,
  footPath,
  laneShapes,
  lanesOf,
  laneTop,
  lineTicks,
  polygon,
  sillShapes,
  words,
} from './reach-lane';
import {
  type Drawing,
  hatchPath,
  linePath,
  type Palette,
  type Shape,
  svgOf,
  textWidth,
} from './shapes';

/** A threshold that can be pointed at. */
export interface Sill {
  readonly side: ReachSide;
  readonly x: number;
  readonly distanceM: number;
}

export interface ReachStripDrawing extends Drawing {
  readonly sills: readonly Sill[];
}

/** The strip as shapes, in the order in which they are painted. */
export function reachStrip(reach: Reach, metrics: ReachMetrics): ReachStripDrawing {
  const width = widthOf(metrics);
  const { height } = metrics;
  const still = [...axis(metrics), aperture(metrics)];
  if (reach === 'loading') return { width, height, sills: [], shapes: [base(metrics), ...still] };
  if (reach === 'unknown') {
    return { width, height, sills: [], shapes: [...unknown(metrics), ...still] };
  }
  const lanes = lanesOf(reach, metrics);
  const wall = wallOf(reach, metrics, lanes.length === 0);
  const sills = lanes.filter((lane) => !lane.beyondAxis);
  const shapes = [
    base(metrics),
    ...axis(metrics),
    ...lanes.flatMap((lane) => laneShapes(lane, metrics, wall.x)),
    ...lineTicks(reach, lanes, metrics),
    ...sealedMark(reach, metrics),
    // The eye's sill last: at equal distances it is the one to be seen.
    ...['aided', 'skin', 'eye'].flatMap((side) =>
      sills.filter((lane) => lane.side === side).flatMap((lane) => sillShapes(lane, metrics)),
    ),
    ...lanes.filter((lane) => lane.beyondAxis).map((lane) => chevron(lane, metrics)),
    aperture(metrics),
    ...wall.shapes,
    ...uncertainty(reach, metrics),
    ...(lanes.length === 0 ? closedSill(metrics) : []),
    ...lanes.flatMap((lane) => words(lane, metrics, wall.x)),
  ];
  return {
    width,
    height,
    shapes,
    sills: sills.map(({ side, x, distanceM }) => ({ side, x, distanceM })),
  };
}

/** The strip as an SVG document with literal colors, lengths in mm. */
export function reachStripSvg(reach: Reach, palette: Palette, fontFamily: string): string {
  return svgOf(reachStrip(reach, METRICS.print), palette, fontFamily);
}

function base(metrics: ReachMetrics): Shape {
  const { left, decade, base: y, px } = metrics;
  const d = linePath(left, y, left + AXIS_DECADES * decade, y);
  return { kind: 'path', d, stroke: 'rule', strokeWidth: px };
}

function axis(metrics: ReachMetrics): Shape[] {
  const { left, decade, base: y, px, size, axisText, height } = metrics;
  const decades = Array.from({ length: AXIS_DECADES + 1 }, (_, index) => left + index * decade);
  const isRow = size === 'row';
  const major = decades
    .map((x, index) => {
      const length = isRow ? (index === 1 || index === 4 ? 4 : 2) : 6 * px;
      return linePath(x, y, x, y + length);
    })
    .join('');
  const minor =
    size === 'page'
      ? decades
          .slice(0, -1)
          .flatMap((x) => [2, 3, 4, 5, 6, 7, 8, 9].map((n) => x + decade * Math.log10(n)))
          .map((x) => linePath(x, y, x, y + 3 * px))
          .join('')
      : '';
  const ticks: Shape = { kind: 'path', d: major + minor, stroke: 'rule', strokeWidth: px };
  if (axisText === 0) return [ticks];
  const labels = decades.map((x, index): Shape => ({
    kind: 'text',
    x,
    y: height - axisText * 0.45,
    size: axisText,
    anchor: 'middle',
    parts: [{ text: AXIS_LABELS[index] ?? '', fill: 'ink2' }],
  }));
  return [ticks, ...labels];
}

function aperture(metrics: ReachMetrics): Shape {
  const { left, base: y, px, size } = metrics;
  const isRow = size === 'row';
  const width = isRow ? 6 : 11 * px;
  const height = y - laneTop(metrics) + (isRow ? 2 : 8 * px);
  const right = left - 2 * px;
  const top = y + px - height;
  const slit = { from: top + 0.36 * height, to: top + 0.64 * height, x: right - 0.45 * width };
  const points = [
    [right - width, top],
    [right, top],
    [right, slit.from],
    [slit.x, slit.from],
    [slit.x, slit.to],
    [right, slit.to],
    [right, top + height],
    [right - width, top + height],
  ];
  return { kind: 'path', d: polygon(points), fill: 'ink' };
}

function sealedMark(reach: ReachDistances, metrics: ReachMetrics): Shape[] {
  const { sealedEyeDistanceM } = reach;
  if (!sealedEyeDistanceM) return [];
  const { base: y, lanes, px, size } = metrics;
  const x = xOf(sealedEyeDistanceM, metrics);
  const top = y - lanes.aided - lanes.eye - (size === 'row' ? 4 : 9 * px);
  return [
    {
      kind: 'path',
      d: linePath(x, top, x, y),
      stroke: 'ink',
      strokeWidth: 1.4 * px,
      dash: [3 * px, 2 * px],
    },
  ];
}

const NOWHERE = 'nowhere above the limit';

/** Nowhere above the limit: a closed sill at the aperture, and words. */
function closedSill(metrics: ReachMetrics): Shape[] {
  const { base: y, px, size, left } = metrics;
  const x = left + footPath(0, metrics).half + 2 * px;
  const top = y - (y - laneTop(metrics)) * 0.5;
  const isRow = size === 'row';
  const text = Math.max(13 * px, metrics.text);
  const [textX, textY] = [x + 10 * px, y - (isRow ? 3 : 8 * px)];
  const ground: Shape = {
    kind: 'rect',
    x: textX - 3 * px,
    y: textY - text,
    width: textWidth(NOWHERE, text) + 6 * px,
    height: text + 3 * px,
    fill: 'sheet',
  };
  return [
    { kind: 'path', d: linePath(x, top, x, y), stroke: 'spruce', strokeWidth: 2 * px },
    { kind: 'path', d: footPath(x, metrics).d, fill: 'spruce' },
    ...(isRow ? [] : [ground]),
    {
      kind: 'text',
      x: textX,
      y: textY,
      size: text,
      anchor: 'start',
      parts: [{ text: NOWHERE, fill: 'ink2' }],
    },
  ];
}

function wallOf(reach: ReachDistances, metrics: ReachMetrics, isZero: boolean) {
  const { wallDistanceM } = reach;
  const isRow = metrics.size === 'row';
  if (wallDistanceM === undefined || (isZero && isRow)) return { x: null, shapes: [] };
  const { base: y, px } = metrics;
  const x = xOf(wallDistanceM, metrics);
  const top = laneTop(metrics) - (isRow ? 2 : 8 * px);
  const half = 1.5 * px;
  const sides = linePath(x - half, top, x - half, y) + linePath(x + half, top, x + half, y);
  const box = { x: x - half, y: top, width: 2 * half, height: y - top };
  const shapes: Shape[] = [
    { kind: 'rect', ...box, fill: 'sheet' },
    { kind: 'path', d: sides, stroke: 'ink', strokeWidth: isRow ? 1 : 1.2 * px },
  ];
  if (!isRow) {
    shapes.push({
      kind: 'path',
      d: hatchPath(box, 2.5 * px),
      stroke: 'ink',
      strokeWidth: 0.8 * px,
    });
  }
  if (metrics.text > 0) {
    const text = `wall ${formatQuantity(wallDistanceM, 'm', 'nearest').text}`;
    const fitsLeft = x - 5 * px - textWidth(text, metrics.text) > 0;
    shapes.push({
      kind: 'text',
      x: fitsLeft ? x - 5 * px : x + 5 * px,
      y: laneTop(metrics) - 3 * px,
      size: 0.88 * metrics.text,
      anchor: fitsLeft ? 'end' : 'start',
      parts: [{ text, fill: 'ink2' }],
      halo: 3 * px,
    });
  }
  return { x, shapes };
}

function uncertainty(reach: ReachDistances, metrics: ReachMetrics): Shape[] {
  if (!reach.eyeBandM || metrics.size === 'row') return [];
  const { base: y, foot, px } = metrics;
  const [low, high] = reach.eyeBandM.map((distanceM) => xOf(distanceM, metrics)) as [
    number,
    number,
  ];
  const at = y + foot + 5 * px;
  const ends = [low, high].map((x) => linePath(x, at - 2 * px, x, at + 2 * px)).join('');
  return [
    { kind: 'path', d: linePath(low, at, high, at) + ends, stroke: 'ink', strokeWidth: 1.2 * px },
  ];
}

function unknown(metrics: ReachMetrics): Shape[] {
  const { left, decade, base: y, px, size } = metrics;
  const dashed: Shape = {
    kind: 'path',
    d: linePath(left, y, left + AXIS_DECADES * decade, y),
    stroke: 'ink3',
    strokeWidth: px,
    dash: [3 * px, 3 * px],
  };
  const marks = Array.from({ length: AXIS_DECADES }, (_, index): Shape => ({
    kind: 'text',
    x: left + (index + 0.5) * decade,
    y: y - (size === 'row' ? 3 : 8 * px),
    size: size === 'row' ? 11.5 : 13 * px,
    anchor: 'middle',
    parts: [{ text: '?', fill: 'ink3' }],
  }));
  return [dashed, ...marks];
}

/** A piece of one lane, for a legend. */
export function laneSample(side: ReachSide, metrics: ReachMetrics): Drawing {
  const lane = lanesOf(
    { eyeDistanceM: 1, skinDistanceM: 1, aidedDistanceM: 2 },
    { ...metrics, left: 0 },
  ).find((candidate) => candidate.side === side);
  const height = lane?.height ?? 0;
  const width = 22;
  const shapes = lane ? laneShapes({ ...lane, x: width, y: 0 }, { ...metrics, left: 0 }, null) : [];
  return { width, height, shapes };
}

/** A piece of wall, for a legend. */
export function wallSample(): Drawing {
  const d = linePath(1.5, 0, 1.5, 12) + linePath(4.5, 0, 4.5, 12);
  return { width: 6, height: 12, shapes: [{ kind: 'path', d, stroke: 'ink', strokeWidth: 1 }] };
}
