import type { Step } from '@shared/hazard/result';
import { formatWavelength, UNIT_SPACE } from '@shared/model/quantity-format';
import { governingLine, type ResultView } from '@shared/model/result-view';
import { shortened, stepUnit, stepValue } from '@shared/model/step-text';
import type { Content, TableCell } from 'pdfmake/interfaces';

import { ledger, sectionHead } from '../../pdf/document-parts';
import { formulaSvg } from '../../pdf/formula-svg';
import type { ReportScenario } from './evaluation-report';
import { isEvaluatedScenario } from './evaluation-report-results';

const FORMULA_WIDTH = 236;
const FORMULA_SIZE = 9;

/** Beyond this many lines only the governing one is printed: the others take the same steps. */
const LINES_IN_FULL = 2;

/** Annex: how each result was found, to be recomputed by hand. */
export function derivationAnnex(scenarios: readonly ReportScenario[]): Content[] {
  return scenarios.filter(isEvaluatedScenario).flatMap(({ scenario, view }, index) => {
    const groups = groupsOf(view);
    if (groups.length === 0) return [];
    return [
      {
        ...(sectionHead(
          `Annex ${index + 1}: how the results of “${scenario.name}” were found`,
          'each step can be recomputed by hand',
        ) as object),
        ...(index === 0 ? { pageBreak: 'before' } : {}),
      } as Content,
      ...(view.lines.length > LINES_IN_FULL ? [omissionNote(view)] : []),
      ...groups.flatMap((group) => [
        { text: group.title, style: 'part', margin: [0, 8, 0, 2] } as Content,
        stepTable(group.steps),
      ]),
    ];
  });
}

interface NumberedStep {
  readonly number: number;
  readonly step: Step;
}

function groupsOf(view: ResultView): { title: string; steps: NumberedStep[] }[] {
  const groups = new Map<string, NumberedStep[]>();
  (view.result.steps ?? []).forEach((step, index) => {
    if (!isPrinted(view, step)) return;
    const title = titleOf(view, step);
    groups.set(title, [...(groups.get(title) ?? []), { number: index + 1, step }]);
  });
  return [...groups].map(([title, steps]) => ({ title, steps }));
}

function isPrinted(view: ResultView, { side, beam }: Step): boolean {
  if (view.lines.length <= LINES_IN_FULL || beam === undefined) return true;
  return view.lines[beam] === governingLine(view, side);
}

function titleOf(view: ResultView, { side, beam }: Step): string {
  const name = side === 'eye' ? 'Eye' : 'Skin';
  if (view.lines.length === 1) return name;
  const line = beam === undefined ? undefined : view.lines[beam];
  return line ? `${name}, ${formatWavelength(line.beam.wavelengthNm).text}` : `${name}, all lines`;
}

function omissionNote(view: ResultView): Content {
  const nm = formatWavelength(governingLine(view, 'eye').beam.wavelengthNm).text;
  return {
    text: `Printed for ${nm}, the line that asks for the highest density, and for all lines together. The other lines take the same steps; they are in the record.`,
    style: 'small',
  };
}

function stepTable(steps: readonly NumberedStep[]): Content {
  return ledger(
    [
      { head: '', width: 18 },
      { head: 'What, and from where', width: '*' },
      { head: 'Formula, then with numbers', width: FORMULA_WIDTH },
      { head: 'Value', width: 84, align: 'right' },
    ],
    steps.map(stepRow),
  );
}

function stepRow({ number, step }: NumberedStep): TableCell[] {
  const formulas = [
    `${step.symbol} = ${step.formula}`,
    ...(step.substituted === step.formula ? [] : [step.substituted]),
  ];
  const unit = stepUnit(step);
  return [
    { text: String(number), style: 'quiet' },
    {
      stack: [
        { text: step.what, bold: true, fontSize: 8.5 },
        { text: step.source, style: 'small' },
      ],
    },
    { stack: formulas.map((formula) => formulaContent(shortened(formula))) },
    {
      text: [{ text: stepValue(step), bold: true }, unit ? `${UNIT_SPACE}${unit}` : ''],
      alignment: 'right',
      noWrap: true,
    },
  ];
}

/** Typeset where it is mathematics that fits; as written otherwise. */
function formulaContent(formula: string): Content {
  const typeset = formulaSvg(formula, FORMULA_SIZE, FORMULA_WIDTH - 4);
  if (!typeset) return { text: formula, fontSize: 8 };
  const { svg, width, height } = typeset;
  return { svg, width, height, margin: [0, 0.6, 0, 0.6] };
}
