import { formatFull } from '../model/quantity-format';
import { isVisible, visibleColor } from './line-swatch';
import type { ReachSide } from './reach';
import {
  AXIS_DECADES,
  AXIS_FROM_M,
  AXIS_LABELS,
  AXIS_TO_M,
  METRICS,
  type ReachMetrics,
  widthOf,
  xOf,
} from './reach-axis';
import {
  coordinate,
  type Drawing,
  hatchPath,
  linePath,
  type Palette,
  type Shape,
  svgOf,
  textWidth,
} from './shapes';

export interface ChartPoint {
  readonly distanceM: number;
  readonly value: number;
}

export interface ChartLimit {
  readonly side: ReachSide;
  readonly value: number;
  /** "Eye limit 25.4 W/m², 0.25 s". */
  readonly label: string;
  /** Where the exposure meets the limit; 0 when it never exceeds it. */
  readonly distanceM: number;
}

/** Exposure against distance, with the limits it is compared with. */
export interface ExposureChartModel {
  /** Unit of every value: W/m², J/m², or "" for exposure divided by limit. */
  readonly unit: string;
  /** "all six lines together, mean over 7 mm". */
  readonly title: string;
  /** Ascending in distance. */
  readonly points: readonly ChartPoint[];
  readonly lines?: readonly {
    readonly wavelengthNm: number;
    readonly points: readonly ChartPoint[];
  }[];
  readonly limits: readonly ChartLimit[];
  readonly wallDistanceM?: number | undefined;
}

/** Where the plot stands and how its height reads. */
export interface ChartScale {
  readonly top: number;
  readonly bottom: number;
  readonly fromExponent: number;
  readonly toExponent: number;
}

const COLORS = { eye: 'eye', skin: 'skin', aided: 'aid' } as const;

/** Decades of exposure that always fit: more would flatten what matters, the limits. */
const MAX_DECADES = 12;

/** The scale that shows every limit and as much of the curve as fits. */
export function chartScale(model: ExposureChartModel, metrics: ReachMetrics): ChartScale {
  const inAxis = model.points.filter(
    ({ distanceM, value }) => value > 0 && distanceM >= AXIS_FROM_M && distanceM <= AXIS_TO_M,
  );
  const values = [...inAxis.map((point) => point.value), ...model.limits.map((l) => l.value)];
  const largest = Math.max(...values, Number.MIN_VALUE);
  const leastLimit = Math.min(...model.limits.map((limit) => limit.value), largest);
  const toExponent = Math.ceil(Math.log10(largest * 1.5));
  const least = Math.min(...values, leastLimit);
  // A decade and a half below the lowest limit, further only when the curve ends there.
  const wanted = Math.floor(Math.max(Math.log10(least), Math.log10(leastLimit) - 3));
  const fromExponent = Math.max(Math.min(wanted, toExponent - 3), toExponent - MAX_DECADES);
  const px = metrics.px;
  const height = metrics.size === 'page' ? 252 : metrics.size === 'print' ? 208 : 200;
  return { top: 8 * px, bottom: (8 + height) * px, fromExponent, toExponent };
}

export function yOf(value: number, { top, bottom, fromExponent, toExponent }: ChartScale): number {
  const share = (Math.log10(value) - fromExponent) / (toExponent - fromExponent);
  return bottom - (bottom - top) * share;
}

/** The exposure at a distance, between the points along straight lines on the log-log chart. */
export function exposureAt(model: ExposureChartModel, distanceM: number): number {
  const { points } = model;
  const after = points.findIndex((point) => point.distanceM >= distanceM);
  const right = points[after === -1 ? points.length - 1 : after];
  const left = points[Math.max(0, after === -1 ? points.length - 1 : after - 1)];
  if (!left || !right) return Number.NaN;
  if (left === right || left.value <= 0 || right.value <= 0) return right.value;
  const share = Math.log(distanceM / left.distanceM) / Math.log(right.distanceM / left.distanceM);
  return left.value * (right.value / left.value) ** share;
}

/** The chart as shapes; below a strip of the same metrics its thresholds stand under the sills. */
export function exposureChart(model: ExposureChartModel, metrics: ReachMetrics): Drawing {
  const scale = chartScale(model, metrics);
  const shapes = [
    ...grid(model, metrics, scale),
    ...excess(model, metrics, scale),
    ...wall(model, metrics, scale),
    ...(model.lines ?? []).map((line) => lineCurve(line, metrics, scale)),
    curve(model.points, 'ink', { metrics, scale, width: 2.2 * metrics.px }),
    ...model.limits.flatMap((limit) => limitShapes(limit, metrics, scale)),
    ...limitLabels(model, metrics, scale),
    // On a phone the title would hide the curve; it stands above the chart there.
    ...(metrics.size === 'phone' ? [] : [titleShape(model, metrics, scale)]),
  ];
  return { width: widthOf(metrics), height: scale.bottom + 24 * metrics.px, shapes };
}

