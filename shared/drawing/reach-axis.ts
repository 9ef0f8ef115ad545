/** The axis of every strip and chart: six decades from 0.1 m to 100 km, never zoomed. */
export const AXIS_FROM_M = 0.1;
export const AXIS_TO_M = 100_000;
export const AXIS_DECADES = 6;

export const AXIS_LABELS = ['0.1 m', '1 m', '10 m', '100 m', '1 km', '10 km', '100 km'].map(
  (label) => label.replace(' ', '\u202f'),
);

/** What decides a drawing's scale; lengths in its own unit (px, or mm in print). */
export interface ReachMetrics {
  readonly size: 'row' | 'card' | 'page' | 'phone' | 'print';
  readonly height: number;
  /** Length of a decade. */
  readonly decade: number;
  readonly left: number;
  readonly right: number;
  /** Height of the base line. */
  readonly base: number;
  readonly lanes: { readonly skin: number; readonly eye: number; readonly aided: number };
  readonly foot: number;
  readonly period: number;
  readonly dotPeriod: number;
  /** Size of the words on the treads; 0 draws none. */
  readonly text: number;
  readonly axisText: number;
  /** One px on a screen, and what stands for it on paper. */
  readonly px: number;
}

// prettier-ignore
export const METRICS = {
  row:   { size: 'row',   height: 20,  decade: 37,  left: 11, right: 11, base: 16, lanes: { skin: 4,  eye: 6,  aided: 3 },  foot: 3,   period: 4,   dotPeriod: 4,   text: 0,    axisText: 0,    px: 1 },
  card:  { size: 'card',  height: 88,  decade: 66,  left: 18, right: 64, base: 62, lanes: { skin: 14, eye: 18, aided: 14 }, foot: 5,   period: 6,   dotPeriod: 4.8, text: 12.5, axisText: 11.5, px: 1 },
  page:  { size: 'page',  height: 122, decade: 122, left: 26, right: 34, base: 88, lanes: { skin: 20, eye: 28, aided: 20 }, foot: 7,   period: 8,   dotPeriod: 6.4, text: 14.5, axisText: 12.5, px: 1 },
  phone: { size: 'phone', height: 92,  decade: 53,  left: 18, right: 18, base: 65, lanes: { skin: 15, eye: 20, aided: 14 }, foot: 5,   period: 6,   dotPeriod: 4.8, text: 0,    axisText: 11.5, px: 1 },
  print: { size: 'print', height: 24,  decade: 20,  left: 5,  right: 16, base: 16, lanes: { skin: 4,  eye: 5,  aided: 4 },  foot: 1.4, period: 1.6, dotPeriod: 1.3, text: 2.82, axisText: 2.82, px: 0.25 },
} as const satisfies Record<string, ReachMetrics>;

const LEAST_PAGE_DECADE = 84;

/**
 * The largest form that fits a panel: page, card, or phone. A chart below a strip asks with the
 * same width and gutter, and so shares its axis.
 */
export function metricsForWidth(width: number, gutter?: number): ReachMetrics {
  const page = withGutter(METRICS.page, gutter);
  const pageDecade = (width - page.left - page.right) / AXIS_DECADES;
  if (pageDecade >= LEAST_PAGE_DECADE) return { ...page, decade: pageDecade };
  if (width >= widthOf(METRICS.card)) return METRICS.card;
  const { left, right, decade } = METRICS.phone;
  const fitting = (width - left - right) / AXIS_DECADES;
  return { ...METRICS.phone, decade: Math.max(20, Math.min(decade, fitting)) };
}

/** The same strip when a chart below carries the axis. */
export function withoutAxis(metrics: ReachMetrics): ReachMetrics {
  return { ...metrics, axisText: 0, height: metrics.base + metrics.foot };
}

export function widthOf(metrics: ReachMetrics): number {
  return metrics.left + AXIS_DECADES * metrics.decade + metrics.right;
}

/** Where a distance stands: clamped to the axis. */
export function xOf(distanceM: number, metrics: ReachMetrics): number {
  const decades = Math.log10(distanceM / AXIS_FROM_M);
  return metrics.left + metrics.decade * Math.min(Math.max(decades, 0), AXIS_DECADES);
}

/** The distance at a place, inside the axis. */
export function distanceAt(x: number, metrics: ReachMetrics): number {
  const decades = (x - metrics.left) / metrics.decade;
  return AXIS_FROM_M * 10 ** Math.min(Math.max(decades, 0), AXIS_DECADES);
}

function withGutter(metrics: ReachMetrics, gutter: number | undefined): ReachMetrics {
  return gutter === undefined ? metrics : { ...metrics, left: gutter };
}
