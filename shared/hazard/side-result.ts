import { factorsOf } from './factors-used';
import { comparableLimit } from './limit-terms';
import { printCandidate } from './derivation/print-candidate';
import { photonOf } from './photon';
import { irradiancePerExposure } from './pulses/emission-timing';
import type { LimitCandidate as Candidate } from './pulses/limit-candidates';
import type { BeamExposure, BeamResult, LimitCandidate, SideResult } from './result';
import { meanExposure, type Scene } from './scene';
import { combinedDensity, opticalDensity, type BeamHazard, type SideHazard } from './side-hazard';
import { SOURCES } from './sources';

/** One side as it is answered. */
export function sideResult(scene: Scene, hazard: SideHazard, bare: boolean): SideResult {
  const { worst, at, hazardDistanceM, aidedHazardDistanceM } = hazard;
  const result: SideResult = {
    perBeam: worst.map((beam, i) => beamResult(scene, beam, at?.[i], bare)),
    hazardDistanceM,
    opticalDensity: combinedDensity(worst),
  };
  if (at !== undefined) result.at = { opticalDensity: combinedDensity(at) };
  if (aidedHazardDistanceM !== undefined) result.aidedHazardDistanceM = aidedHazardDistanceM;
  return result;
}

function beamResult(
  scene: Scene,
  hazard: BeamHazard,
  at: BeamHazard | undefined,
  bare: boolean,
): BeamResult {
  const { beam, timing } = hazard.sceneBeam;
  const { governing, situation } = hazard;
  const { photonEnergyJ, photonEnergyEv, frequencyHz } = photonOf(beam.wavelengthNm);
  const perExposure = irradiancePerExposure(timing, governing.durationS);
  const result: BeamResult = {
    wavelengthNm: beam.wavelengthNm,
    photonEnergyJ,
    photonEnergyEv,
    frequencyHz,
    mpe: {
      radiantExposureJPerM2: governing.limit,
      irradianceWPerM2: governing.limit * perExposure,
      durationS: governing.durationS,
      rule: governing.rule,
      mechanism: governing.row.mechanism,
      limitingApertureMm: governing.apertureM * 1e3,
      factors: factorsOf(scene.rules.ruleSet, situation, governing),
    },
    exposure: exposureResult(hazard),
    opticalDensity: opticalDensity(hazard.ratio),
  };
  if (!bare) {
    result.mpe.candidates = hazard.candidates.map((candidate) =>
      candidateResult(scene, hazard, candidate),
    );
  }
  if (at !== undefined) {
    result.at = { ...exposureResult(at), opticalDensity: opticalDensity(at.ratio) };
  }
  return beam.label === undefined ? result : { label: beam.label, ...result };
}

/** The exposure in both quantities: CW over the exposure, pulses each. */
function exposureResult({ sceneBeam, situation, exposure, distanceM }: BeamHazard): BeamExposure {
  const { timing } = sceneBeam;
  return timing.isPulsed
    ? {
        radiantExposureJPerM2: exposure,
        irradianceWPerM2: exposure * irradiancePerExposure(timing, timing.pulseS),
        distanceM,
      }
    : {
        radiantExposureJPerM2: exposure * situation.exposureS,
        irradianceWPerM2: exposure,
        distanceM,
      };
}

function candidateResult(
  { rules }: Scene,
  { sceneBeam, situation, distanceM }: BeamHazard,
  candidate: Candidate,
): LimitCandidate {
  const { row, durationS, apertureM, limit } = candidate;
  const { symbols } = rules.ruleSet.factors;
  const exposure = meanExposure(sceneBeam, apertureM, distanceM);
  return {
    rule: candidate.rule,
    mechanism: row.mechanism,
    value: limit,
    unit: 'J/m2',
    durationS,
    limitingApertureMm: apertureM * 1e3,
    exposureToLimit: exposure / comparableLimit(candidate),
    formula: printCandidate(candidate, situation.point, symbols),
    source: SOURCES[(row.reference ?? row.printed).source].cite,
  };
}
