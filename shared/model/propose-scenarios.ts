import { proposedExposure } from '../hazard/default-exposure';
import { evaluate } from '../hazard/evaluate';
import type { RuleSetId } from '../hazard/rule-sets';
import { isEvaluated, scenarioCase } from './evaluation-case';
import type { Activity, LaserInputs, Scenario } from './evaluations';
import type { Emission } from './lasers';

/**
 * Situations to begin with: operation for each set of lines that can be on together, and alignment
 * with all of them. A proposal: the author changes, adds and answers for the rest.
 */
export function proposeScenarios(inputs: LaserInputs, ruleSet: RuleSetId): Scenario[] {
  const groups = groupsOf(inputs);
  const operations = groups.map((group, index) =>
    scenarioOf(inputs, ruleSet, { activity: 'operation', group, index }),
  );
  const alignments = groups.map((group, index) =>
    scenarioOf(inputs, ruleSet, { activity: 'alignment', group, index }),
  );
  return [...operations, ...alignments];
}

interface Group {
  readonly name: string;
  readonly emissions: readonly Emission[];
}

interface Proposal {
  readonly activity: Activity;
  readonly group: Group;
  readonly index: number;
}

/** The named sets and the lines in none of them; without sets, all lines that leave the same way. */
function groupsOf(inputs: LaserInputs): Group[] {
  const { emissions, emissionSets } = inputs;
  const inSets = new Set(emissionSets.flatMap((set) => set.emissionIds));
  const sets = emissionSets.map((set) => ({
    name: set.name,
    emissions: emissions.filter(({ id }) => set.emissionIds.includes(id)),
  }));
  const others = byWayOut(emissions.filter(({ id }) => !inSets.has(id)));
  return [...sets.flatMap(splitByWayOut), ...others].filter((group) => group.emissions.length > 0);
}

function splitByWayOut(group: Group): Group[] {
  const parts = byWayOut(group.emissions);
  return parts.length === 1 ? [group] : parts;
}

function byWayOut(emissions: readonly Emission[]): Group[] {
  const ways = new Map<string, Emission[]>();
  for (const emission of emissions) {
    const { delivery, numericalAperture, modeFieldDiameterUm } = emission;
    const way = JSON.stringify([delivery, numericalAperture?.value, modeFieldDiameterUm?.value]);
    ways.set(way, [...(ways.get(way) ?? []), emission]);
  }
  return [...ways.values()].map((group) => ({
    name: group.length === 1 ? (group[0]?.label ?? '') : 'all lines',
    emissions: group,
  }));
}

function scenarioOf(
  inputs: LaserInputs,
  ruleSet: RuleSetId,
  { activity, group, index }: Proposal,
): Scenario {
  const { emissions } = group;
  const word = activity === 'operation' ? 'Operation' : 'Alignment';
  const wavelengths = emissions.flatMap(({ wavelengthNm, wavelengthToNm }) =>
    wavelengthToNm ? [wavelengthNm.value, wavelengthToNm.value] : [wavelengthNm.value],
  );
  const scenario: Scenario = {
    id: `${activity}-${index + 1}`,
    activity,
    name: group.name ? `${word}, ${group.name}`.slice(0, 80) : word,
    emissionIds: emissions.map(({ id }) => id),
    atWavelengthNm: {},
    ...exposureFor(wavelengths, activity),
    path: { kind: 'direct' },
  };
  const tunable = emissions.filter(({ wavelengthToNm }) => wavelengthToNm);
  const chosen = tunable.map((emission) => [
    emission.id,
    farthestReachNm(inputs, ruleSet, { scenario, emission }),
  ]);
  return { ...scenario, atWavelengthNm: Object.fromEntries(chosen) as Record<string, number> };
}

/** Looking for the beam, the eye does not turn away from it. */
const ALIGNMENT_S = 10;

/** The engine's proposal for the direct beam; in alignment no aversion is counted on. */
function exposureFor(
  wavelengthsNm: readonly number[],
  activity: Activity,
): Pick<Scenario, 'eyeS' | 'skinS' | 'exposureReason'> {
  const { eyeS, skinS, reason } = proposedExposure(wavelengthsNm, 'direct');
  if (activity !== 'alignment' || eyeS >= ALIGNMENT_S) {
    return { eyeS, skinS, exposureReason: reason };
  }
  return {
    eyeS: ALIGNMENT_S,
    skinS: Math.max(skinS, ALIGNMENT_S),
    exposureReason: '10 s: in alignment people look for the beam, so no aversion is counted on.',
  };
}

/** Wavelengths at which a table of some edition has an edge, nm. */
const EDGES_NM = [
  302.5, 315, 400, 450, 500, 550, 600, 700, 1050, 1150, 1200, 1400, 1500, 1800, 2600,
];

/**
 * Of the ends of the tuning range and the edges of tables inside it, the wavelength that reaches
 * farthest. A start, not the worst case over the range: the situation says at what it was evaluated.
 */
function farthestReachNm(
  inputs: LaserInputs,
  ruleSet: RuleSetId,
  { scenario, emission }: { scenario: Scenario; emission: Emission },
): number {
  const fromNm = emission.wavelengthNm.value;
  const toNm = emission.wavelengthToNm?.value ?? fromNm;
  const inside = EDGES_NM.filter((edge) => edge > fromNm && edge < toNm);
  const reaches = [fromNm, ...inside, toNm].map((wavelengthNm) => {
    const alone = {
      ...scenario,
      emissionIds: [emission.id],
      atWavelengthNm: { [emission.id]: wavelengthNm },
    };
    const built = scenarioCase(inputs, alone, ruleSet);
    const result = built.ok ? evaluate(built.case, { bare: true }) : undefined;
    const reachM = result && isEvaluated(result) ? result.eye.hazardDistanceM : -1;
    return { wavelengthNm, reachM };
  });
  return reaches.reduce((a, b) => (b.reachM > a.reachM ? b : a)).wavelengthNm;
}