/** The chart as an SVG document with literal colors, lengths in mm; it aligns with the strip's. */
export function exposureChartSvg(
  model: ExposureChartModel,
  palette: Palette,
  fontFamily: string,
): string {
  return svgOf(exposureChart(model, METRICS.print), palette, fontFamily);
}

/** The points of the table that stands in for the chart: three a decade. */
export function chartTable(model: ExposureChartModel): readonly ChartPoint[] {
  const steps = [1, 2, 5];
  const distances = Array.from({ length: AXIS_DECADES }, (_, decade) =>
    steps.map((step) => Number(`${step}e${decade - 1}`)),
  ).flat();
  return [...distances, AXIS_TO_M].map((distanceM) => ({
    distanceM,
    value: exposureAt(model, distanceM),
  }));
}

function grid(model: ExposureChartModel, metrics: ReachMetrics, scale: ChartScale): Shape[] {
  const { left, decade, px, axisText } = metrics;
  const right = left + AXIS_DECADES * decade;
  const decades = scale.toExponent - scale.fromExponent;
  const every = decades > 8 ? 3 : decades > 4 ? 2 : 1;
  let lines = '';
  const labels: Shape[] = [];
  for (let exponent = scale.fromExponent; exponent <= scale.toExponent; exponent++) {
    const y = yOf(10 ** exponent, scale);
    lines += linePath(left, y, right, y);
    if ((exponent - scale.fromExponent) % every === 0) {
      labels.push(
        valueLabel(exponent, model.unit, { metrics, y, isTop: exponent === scale.toExponent }),
      );
    }
  }
  for (let index = 0; index <= AXIS_DECADES; index++) {
    const x = left + index * decade;
    lines += linePath(x, scale.top, x, scale.bottom);
    labels.push({
      kind: 'text',
      x,
      y: scale.bottom + 16 * px,
      size: axisText,
      anchor: 'middle',
      parts: [{ text: AXIS_LABELS[index] ?? '', fill: 'ink2' }],
    });
  }
  const axis = linePath(left, scale.bottom, right, scale.bottom);
  return [
    { kind: 'path', d: lines, stroke: 'hair', strokeWidth: px },
    { kind: 'path', d: axis, stroke: 'rule', strokeWidth: px },
    ...labels,
  ];
}

interface LabelPlace {
  readonly metrics: ReachMetrics;
  readonly y: number;
  readonly isTop: boolean;
}

/** Left of the plot when the gutter is wide enough, else inside it above the line. */
function valueLabel(exponent: number, unit: string, { metrics, y, isTop }: LabelPlace): Shape {
  const { left, px, axisText } = metrics;
  const text = unit === '' ? ratioText(exponent) : formatFull(Number(`1e${exponent}`), unit);
  const outside = textWidth(text, axisText) + 6 * px < left;
  const inside = isTop ? y + axisText : y - 3 * px;
  return {
    kind: 'text',
    x: outside ? left - 6 * px : left + 4 * px,
    y: outside ? y + axisText * 0.35 : inside,
    size: axisText,
    anchor: outside ? 'end' : 'start',
    parts: [{ text, fill: 'ink2' }],
    halo: 3 * px,
  };
}

function ratioText(exponent: number): string {
  return exponent === 0 ? 'limit' : `× ${formatFull(Number(`1e${exponent}`), '')}`;
}

/** The hazard: between the curve and the eye's limit, up to its sill, in the eye's own pattern. */
function excess(model: ExposureChartModel, metrics: ReachMetrics, scale: ChartScale): Shape[] {
  const limit = model.limits.find((candidate) => candidate.side === 'eye');
  if (!limit || limit.distanceM <= AXIS_FROM_M) return [];
  const end = xOf(limit.distanceM, metrics);
  const floor = yOf(limit.value, scale);
  const step = metrics.period * 0.75;
  let d = '';
  for (let x = metrics.left; x < end; x += step) {
    const width = Math.min(step, end - x);
    const middle = AXIS_FROM_M * 10 ** ((x + width / 2 - metrics.left) / metrics.decade);
    const top = Math.max(scale.top, yOf(exposureAt(model, middle), scale));
    if (floor - top > 1) d += hatchPath({ x, y: top, width, height: floor - top }, metrics.period);
  }
  return [{ kind: 'path', d, stroke: 'eye', strokeWidth: metrics.px, opacity: 0.32 }];
}

function wall(model: ExposureChartModel, metrics: ReachMetrics, scale: ChartScale): Shape[] {
  if (model.wallDistanceM === undefined) return [];
  const x = xOf(model.wallDistanceM, metrics);
  const half = 1.5 * metrics.px;
  const d =
    linePath(x - half, scale.top, x - half, scale.bottom) +
    linePath(x + half, scale.top, x + half, scale.bottom);
  return [{ kind: 'path', d, stroke: 'ink', strokeWidth: metrics.px }];
}

function lineCurve(
  line: { readonly wavelengthNm: number; readonly points: readonly ChartPoint[] },
  metrics: ReachMetrics,
  scale: ChartScale,
): Shape {
  const color = isVisible(line.wavelengthNm) ? visibleColor(line.wavelengthNm) : 'ink3';
  return curve(line.points, color, { metrics, scale, width: 1.4 * metrics.px });
}

