import type { Beam } from './case';
import { durationRowAt } from './factors/factor-value';
import { isUncertain, LONGEST_S } from './limits/compiled-rule-set';
import { ruleSetById } from './rule-sets';
import type { Provenance } from './rule-sets/limit-table';
import type { Warning } from './result';
import { withGrowth, type Scene, type SceneBeam } from './scene';
import { reachOfSide, type BeamHazard, type SideHazard } from './side-hazard';
import { SOURCES } from './sources';

/** What the reader of a result must know. */
export function warningsOf(scene: Scene, eye: SideHazard, skin: SideHazard): Warning[] {
  const warnings: Warning[] = [];
  warnOfEdition(warnings, scene);
  warnOfSide(warnings, scene, eye);
  warnOfSide(warnings, scene, skin);
  if (scene.path.kind === 'direct') {
    for (const beam of scene.beams) warnOfDiffraction(warnings, beam);
    warnOfGrowth(warnings, scene, eye);
    warnOfGrowth(warnings, scene, skin);
  }
  return warnings;
}

function warnOfSide(warnings: Warning[], scene: Scene, { worst }: SideHazard): void {
  for (const hazard of worst) {
    warnOfDuration(warnings, scene, hazard);
    if (isUncertainLimit(hazard)) warnOfUncertainty(warnings, scene, hazard);
    if (hazard.governing.row.printed.exposedAreaUpToM2 !== undefined) warnOfArea(warnings, hazard);
  }
}

/** Adds a warning once. */
function warn(warnings: Warning[], code: Warning['code'], text: string): void {
  if (!warnings.some((known) => known.text === text)) warnings.push({ code, text });
}

function warnOfEdition(warnings: Warning[], { rules: { ruleSet } }: Scene): void {
  if (ruleSet.supersededBy === undefined) return;
  const successor = ruleSetById(ruleSet.supersededBy as unknown);
  warn(
    warnings,
    'superseded-edition',
    `${ruleSet.edition} is superseded by ${successor?.edition ?? ruleSet.supersededBy}. Use it only to read and re-check old evaluations.`,
  );
}

function warnOfDuration(
  warnings: Warning[],
  { rules }: Scene,
  { situation, sceneBeam, governing }: BeamHazard,
): void {
  const { shortestS } = situation.point;
  const { edition } = rules.ruleSet;
  // A pulse outside the tables is said even where another rule governs.
  const { isPulsed, pulseS } = sceneBeam.timing;
  const durationS = isPulsed ? pulseS : governing.durationS;
  if (durationS < shortestS) {
    warn(
      warnings,
      'outside-validity',
      `The tables of ${edition} end at ${shortestS} s. For ${durationS} s the irradiance of the limit at ${shortestS} s is kept.`,
    );
  }
  if (governing.durationS > LONGEST_S) {
    warn(
      warnings,
      'extrapolated',
      `The tables of ${edition} end at ${LONGEST_S} s; the limit is read there.`,
    );
  }
}

function isUncertainLimit({ situation, sceneBeam, governing }: BeamHazard): boolean {
  const isTrain = sceneBeam.timing.meanRateHz > 0;
  return governing.row.isUncertain || (isTrain && situation.point.band.hasUncertainTrain);
}

function warnOfUncertainty(warnings: Warning[], scene: Scene, hazard: BeamHazard): void {
  const { wavelengthNm } = hazard.situation.point;
  for (const { what, provenance } of rowsUsed(scene, hazard)) {
    const { confidence, source } = provenance;
    if (!isUncertain(provenance)) continue;
    const certainty = confidence === 'memory-low' ? 'low' : 'medium';
    warn(
      warnings,
      'low-confidence-row',
      `At ${wavelengthNm} nm the ${what} was written down from memory with ${certainty} certainty and not yet held against the document: ${SOURCES[source].cite}.`,
    );
  }
}

