import { exposureChart } from '@shared/drawing/exposure-chart';
import { METRICS, type ReachMetrics, widthOf, withoutAxis } from '@shared/drawing/reach-axis';
import { reachStrip } from '@shared/drawing/reach-strip';
import type { Side } from '@shared/hazard/result';
import type { Evaluation, ResultChange } from '@shared/model/evaluations';
import {
  formatOpticalDensity,
  formatQuantity,
  formatWavelength,
} from '@shared/model/quantity-format';
import { resultChart } from '@shared/model/result-chart';
import {
  governingLine,
  haveOneLimit,
  limitFigure,
  type LineView,
  reachOf,
  type ResultView,
} from '@shared/model/result-view';
import {
  ACTIVITY_WORDS,
  aidName,
  distanceOrigin,
  durationWords,
  emissionWords,
  MECHANISM_WORDS,
  RULE_WORDS,
} from '@shared/text/hazard-words';
import { placeCautions } from '@shared/text/place-cautions';
import type { Column, Content, TableCell } from 'pdfmake/interfaces';

import { drawingSvg, ledger, MM, sectionHead, sentences, STOP } from '../../pdf/document-parts';
import type { ReportScenario } from './evaluation-report';

type Evaluated = ReportScenario & { readonly view: ResultView };

export const isEvaluatedScenario = (one: ReportScenario): one is Evaluated => one.view !== null;

/** Results: every situation in one line, then the one that reaches farthest in full. */
export function resultsSection(
  evaluation: Evaluation,
  scenarios: readonly ReportScenario[],
): Content[] {
  const evaluated = scenarios.filter(isEvaluatedScenario);
  const farthest = farthestOf(evaluated);
  if (!farthest) {
    return [sectionHead('Results'), { text: 'No situation has been evaluated.', style: 'quiet' }];
  }
  const { wallDistanceM } = evaluation.laserInputs;
  const note = scenarios.length > 1 ? 'the situation that reaches farthest' : '';
  return [
    ...(scenarios.length > 1 ? [sectionHead('Situations'), scenarioTable(scenarios)] : []),
    sectionHead(`Results: ${farthest.scenario.name}`, note),
    heroRow(farthest.view),
    ...drawings(farthest.view, wallDistanceM),
    lineTable(farthest.view),
    ...atRow(farthest.view),
  ];
}

export function farthestOf(evaluated: readonly Evaluated[]): Evaluated | undefined {
  return evaluated.reduce<Evaluated | undefined>(
    (far, one) =>
      !far || one.view.result.eye.hazardDistanceM > far.view.result.eye.hazardDistanceM ? one : far,
    undefined,
  );
}

/** Sealed inputs against today's, when they differ. */
export function changesSection({ state, whatChanged }: Evaluation): Content[] {
  if (state !== 'stale' || whatChanged.length === 0) return [];
  return [
    sectionHead('What got worse', 'sealed inputs against today’s'),
    ledger(
      [
        { head: 'Result', width: '*' },
        { head: 'Sealed', width: 80, align: 'right' },
        { head: 'Today', width: 80, align: 'right' },
        { head: '', width: 60 },
      ],
      whatChanged.map((change) => [
        `${change.scenario}: ${change.what}`,
        { text: changeValue(change, change.sealed), alignment: 'right' },
        { text: changeValue(change, change.today), alignment: 'right', bold: true },
        {
          text: change.direction,
          ...(change.direction === 'worse' || change.direction === 'new'
            ? { color: STOP, bold: true }
            : {}),
        },
      ]),
    ),
  ];
}

/** What the reader must be careful about: the place, the warnings, then what every result carries. */
export function cautionsSection(
  { laserInputs }: Evaluation,
  scenarios: readonly ReportScenario[],
): Content[] {
  const evaluated = scenarios.filter(isEvaluatedScenario);
  const farthest = farthestOf(evaluated);
  if (!farthest) return [];
  const warnings = unique(
    evaluated.flatMap(({ view }) => view.result.warnings.map(({ text }) => text)),
  );
  const place = placeCautions(farthest.view.result, laserInputs.wallDistanceM);
  return [
    ...(warnings.length > 0 ? [sectionHead('Warnings'), sentences(warnings)] : []),
    sectionHead('Cautions'),
    inTwoColumns([
      ...place.map(({ head, text }) => `${head}. ${text}`),
      ...farthest.view.result.cautions,
    ]),
  ];
}

