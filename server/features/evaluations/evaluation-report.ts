import { ruleSetById } from '@shared/hazard/rule-sets';
import { isEvaluated } from '@shared/model/evaluation-case';
import type { Evaluation, Scenario } from '@shared/model/evaluations';
import { type ResultView, resultView } from '@shared/model/result-view';
import type { Settings } from '@shared/model/settings';
import { siteInstant } from '@shared/text/site-time';
import {
  EVALUATION_STATE_WORDS,
  type EvaluationState,
} from '@shared/workflow/evaluation-life-cycle';
import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces';

import { DOCUMENT_STYLE, keepHeadings, PAGE_MARGIN, STOP } from '../../pdf/document-parts';
import { renderPdf } from '../../pdf/render-pdf';
import { derivationAnnex } from './evaluation-report-derivation';
import { inputsSection, recordSection } from './evaluation-report-inputs';
import { cautionsSection, changesSection, resultsSection } from './evaluation-report-results';
import { signaturesSection } from './evaluation-report-signatures';

/** All that the report says: nothing is looked up while it is built. */
export interface EvaluationReportModel {
  readonly evaluation: Evaluation;
  readonly site: Pick<Settings, 'siteName' | 'zone' | 'emergencyPhone'>;
  /** When it was printed; printed data age. */
  readonly printedAt: string;
}

/** One situation with its result, or without when it could not be evaluated. */
export interface ReportScenario {
  readonly scenario: Scenario;
  readonly view: ResultView | null;
  readonly conversions: readonly string[];
  readonly assumptions: readonly string[];
}

/** Across every page when the evaluation is not, or no longer, the one that counts. */
const WATERMARKS: Readonly<Partial<Record<EvaluationState, string>>> = {
  draft: 'DRAFT',
  'in-check': 'DRAFT',
  checked: 'DRAFT',
  stale: 'OUTDATED',
  superseded: 'SUPERSEDED',
  withdrawn: 'WITHDRAWN',
  discarded: 'DISCARDED',
};

/** The printed evaluation, A4. */
export function evaluationReport(model: EvaluationReportModel): Promise<Buffer> {
  return renderPdf(evaluationDocument(model));
}

/** The document tree of an evaluation. Pure: the same model gives the same tree. */
export function evaluationDocument(model: EvaluationReportModel): TDocumentDefinitions {
  const { evaluation, site, printedAt } = model;
  const scenarios = scenariosOf(evaluation);
  const name = `${evaluation.laser.tag}, evaluation ${evaluation.number}`;
  const { edition } = ruleSetById(evaluation.input.ruleSet);
  const mark = WATERMARKS[evaluation.state];
  return {
    ...DOCUMENT_STYLE,
    info: { title: name, subject: `Laser hazard evaluation by ${edition}`, author: site.siteName },
    pageSize: 'A4',
    pageBreakBefore: keepHeadings,
    pageMargins: [PAGE_MARGIN, 50, PAGE_MARGIN, 52],
    ...(mark
      ? { watermark: { text: mark, font: 'Sans', bold: true, color: STOP, opacity: 0.13 } }
      : {}),
    header: (page, pages) => headerOf(evaluation, page, pages),
    footer: () => footerOf(model, edition),
    content: [
      ...titleBlock(evaluation),
      ...changesSection(evaluation),
      ...resultsSection(evaluation, scenarios),
      ...inputsSection(evaluation, scenarios),
      ...recordSection(evaluation),
      ...cautionsSection(evaluation, scenarios),
      ...signaturesSection(evaluation, site, printedAt),
      ...derivationAnnex(scenarios),
    ],
  };
}

function scenariosOf({ input, results }: Evaluation): ReportScenario[] {
  return input.scenarios.map((scenario) => {
    const stored = results.find(({ scenarioId }) => scenarioId === scenario.id);
    const hazardCase = stored?.case as ResultView['case'] | null | undefined;
    const result = stored?.result as ResultView['result'] | undefined;
    const view =
      hazardCase && result && isEvaluated(result) ? resultView(hazardCase, result) : null;
    return {
      scenario,
      view,
      conversions: stored?.conversions ?? [],
      assumptions: stored?.assumptions ?? [],
    };
  });
}

function headerOf(
  { laser, number, version, id }: Evaluation,
  page: number,
  pages: number,
): Content {
  return {
    margin: [PAGE_MARGIN, 24, PAGE_MARGIN, 0],
    columns: [
      { text: `${laser.tag}, evaluation ${number}, version ${version} · ${id}`, style: 'small' },
      { text: `Page ${page} of ${pages}`, style: 'small', alignment: 'right', width: 80 },
    ],
  };
}

function footerOf({ site, printedAt }: EvaluationReportModel, edition: string): Content {
  return {
    margin: [PAGE_MARGIN, 8, PAGE_MARGIN, 0],
    style: 'small',
    stack: [
      `${site.siteName} · results by ${edition} · printed ${siteInstant(printedAt, site.zone)}. Printed data age: check before use.`,
      `An aid for trained people. Local law and permit terms come first; the laser safety officer decides and signs. Emergency: call ${site.emergencyPhone} now.`,
    ],
  };
}

function titleBlock({ laser, number, state, input, staleReasons }: Evaluation): Content[] {
  const place = laser.areaCode ? ` · ${laser.areaCode} ${laser.areaName ?? ''}` : '';
  const classes = [
    ...(laser.declaredClass ? [`class ${laser.declaredClass} declared`] : []),
    ...(laser.verifiedClass ? [`class ${laser.verifiedClass} verified`] : []),
  ];
  return [
    { text: `${laser.tag}, evaluation ${number}`, style: 'title' },
    {
      text: `${laser.maker} ${laser.model}${place.trimEnd()}${classes.length ? ` · ${classes.join(', ')}` : ''}`,
      margin: [0, 1, 0, 1],
    },
    {
      text: [
        { text: `${EVALUATION_STATE_WORDS[state]}. `, bold: true },
        ruleSetById(input.ruleSet).title,
      ],
    },
    ...(state === 'stale' && staleReasons.length > 0
      ? [{ text: staleReasons.join(' '), color: STOP, bold: true, margin: [0, 3, 0, 0] } as Content]
      : []),
  ];
}
