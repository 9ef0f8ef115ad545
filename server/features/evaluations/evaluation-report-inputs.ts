import { ruleSetById } from '@shared/hazard/rule-sets';
import { emissionFigures } from '@shared/model/emission-figures';
import type { Evaluation } from '@shared/model/evaluations';
import { lineName } from '@shared/model/laser-inputs';
import type { Emission } from '@shared/model/lasers';
import { formatFull } from '@shared/model/quantity-format';
import {
  ACTIVITY_WORDS,
  aidName,
  exposureWords,
  GROWTH_WORDS,
  ON_AXIS_WORDS,
  pathWords,
} from '@shared/text/hazard-words';
import type { Content } from 'pdfmake/interfaces';

import { ledger, pairs, sectionHead, sentences } from '../../pdf/document-parts';
import type { ReportScenario } from './evaluation-report';

/** What the results rest on: lines with the provenance of every number, situations, conversions. */
export function inputsSection(
  { laserInputs }: Evaluation,
  scenarios: readonly ReportScenario[],
): Content[] {
  const conversions = unique(scenarios.flatMap((one) => one.conversions));
  return [
    sectionHead('Inputs', 'each number with where it came from'),
    ledger(
      [
        { head: 'Line', width: 62 },
        { head: 'Beam and emission', width: '*' },
      ],
      laserInputs.emissions.map((line) => [
        { text: lineName(line), bold: true },
        { text: figuresText(line), fontSize: 8 },
      ]),
    ),
    ...scenarios.flatMap(situationBlock),
    ...(conversions.length > 0
      ? [
          { text: 'Converted', style: 'head', margin: [0, 4, 0, 0] } as Content,
          sentences(conversions),
        ]
      : []),
  ];
}

/** What the author wrote beside the numbers. */
export function recordSection({ input }: Evaluation): Content[] {
  const rows: (readonly [string, Content])[] = [
    ...input.notCovered.map(
      ({ activity, reason }) => [`${ACTIVITY_WORDS[activity]} not evaluated`, reason] as const,
    ),
    ...(input.assumptions.length > 0
      ? [['Assumptions', sentences(input.assumptions, 9)] as const]
      : []),
    ...(input.controls ? [['Controls', input.controls] as const] : []),
    ...(input.nonBeamHazards ? [['Non-beam hazards', input.nonBeamHazards] as const] : []),
    ...(input.conditions ? [['Conditions', input.conditions] as const] : []),
    ...(input.note ? [['Note', input.note] as const] : []),
  ];
  return rows.length > 0 ? [sectionHead('For the record'), pairs(rows)] : [];
}

function situationBlock({ scenario, view, assumptions }: ReportScenario): Content[] {
  if (!view) return [];
  const { path, aid, air, at, model, ruleSet } = view.case;
  const { growth, onAxis } = model ?? ruleSetById(ruleSet).defaultModel;
  const said = [
    `${ACTIVITY_WORDS[scenario.activity]}`,
    `exposure ${exposureWords(view.case)} (${scenario.exposureReason.replace(/\.$/, '')})`,
    pathWords(path),
    aid ? `optical aid ${aidName(aid)}, transmission ${aid.transmission}` : 'no optical aid',
    `${GROWTH_WORDS[growth]}, ${ON_AXIS_WORDS[onAxis]}`,
    ...(air ? [`air attenuation ${air.attenuationPerKm}\u202f1/km`] : []),
    ...(at ? [`also at ${formatFull(at.distanceM, 'm')}`] : []),
  ];
  return [
    {
      margin: [0, 4, 0, 0],
      text: [{ text: `${scenario.name}: `, bold: true }, `${said.join('; ')}.`],
    },
    ...(scenario.note ? [{ text: scenario.note } as Content] : []),
    ...(assumptions.length > 0 ? [sentences(assumptions)] : []),
  ];
}

/** Words that the figure says by itself on a sheet with a column for the line. */
const SELF_EVIDENT: ReadonlySet<string> = new Set(['Mode', 'Power', 'Profile']);

/** "CW; 0.35 W (label); diameter at the exit 1.5 mm at 1/e² (label)". */
function figuresText(line: Emission): string {
  return emissionFigures(line)
    .filter(({ what }) => what !== 'Wavelength')
    .map(({ what, text, provenance }) => {
      const name = SELF_EVIDENT.has(what) ? '' : `${what.charAt(0).toLowerCase()}${what.slice(1)} `;
      return `${name}${text}${provenance && ` (${provenance})`}`;
    })
    .join('; ');
}

function unique(texts: readonly string[]): string[] {
  return [...new Set(texts)];
}