interface CurveStyle {
  readonly metrics: ReachMetrics;
  readonly scale: ChartScale;
  readonly width: number;
}

function curve(
  points: readonly ChartPoint[],
  color: 'ink' | 'ink3' | `#${string}`,
  style: CurveStyle,
): Shape {
  const { metrics, scale, width } = style;
  const inside = points
    .filter(({ distanceM }) => distanceM >= AXIS_FROM_M && distanceM <= AXIS_TO_M)
    .filter(({ value }) => value > 0)
    .map(({ distanceM, value }) => ({ x: xOf(distanceM, metrics), y: yOf(value, scale) }));
  return { kind: 'path', d: clippedPath(inside, scale), stroke: color, strokeWidth: width };
}

/** A polyline cut at the top and bottom of the plot. */
function clippedPath(points: readonly { x: number; y: number }[], scale: ChartScale): string {
  let d = '';
  points.slice(1).forEach((to, index) => {
    const from = points[index];
    if (!from) return;
    const ends = clip(from, to, scale);
    if (!ends) return;
    const [a, b] = ends;
    const start = `${coordinate(a.x)} ${coordinate(a.y)}`;
    d += d.endsWith(start) ? '' : `M${start}`;
    d += `L${coordinate(b.x)} ${coordinate(b.y)}`;
  });
  return d;
}

interface Point {
  readonly x: number;
  readonly y: number;
}

function clip(from: Point, to: Point, { top, bottom }: ChartScale): [Point, Point] | undefined {
  const at = (y: number): Point => ({
    x: from.x + ((to.x - from.x) * (y - from.y)) / (to.y - from.y),
    y,
  });
  const inside = ({ y }: Point) => y >= top && y <= bottom;
  if (inside(from) && inside(to)) return [from, to];
  if ((from.y < top && to.y < top) || (from.y > bottom && to.y > bottom)) return undefined;
  const cut = (point: Point) => (inside(point) ? point : at(point.y < top ? top : bottom));
  return [cut(from), cut(to)];
}

function limitShapes(limit: ChartLimit, metrics: ReachMetrics, scale: ChartScale): Shape[] {
  const { left, decade, px } = metrics;
  const color = COLORS[limit.side];
  const y = yOf(limit.value, scale);
  const right = left + AXIS_DECADES * decade;
  const line: Shape = {
    kind: 'path',
    d: linePath(left, y, right, y),
    stroke: color,
    strokeWidth: 1.5 * px,
    ...dashOf(limit.side, px),
  };
  if (limit.distanceM <= 0 || limit.distanceM > AXIS_TO_M) return [line];
  const x = xOf(limit.distanceM, metrics);
  const jamb = linePath(x, 0, x, scale.bottom);
  if (limit.distanceM < AXIS_FROM_M) return [line];
  return [
    line,
    { kind: 'path', d: jamb, stroke: color, strokeWidth: 1.6 * px },
    { kind: 'circle', x, y, radius: 4.5 * px, fill: 'sheet', stroke: color, strokeWidth: 2 * px },
  ];
}

/** Solid for the eye, dashed for the skin, dotted for viewing aids: told apart without color. */
function dashOf(side: ReachSide, px: number): { dash?: number[]; roundCap?: boolean } {
  if (side === 'eye') return {};
  return side === 'skin' ? { dash: [8 * px, 4 * px] } : { dash: [0, 4 * px], roundCap: true };
}

/** At the right end, above the line; below it when another label would be in the way. */
function limitLabels(model: ExposureChartModel, metrics: ReachMetrics, scale: ChartScale): Shape[] {
  const { left, decade, px, axisText } = metrics;
  const size = Math.max(axisText, 11.5 * px);
  const placed: number[] = [];
  return [...model.limits]
    .sort((a, b) => b.value - a.value)
    .map((limit) => {
      const y = yOf(limit.value, scale);
      const above = y - 5 * px;
      const isFree = placed.every((other) => Math.abs(other - above) > size);
      const at = isFree ? above : y + size + 2 * px;
      placed.push(at);
      return {
        kind: 'text',
        x: left + AXIS_DECADES * decade - 4 * px,
        y: at,
        size,
        anchor: 'end',
        parts: [{ text: limit.label, fill: COLORS[limit.side], bold: true }],
        halo: 3 * px,
      };
    });
}

function titleShape(model: ExposureChartModel, metrics: ReachMetrics, scale: ChartScale): Shape {
  const { left, px, axisText, decade } = metrics;
  const first = model.points.find((point) => point.distanceM >= AXIS_FROM_M);
  const y = first && first.value > 0 ? yOf(first.value, scale) - 7 * px : scale.top + axisText;
  return {
    kind: 'text',
    x: left + Math.max(8 * px, decade * 0.08),
    y: Math.min(Math.max(y, scale.top + axisText), scale.bottom - axisText),
    size: axisText,
    anchor: 'start',
    parts: [{ text: model.title, fill: 'ink', bold: true }],
    halo: 3 * px,
  };
}
