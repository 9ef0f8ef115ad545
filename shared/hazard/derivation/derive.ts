import {
  PLANCK_CONSTANT_J_S,
  ELEMENTARY_CHARGE_C,
  photonOf,
  SPEED_OF_LIGHT_M_PER_S,
} from '../photon';
import type { Step } from '../result';
import { hasSpot, type Scene } from '../scene';
import { largestPerTissue } from '../limit-terms';
import { combinedDensity, sharesOf, type BeamHazard, type SideHazard } from '../side-hazard';
import { writeAidedDistance, writeHazardDistance } from './distance-steps';
import { ASKED, writeExposure, writeField, writeSpot, WORST } from './exposure-steps';
import { writeLimit } from './limit-steps';
import { StepWriter } from './step-writer';

/**
 * The derivation of a result, step by step: for the eye, then for the skin; beam by beam the limit,
 * the worst exposure and the optical density, then the distances of all beams.
 */
export function derive(scene: Scene, eye: SideHazard, skin: SideHazard): Step[] {
  const steps: Step[] = [];
  for (const hazard of [eye, skin]) writeSide(steps, scene, hazard);
  return steps;
}

function writeSide(steps: Step[], scene: Scene, hazard: SideHazard): void {
  const { side, worst, at } = hazard;
  const all = new StepWriter(steps, { side });
  const beams = worst.map((beamHazard, beam) => {
    const writer = new StepWriter(steps, { side, beam });
    if (side === 'eye') writePhoton(writer, beamHazard);
    writeField(writer, scene.path, beamHazard.sceneBeam);
    if (hasSpot(beamHazard.sceneBeam)) writeSpot(writer, beamHazard, 'r_0');
    writeLimit(writer, scene.rules.ruleSet, beamHazard);
    writeExposure(writer, beamHazard, WORST);
    return writer;
  });
  if (worst.length > 1) writeCombined(all, worst, 'OD');
  writeHazardDistance({ scene, hazard, beams, all });
  writeAidedDistance({ scene, hazard, beams, all });
  if (at === undefined) return;
  at.forEach((beamHazard, i) => writeAt(beams[i] as StepWriter, scene, beamHazard));
  if (at.length > 1) writeCombined(all, at, 'OD_at');
}

function writePhoton(writer: StepWriter, { sceneBeam }: BeamHazard): void {
  const { wavelengthNm } = sceneBeam.beam;
  const { photonEnergyJ, photonEnergyEv, frequencyHz } = photonOf(wavelengthNm);
  writer.know('lambda', wavelengthNm);
  writer.know('c', SPEED_OF_LIGHT_M_PER_S);
  writer.know('h', PLANCK_CONSTANT_J_S);
  writer.know('q_e', ELEMENTARY_CHARGE_C);
  const source = 'si-2019';
  writer.write({
    symbol: 'nu',
    what: 'Frequency of the light',
    formula: 'c/(lambda*1e-9)',
    value: frequencyHz,
    unit: 'Hz',
    source,
  });
  writer.write({
    symbol: 'E_ph',
    what: 'Energy of one photon',
    formula: 'h*nu',
    value: photonEnergyJ,
    unit: 'J',
    source,
  });
  writer.write({
    symbol: 'E_eV',
    what: 'The same in electronvolts',
    formula: 'E_ph/q_e',
    value: photonEnergyEv,
    unit: 'eV',
    source,
  });
}

function writeAt(writer: StepWriter, scene: Scene, hazard: BeamHazard): void {
  writer.know('mu', scene.attenuationPerM);
  if (hasSpot(hazard.sceneBeam)) writeSpot(writer, hazard, 'r_at');
  writeLimit(writer, scene.rules.ruleSet, hazard);
  writeExposure(writer, hazard, ASKED);
}

/** The density for all beams at once: of the tissue where exposure over limit adds up most. */
function writeCombined(writer: StepWriter, hazards: readonly BeamHazard[], symbol: string): void {
  const sums = new Map<string, number[]>();
  for (const hazard of hazards) {
    for (const [tissue, ratio] of largestPerTissue(sharesOf(hazard))) {
      sums.set(tissue, [...(sums.get(tissue) ?? []), ratio]);
    }
  }
  const names = [...sums].map(([tissue, ratios], i) => {
    const name = `S_${symbol}_${i + 1}`;
    ratios.forEach((ratio, beam) => writer.know(`s_${beam + 1}`, ratio));
    writer.write({
      symbol: name,
      what: `Exposure over limit, summed over the beams that reach the same tissue (${tissue})`,
      formula: ratios.map((_, beam) => `s_${beam + 1}`).join('+'),
      value: ratios.reduce((sum, ratio) => sum + ratio, 0),
      unit: '1',
      source: 'bgi-832:1',
    });
    return name;
  });
  writer.write({
    symbol,
    what: 'Optical density for all beams at once',
    formula: `max(0,log10(${names.length > 1 ? `max(${names.join(',')})` : names[0]}))`,
    value: combinedDensity(hazards),
    unit: '1',
    source: 'engine:reading',
  });
}