/** The rows that made the governing limit. */
function rowsUsed(
  { rules: { ruleSet } }: Scene,
  { situation, governing, sceneBeam }: BeamHazard,
): { what: string; provenance: Provenance }[] {
  const { point } = situation;
  const { row, durationS } = governing;
  const used: { what: string; provenance: Provenance }[] = [
    { what: `${row.mechanism} limit`, provenance: row.printed },
  ];
  if (row.reference)
    used.push({ what: 'reference to the limit of the skin', provenance: row.reference });
  const aperture = durationRowAt(row.apertures, durationS);
  if (aperture !== undefined) used.push({ what: 'limiting aperture', provenance: aperture });
  for (const { symbol, row: factor } of row.factors) {
    if (factor === undefined) continue;
    used.push({ what: `factor ${ruleSet.factors.symbols[symbol]}`, provenance: factor });
  }
  const isTrain = sceneBeam.timing.meanRateHz > 0;
  // Why: that no branch reduced the limit is as uncertain as the branches are.
  const branch = isTrain ? (governing.train?.branch ?? point.band.pulseTrain[0]) : undefined;
  if (branch !== undefined) {
    const { CP } = ruleSet.factors.symbols;
    used.push({ what: `rule for pulse trains (${CP})`, provenance: branch });
  }
  if (isTrain && point.band.ti !== undefined) {
    used.push({ what: 'time within which pulses count as one', provenance: point.band.ti });
  }
  return used;
}

function warnOfArea(warnings: Warning[], { governing }: BeamHazard): void {
  const { exposedAreaUpToM2 } = governing.row.printed;
  warn(
    warnings,
    'assumption',
    `The limit of the skin holds for exposed areas up to ${exposedAreaUpToM2} m²; larger ones have a lower limit, which is not evaluated.`,
  );
}

/** A Gaussian beam cannot spread less than diffraction makes it. */
function warnOfDiffraction(warnings: Warning[], { beam, field }: SceneBeam): void {
  if (field.kind === 'surface' || field.profile === 'top-hat') return;
  warnOfAxis(warnings, beam, field.dx, field.phix);
  if (!field.isCircular) warnOfAxis(warnings, beam, field.dy, field.phiy);
}

function warnOfAxis(warnings: Warning[], beam: Beam, diameterM: number, phiRad: number): void {
  const { wavelengthNm, waistDistanceM = 0, m2 = 1 } = beam;
  const waistM = Math.sqrt(diameterM ** 2 - (phiRad * waistDistanceM) ** 2);
  // 1/e widths: half of what the product of both is at the 1/e² points.
  const smallestRad = (2 * wavelengthNm * 1e-9 * m2) / (Math.PI * waistM);
  // Why: a beam that is given at the limit itself may miss it by a rounding error.
  if (phiRad >= smallestRad * (1 - 1e-9)) return;
  const [phi, smallest, waist] = [phiRad, smallestRad, waistM].map((value) =>
    rounded(value * Math.SQRT2 * 1e3),
  );
  warn(
    warnings,
    'below-diffraction-limit',
    `${beam.label ?? `The beam of ${wavelengthNm} nm`} spreads less than diffraction allows: ${phi} mrad against at least ${smallest} mrad (full angle at 1/e²) for its waist of ${waist} mm.`,
  );
}

/** How much farther the other growth must reach before it is worth a warning. */
const NOTABLY_FARTHER = 1.01;

function warnOfGrowth(
  warnings: Warning[],
  scene: Scene,
  { side, worst, hazardDistanceM }: SideHazard,
): void {
  const growth = scene.model.growth === 'linear' ? 'hyperbolic' : 'linear';
  // Linear growth is the wider everywhere unless a waist lies ahead: it reaches less far.
  if (growth === 'linear' && !scene.beams.some(hasWaistAhead)) return;
  const otherM = reachOfSide(withGrowth(scene, growth), side, worst);
  if (!(otherM > NOTABLY_FARTHER * hazardDistanceM)) return;
  warn(
    warnings,
    'growth-model',
    `With ${growth} growth the hazard distance of the ${side} is ${rounded(otherM)} m, against ${rounded(hazardDistanceM)} m here.`,
  );
}

function hasWaistAhead({ field }: SceneBeam): boolean {
  return field.kind === 'beam' && field.waistM > 0;
}

function rounded(value: number): string {
  return String(Number(value.toPrecision(4)));
}
