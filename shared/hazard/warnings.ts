import { factorRowAt, durationRowAt } from './factors/factor-value';
import { oneOverEWidths } from './geometry/beam-shape';
import { LONGEST_S } from './limits/compiled-rule-set';
import { ruleSetById } from './rule-sets';
import type { Provenance } from './rule-sets/limit-table';
import type { Warning } from './result';
import { withGrowth, type Scene, type SceneBeam } from './scene';
import { reachOfSide, type BeamHazard, type SideHazard } from './side-hazard';
import { SOURCES } from './sources';

/** What the reader of a result must know. */
export function warningsOf(scene: Scene, eye: SideHazard, skin: SideHazard): Warning[] {
  const warnings = new Map<string, Warning>();
  const warn = (code: Warning['code'], text: string) => warnings.set(text, { code, text });
  warnOfEdition(scene, warn);
  for (const hazard of [...eye.worst, ...skin.worst]) {
    warnOfDuration(scene, hazard, warn);
    warnOfConfidence(scene, hazard, warn);
    warnOfArea(hazard, warn);
  }
  if (scene.path.kind === 'direct') {
    for (const beam of scene.beams) warnOfDiffraction(beam, warn);
    for (const side of [eye, skin]) warnOfGrowth(scene, side, warn);
  }
  return [...warnings.values()];
}

type Warn = (code: Warning['code'], text: string) => void;

function warnOfEdition({ rules: { ruleSet } }: Scene, warn: Warn): void {
  if (ruleSet.supersededBy === undefined) return;
  const successor = ruleSetById(ruleSet.supersededBy as unknown);
  warn(
    'superseded-edition',
    `${ruleSet.edition} is superseded by ${successor?.edition ?? ruleSet.supersededBy}. Use it only to read and re-check old evaluations.`,
  );
}

function warnOfDuration({ rules }: Scene, { situation, governing }: BeamHazard, warn: Warn): void {
  const { shortestS } = situation.point;
  const { edition } = rules.ruleSet;
  if (governing.durationS < shortestS) {
    warn(
      'outside-validity',
      `The tables of ${edition} end at ${shortestS} s. For ${governing.durationS} s the irradiance of the limit at ${shortestS} s is kept.`,
    );
  }
  if (governing.durationS > LONGEST_S) {
    warn(
      'extrapolated',
      `The tables of ${edition} end at ${LONGEST_S} s; the limit is read there.`,
    );
  }
}

function warnOfConfidence(scene: Scene, hazard: BeamHazard, warn: Warn): void {
  const { wavelengthNm } = hazard.situation.point;
  for (const { what, provenance } of rowsUsed(scene, hazard)) {
    const { confidence, source } = provenance;
    if (confidence !== 'memory-low' && confidence !== 'memory-medium') continue;
    const certainty = confidence === 'memory-low' ? 'low' : 'medium';
    warn(
      'low-confidence-row',
      `At ${wavelengthNm} nm the ${what} was written down from memory with ${certainty} certainty and not yet held against the document: ${SOURCES[source].cite}.`,
    );
  }
}

/** The rows that made the governing limit. */
function rowsUsed(
  { rules: { ruleSet } }: Scene,
  { situation, governing }: BeamHazard,
): { what: string; provenance: Provenance }[] {
  const { point, emission } = situation;
  const { row, durationS } = governing;
  const used: { what: string; provenance: Provenance }[] = [
    { what: `${row.mechanism} limit`, provenance: row.printed },
  ];
  if (row.reference)
    used.push({ what: 'reference to the limit of the skin', provenance: row.reference });
  const aperture = durationRowAt(
    row.isAnteriorCap ? point.band.skinApertures : point.band.apertures,
    point.wavelengthNm,
    durationS,
  );
  if (aperture !== undefined) used.push({ what: 'limiting aperture', provenance: aperture });
  for (const symbol of row.printed.factors ?? []) {
    if (symbol === 'CE' || symbol === 'T2^-1/4') continue;
    const factor = factorRowAt(ruleSet.factors[symbol], point.wavelengthNm);
    if (factor !== undefined) {
      used.push({ what: `factor ${ruleSet.factors.symbols[symbol]}`, provenance: factor });
    }
  }
  const isTrain = emission.mode === 'repetitive' || emission.mode === 'burst';
  // Why: that no branch reduced the limit is as uncertain as the branches are.
  const branch = isTrain ? (governing.train?.branch ?? point.band.pulseTrain[0]) : undefined;
  if (branch !== undefined) {
    const { CP } = ruleSet.factors.symbols;
    used.push({ what: `rule for pulse trains (${CP})`, provenance: branch });
  }
  return used;
}

function warnOfArea({ governing }: BeamHazard, warn: Warn): void {
  const { exposedAreaUpToM2 } = governing.row.printed;
  if (exposedAreaUpToM2 === undefined) return;
  warn(
    'assumption',
    `The limit of the skin holds for exposed areas up to ${exposedAreaUpToM2} m²; larger ones have a lower limit, which is not evaluated.`,
  );
}

/** A Gaussian beam cannot spread less than diffraction makes it. */
function warnOfDiffraction({ beam }: SceneBeam, warn: Warn): void {
  if (beam.profile === 'top-hat') return;
  const { diameterMm = 0, divergenceMrad = 0, waistDistanceM = 0, m2 = 1 } = beam;
  const diameters = oneOverEWidths(beam, diameterMm);
  const divergences = oneOverEWidths(beam, divergenceMrad);
  for (const axis of [0, 1] as const) {
    const phi = divergences[axis] * Math.SQRT2 * 1e-3;
    const exit = diameters[axis] * Math.SQRT2 * 1e-3;
    const waist = Math.sqrt(Math.max(0, exit ** 2 - (phi * waistDistanceM) ** 2));
    const smallest = (4 * beam.wavelengthNm * 1e-9 * m2) / (Math.PI * waist);
    if (phi >= smallest * (1 - 1e-9)) continue;
    warn(
      'below-diffraction-limit',
      `${beam.label ?? `The beam of ${beam.wavelengthNm} nm`} spreads less than diffraction allows: ${rounded(phi * 1e3)} mrad against at least ${rounded(smallest * 1e3)} mrad (1/e² full angle) for its waist of ${rounded(waist * 1e3)} mm.`,
    );
  }
}

function warnOfGrowth(
  scene: Scene,
  { side, worst, hazardDistanceM }: SideHazard,
  warn: Warn,
): void {
  const growth = scene.model.growth === 'linear' ? 'hyperbolic' : 'linear';
  const otherM = reachOfSide(withGrowth(scene, growth), side, worst);
  if (!(otherM > 1.01 * hazardDistanceM)) return;
  warn(
    'growth-model',
    `With ${growth} growth the hazard distance of the ${side} is ${rounded(otherM)} m, against ${rounded(hazardDistanceM)} m here.`,
  );
}

function rounded(value: number): string {
  return String(Number(value.toPrecision(4)));
}