function inTwoColumns(texts: readonly string[]): Content {
  const half = Math.ceil(texts.length / 2);
  return {
    columnGap: 16,
    columns: [sentences(texts.slice(0, half), 7.6), sentences(texts.slice(half), 7.6)],
  };
}

function changeValue({ what, unit }: ResultChange, value: number | null): string {
  if (value === null) return 'none';
  if (unit === '') return formatOpticalDensity(value);
  if (unit === 'm') return distanceText(value);
  return formatQuantity(value, unit, /limit/.test(what) ? 'down' : 'up').text;
}

function scenarioTable(scenarios: readonly ReportScenario[]): Content {
  return ledger(
    [
      { head: 'Situation', width: '*' },
      { head: 'Activity', width: 62 },
      { head: 'Eye distance', width: 62, align: 'right' },
      { head: 'OD, eye', width: 42, align: 'right' },
      { head: 'Skin distance', width: 64, align: 'right' },
      { head: 'With aid', width: 54, align: 'right' },
    ],
    scenarios.map(({ scenario, view }) => [
      scenario.name,
      ACTIVITY_WORDS[scenario.activity],
      right(view ? distanceText(view.result.eye.hazardDistanceM) : 'not evaluated'),
      right(view ? formatOpticalDensity(view.result.eye.opticalDensity) : ''),
      right(view ? distanceText(view.result.skin.hazardDistanceM) : ''),
      right(
        view?.result.eye.aidedHazardDistanceM === undefined
          ? '–'
          : distanceText(view.result.eye.aidedHazardDistanceM),
      ),
    ]),
  );
}

function heroRow(view: ResultView): Content {
  const { eye, skin } = view.result;
  const line = governingLine(view, 'eye');
  const limit = limitFigure(line.beam, line.eye.mpe);
  const several = view.lines.length > 1 && !haveOneLimit(view, 'eye');
  const column = (label: string, figure: string, note: string, style = 'figure'): Column => ({
    width: style === 'hero' ? 118 : '*',
    stack: [
      { text: label, style: 'small' },
      { text: figure, style, margin: style === 'hero' ? 0 : [0, 7, 0, 2] },
      { text: note, style: 'small' },
    ],
  });
  return {
    margin: [0, 2, 0, 6],
    columnGap: 10,
    columns: [
      column(
        'Eye hazard distance',
        distanceText(eye.hazardDistanceM),
        `from ${distanceOrigin(view.case.path)}, ${exposureText(view, 'eye')}`,
        'hero',
      ),
      column(
        'Eye limit',
        `${formatQuantity(limit.value, limit.unit, 'down').text}`,
        [
          several ? formatWavelength(line.beam.wavelengthNm).text : '',
          limit.per,
          exposureText(view, 'eye'),
          MECHANISM_WORDS[line.eye.mpe.mechanism],
          `over ${line.eye.mpe.limitingApertureMm}\u202fmm`,
        ]
          .filter(Boolean)
          .join(', '),
      ),
      column(
        'Optical density, eye',
        formatOpticalDensity(eye.opticalDensity),
        view.lines.length > 1 ? 'all lines, worst place' : 'at the worst place',
      ),
      column(
        'Skin hazard distance',
        distanceText(skin.hazardDistanceM),
        exposureText(view, 'skin'),
      ),
      ...(eye.aidedHazardDistanceM === undefined || !view.case.aid
        ? []
        : [
            column(
              `Eye, with ${aidName(view.case.aid)}`,
              distanceText(eye.aidedHazardDistanceM),
              exposureText(view, 'eye'),
            ),
          ]),
    ],
  };
}

/** Strip and chart on one axis, with room on the left for the chart's labels. */
const STRIP = { ...METRICS.print, left: 17 } satisfies ReachMetrics;

function drawings(view: ResultView, wallDistanceM: number | undefined): Content[] {
  const chart = resultChart(view, wallDistanceM);
  const strip = reachStrip(reachOf(view, wallDistanceM), withoutAxis(STRIP));
  return [
    { svg: drawingSvg(strip), width: strip.width * MM },
    {
      svg: drawingSvg(exposureChart({ ...chart, title: '' }, STRIP)),
      width: widthOf(STRIP) * MM,
    },
    { text: `Curve: ${chart.title}.`, style: 'small', margin: [STRIP.left * MM, -2, 0, 4] },
  ];
}

