import type { BeamResult, EvaluationResult, SideResult } from '../hazard/result';
import { isEvaluated, type ScenarioResult } from './evaluation-case';
import type { ResultChange, Scenario } from './evaluations';

/** The results of one state of the inputs, with the situations that they belong to. */
export interface ResultSet {
  readonly scenarios: readonly Pick<Scenario, 'id' | 'name'>[];
  readonly results: readonly ScenarioResult[];
}

interface Figure {
  readonly what: string;
  readonly unit: string;
  readonly value: number;
  /** Which way is worse. Limits: lower. Distances, densities: higher. */
  readonly worse: 'higher' | 'lower';
}

/** Two engines may differ in the last digits; that is no change. */
const SAME_WITHIN = 1e-9;

/**
 * Every result that differs, worst first: what is new, what got worse by how much, what is gone,
 * what got better. Situations are matched by id.
 */
export function compareResults(sealed: ResultSet, today: ResultSet): ResultChange[] {
  const ids = new Set([...sealed.scenarios, ...today.scenarios].map(({ id }) => id));
  const changes = [...ids].flatMap((id) => {
    const before = figuresOf(sealed, id);
    const after = figuresOf(today, id);
    const scenario =
      [...today.scenarios, ...sealed.scenarios].find((one) => one.id === id)?.name ?? id;
    return compareFigures(before, after).map((change) => ({ scenario, ...change }));
  });
  return changes.sort((a, b) => severity(b) - severity(a));
}

/** Whether any result is worse than, or did not exist in, the sealed one. */
export function isWorse(changes: readonly ResultChange[]): boolean {
  return changes.some(({ direction }) => direction === 'worse' || direction === 'new');
}

type FigureChange = Omit<ResultChange, 'scenario'>;

function compareFigures(
  before: ReadonlyMap<string, Figure>,
  after: ReadonlyMap<string, Figure>,
): FigureChange[] {
  const keys = new Set([...before.keys(), ...after.keys()]);
  return [...keys].flatMap((key) => {
    const sealed = before.get(key);
    const today = after.get(key);
    const either = today ?? sealed;
    if (!either) return [];
    const row = {
      what: either.what,
      unit: either.unit,
      sealed: sealed?.value ?? null,
      today: today?.value ?? null,
    };
    const direction = directionOf(sealed, today);
    return direction === 'same' ? [] : [{ ...row, direction }];
  });
}

function directionOf(
  sealed: Figure | undefined,
  today: Figure | undefined,
): ResultChange['direction'] {
  if (!sealed) return 'new';
  if (!today) return 'gone';
  const size = Math.max(Math.abs(sealed.value), Math.abs(today.value));
  if (Math.abs(today.value - sealed.value) <= size * SAME_WITHIN) return 'same';
  const higher = today.value > sealed.value;
  return higher === (today.worse === 'higher') ? 'worse' : 'better';
}

/** New lines first, then what got worse by its ratio, then what is gone, then what got better. */
function severity(change: ResultChange): number {
  switch (change.direction) {
    case 'new':
      return 1e6;
    case 'worse':
      return 1 + Math.min(ratio(change), 1e5);
    case 'gone':
      return 1;
    case 'better':
      return -ratio(change);
    case 'same':
      return -1e6;
  }
}

function ratio({ sealed, today }: ResultChange): number {
  const [a, b] = [Math.abs(sealed ?? 0), Math.abs(today ?? 0)];
  const [low, high] = a < b ? [a, b] : [b, a];
  return low === 0 ? 1e5 : Math.log(high / low);
}

function figuresOf({ results }: ResultSet, scenarioId: string): ReadonlyMap<string, Figure> {
  const found = results.find((one) => one.scenarioId === scenarioId);
  if (!found || !isEvaluated(found.result)) return new Map();
  const { eye, skin } = found.result;
  const figures = [
    ...sideFigures('eye', eye),
    ...sideFigures('skin', skin),
    ...lineFigures(found.result),
  ];
  return new Map(figures.map((one) => [one.what, one]));
}

function sideFigures(side: 'eye' | 'skin', result: SideResult): Figure[] {
  const figures: Figure[] = [
    {
      what: side === 'eye' ? 'Eye hazard distance' : 'Skin hazard distance',
      unit: 'm',
      value: result.hazardDistanceM,
      worse: 'higher',
    },
    {
      what: side === 'eye' ? 'Optical density, eye' : 'Optical density, skin',
      unit: '',
      value: result.opticalDensity,
      worse: 'higher',
    },
  ];
  if (result.aidedHazardDistanceM !== undefined) {
    figures.push({
      what: 'Eye hazard distance with optical aid',
      unit: 'm',
      value: result.aidedHazardDistanceM,
      worse: 'higher',
    });
  }
  return figures;
}

function lineFigures({ eye, skin }: EvaluationResult): Figure[] {
  return [
    ...eye.perBeam.flatMap((beam, index) => beamFigures('eye', beam, index)),
    ...skin.perBeam.flatMap((beam, index) => beamFigures('skin', beam, index)),
  ];
}

function beamFigures(side: 'eye' | 'skin', beam: BeamResult, index: number): Figure[] {
  const line = beam.label ?? `Line ${index + 1}`;
  return [
    {
      what: `${line}: optical density, ${side}`,
      unit: '',
      value: beam.opticalDensity,
      worse: 'higher',
    },
    {
      what: `${line}: limit, ${side}`,
      unit: 'J/m²',
      value: beam.mpe.radiantExposureJPerM2,
      worse: 'lower',
    },
  ];
}
