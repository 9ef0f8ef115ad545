import type { ChartLimit, ChartPoint, ExposureChartModel } from '../drawing/exposure-chart';
import { AXIS_DECADES, AXIS_FROM_M, AXIS_TO_M } from '../drawing/reach-axis';
import { exposureCurve, type CurveExposure, type CurvePoint } from '../hazard/exposure-curve';
import type { Side } from '../hazard/result';
import { durationWords, ON_AXIS_WORDS } from '../text/hazard-words';
import { formatQuantity } from './quantity-format';
import { haveOneLimit, limitFigure, type LimitFigure, type ResultView } from './result-view';
import { ruleSetById } from '../hazard/rule-sets';

const POINTS_PER_DECADE = 24;

/** A skin limit is drawn only where the eye's curve meets it: apertures may differ near the exit. */
const MEETS_WITHIN = 0.03;

/**
 * The chart of a result: exposure against distance where one limit holds for every line, exposure
 * divided by limit where they differ or depend on distance.
 */
export function resultChart(
  view: ResultView,
  wallDistanceM: number | undefined,
): ExposureChartModel {
  const curve = exposureCurve(view.case, distancesOf(view));
  const limit = commonLimit(view);
  const model = limit ? exposureModel(view, curve, limit) : ratioModel(view, curve);
  return wallDistanceM === undefined ? model : { ...model, wallDistanceM };
}

/** Even steps on the axis, and the thresholds themselves, so that the curve meets them exactly. */
function distancesOf({ result: { eye, skin } }: ResultView): number[] {
  const steps = Array.from(
    { length: AXIS_DECADES * POINTS_PER_DECADE + 1 },
    (_, index) => AXIS_FROM_M * 10 ** (index / POINTS_PER_DECADE),
  );
  const thresholds = [eye.hazardDistanceM, skin.hazardDistanceM].filter(
    (distanceM) => distanceM > AXIS_FROM_M && distanceM < AXIS_TO_M,
  );
  return [...steps, ...thresholds].sort((a, b) => a - b);
}

/** The eye's limit, when one figure holds for every line at every distance. */
function commonLimit(view: ResultView): LimitFigure | undefined {
  const { path } = view.case;
  const first = view.lines[0];
  if (!first || (path?.kind === 'diffuse' && path.spotMm !== undefined)) return undefined;
  const isOne = haveOneLimit(view, 'eye') && sameMode(view);
  return isOne ? limitFigure(first.beam, first.eye.mpe) : undefined;
}

function sameMode(view: ResultView): boolean {
  const modes = new Set(view.lines.map(({ beam }) => beam.emission.mode));
  return modes.size === 1;
}

function exposureModel(
  view: ResultView,
  curve: readonly CurvePoint[],
  limit: LimitFigure,
): ExposureChartModel {
  const points = curve.map(({ distanceM, eyeRatio }) => ({
    distanceM,
    value: eyeRatio * limit.value,
  }));
  const { eye, skin } = view.result;
  const limits: ChartLimit[] = [
    limitLine(view, 'eye', limit, eye.hazardDistanceM),
    ...skinLine(view, points, limit.unit, skin.hazardDistanceM),
  ];
  return {
    unit: limit.unit,
    title: titleOf(view, limit.per),
    points,
    limits,
    ...linesOf(view, curve, () => 1),
  };
}

function ratioModel(view: ResultView, curve: readonly CurvePoint[]): ExposureChartModel {
  const points = curve.map(({ distanceM, eyeRatio }) => ({ distanceM, value: eyeRatio }));
  const { hazardDistanceM } = view.result.eye;
  const label = `Eye limit, ${exposureText(view, 'eye')}`;
  return {
    unit: '',
    title: 'exposure divided by the eye’s limit',
    points,
    limits: [{ side: 'eye', value: 1, label, distanceM: hazardDistanceM }],
    ...linesOf(view, curve, (index) => limitValue(view, index)),
  };
}

function limitValue(view: ResultView, index: number): number {
  const line = view.lines[index];
  return line ? limitFigure(line.beam, line.eye.mpe).value : 1;
}

/** Every line by itself, divided by what `divisor` says; none for a single line or a lit spot. */
function linesOf(
  view: ResultView,
  curve: readonly CurvePoint[],
  divisor: (index: number) => number,
): Pick<ExposureChartModel, 'lines'> {
  const { path } = view.case;
  const variesWithDistance = path?.kind === 'diffuse' && path.spotMm !== undefined;
  if (view.lines.length < 2 || variesWithDistance) return {};
  return {
    lines: view.lines.map(({ beam }, index) => ({
      wavelengthNm: beam.wavelengthNm,
      points: curve.map(({ distanceM, beams }) => ({
        distanceM,
        value: valueOf(beams[index]) / divisor(index),
      })),
    })),
  };
}

function valueOf(exposure: CurveExposure | undefined): number {
  if (!exposure) return 0;
  return 'irradianceWPerM2' in exposure
    ? exposure.irradianceWPerM2
    : exposure.radiantExposureJPerM2;
}

function skinLine(
  view: ResultView,
  points: readonly ChartPoint[],
  unit: LimitFigure['unit'],
  distanceM: number,
): ChartLimit[] {
  const first = view.lines[0];
  if (!first || !haveOneLimit(view, 'skin') || distanceM <= AXIS_FROM_M) return [];
  const limit = limitFigure(first.beam, first.skin.mpe);
  const there = points.find((point) => point.distanceM === distanceM);
  const meets = there && Math.abs(there.value / limit.value - 1) < MEETS_WITHIN;
  return limit.unit === unit && meets ? [limitLine(view, 'skin', limit, distanceM)] : [];
}

function limitLine(
  view: ResultView,
  side: Side,
  { value, unit, per }: LimitFigure,
  distanceM: number,
): ChartLimit {
  const name = side === 'eye' ? 'Eye' : 'Skin';
  const limit = formatQuantity(value, unit, 'down').text;
  const label = `${name} limit ${limit}${per && ` ${per}`}, ${exposureText(view, side)}`;
  return { side, value, label, distanceM };
}

function exposureText(view: ResultView, side: Side): string {
  const { exposure } = view.case;
  const mpe = view.lines[0]?.[side].mpe;
  const seconds = side === 'eye' ? exposure?.eyeS : (exposure?.skinS ?? exposure?.eyeS);
  return durationWords(seconds ?? mpe?.durationS ?? 0);
}

function titleOf(view: ResultView, per: string): string {
  const onAxis = view.case.model?.onAxis ?? ruleSetById(view.case.ruleSet).defaultModel.onAxis;
  const aperture = view.lines[0]?.eye.mpe.limitingApertureMm ?? 0;
  const how =
    view.case.path?.kind === 'diffuse' || onAxis === 'peak'
      ? ON_AXIS_WORDS.peak
      : `mean over ${aperture}\u202fmm`;
  const who = view.lines.length > 1 ? `all ${view.lines.length} lines together, ` : '';
  return `${who}${how}${per && `, ${per}`}`;
}