function lineTable(view: ResultView): Content {
  const table = ledger(
    [
      { head: 'Line', width: 50 },
      { head: 'Emission', width: '*' },
      { head: 'Eye limit', width: 58, align: 'right' },
      { head: 'Worst exposure', width: 62, align: 'right' },
      { head: 'OD', width: 24, align: 'right' },
      { head: 'Distance', width: 42, align: 'right' },
      { head: 'Skin limit', width: 58, align: 'right' },
      { head: 'OD', width: 24, align: 'right' },
      { head: 'Distance', width: 42, align: 'right' },
    ],
    [...view.lines.map(lineRow), ...(view.lines.length > 1 ? [togetherRow(view)] : [])],
  );
  return {
    stack: [table, { text: rulesText(view), style: 'small', margin: [0, 2, 0, 0] }],
    fontSize: 8,
  };
}

function lineRow({ beam, eye, skin, eyeAloneM, skinAloneM }: LineView): TableCell[] {
  const eyeLimit = limitFigure(beam, eye.mpe);
  const skinLimit = limitFigure(beam, skin.mpe);
  const worst = limitFigure(beam, eye.exposure);
  return [
    formatWavelength(beam.wavelengthNm).text,
    emissionWords(beam),
    right(formatQuantity(eyeLimit.value, eyeLimit.unit, 'down').text),
    right(formatQuantity(worst.value, worst.unit, 'up').text),
    right(formatOpticalDensity(eye.opticalDensity)),
    right(distanceText(eyeAloneM)),
    right(formatQuantity(skinLimit.value, skinLimit.unit, 'down').text),
    right(formatOpticalDensity(skin.opticalDensity)),
    right(distanceText(skinAloneM)),
  ];
}

function togetherRow({ result: { eye, skin } }: ResultView): TableCell[] {
  const strong = (text: string): TableCell => ({ text, alignment: 'right', bold: true });
  return [
    { text: 'Together', bold: true },
    { text: 'ratios add on the same tissue', style: 'small' },
    '',
    '',
    strong(formatOpticalDensity(eye.opticalDensity)),
    strong(distanceText(eye.hazardDistanceM)),
    '',
    strong(formatOpticalDensity(skin.opticalDensity)),
    strong(distanceText(skin.hazardDistanceM)),
  ];
}

/** Which rule governs, once for all lines that share it. */
function rulesText(view: ResultView): string {
  const sides = (['eye', 'skin'] as const).map((side) => {
    const rules = new Map<string, string[]>();
    for (const line of view.lines) {
      const rule = ruleText(line, side);
      const name = formatWavelength(line.beam.wavelengthNm).text;
      rules.set(rule, [...(rules.get(rule) ?? []), name]);
    }
    const said = [...rules].map(([rule, names]) =>
      rules.size === 1 ? rule : `${names.join(', ')}: ${rule}`,
    );
    return `${side === 'eye' ? 'Eye' : 'Skin'} limits: ${said.join('; ')}.`;
  });
  const note = view.lines.length > 1 ? ' Distances of a line: on alone.' : '';
  return sides.join(' ') + note;
}

function ruleText(line: LineView, side: Side): string {
  const { mpe } = line[side];
  const { per } = limitFigure(line.beam, mpe);
  return [
    RULE_WORDS[mpe.rule],
    MECHANISM_WORDS[mpe.mechanism],
    ...(per ? [per] : []),
    `over ${mpe.limitingApertureMm}\u202fmm`,
  ].join(', ');
}

function atRow(view: ResultView): Content[] {
  const { at } = view.case;
  const { eye, skin } = view.result;
  if (!at || !eye.at || !skin.at) return [];
  const there = formatQuantity(at.distanceM, 'm', 'nearest').text;
  return [
    {
      text:
        `At ${there}: optical density ${formatOpticalDensity(eye.at.opticalDensity)} for the eye, ` +
        `${formatOpticalDensity(skin.at.opticalDensity)} for the skin.`,
      margin: [0, 2, 0, 0],
    },
  ];
}

function right(text: string): TableCell {
  return { text, alignment: 'right' };
}

function distanceText(meters: number): string {
  return meters === 0 ? 'nowhere' : formatQuantity(meters, 'm', 'up').text;
}

function exposureText(view: ResultView, side: Side): string {
  const { exposure } = view.case;
  const seconds = side === 'eye' ? exposure?.eyeS : (exposure?.skinS ?? exposure?.eyeS);
  return durationWords(seconds ?? governingLine(view, side)[side].mpe.durationS);
}

function unique(texts: readonly string[]): string[] {
  return [...new Set(texts)];
}
