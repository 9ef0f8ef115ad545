import type { Emission, ModelCase } from './case';
import { Dec, ONE, dec } from './decimal';
import type { Side } from './limits';
import { HazardModel, largest, type ModelSideResult } from './model';

/** The numbers of a result by a dotted name, as both model and engine can give them. */
export type Numbers = Readonly<Record<string, number>>;

/** From radiant exposure to irradiance, as the result states it for each kind of emission. */
export function perSecond(emission: Emission, exposureS: number): Dec {
  switch (emission.mode) {
    case 'cw':
      return ONE.div(dec(exposureS));
    case 'single':
      return ONE.div(dec(emission.pulseDurationS));
    case 'repetitive':
      return dec(emission.repetitionRateHz);
    case 'burst':
      return dec(emission.burstRateHz).mul(emission.pulsesPerBurst);
  }
}

/** Every number that the model computes for a case. */
export function modelNumbers(input: ModelCase): Numbers {
  const model = new HazardModel(input);
  return { ...sideNumbers(input, 'eye', model), ...sideNumbers(input, 'skin', model) };
}

function sideNumbers(input: ModelCase, side: Side, model: HazardModel): Numbers {
  const result = model.evaluate(side);
  const exposureS =
    side === 'eye' ? input.exposure.eyeS : (input.exposure.skinS ?? input.exposure.eyeS);
  const numbers: Record<string, number> = {
    [`${side}.opticalDensity`]: result.opticalDensity.toNumber(),
    [`${side}.hazardDistance`]: result.hazardDistanceM.toNumber(),
  };
  if (result.at) numbers[`${side}.at.opticalDensity`] = result.at.opticalDensity.toNumber();
  if (result.aidedHazardDistanceM) {
    numbers[`${side}.aidedHazardDistance`] = result.aidedHazardDistanceM.toNumber();
  }
  result.perBeam.forEach((beam, i) => {
    const rate = perSecond(input.beams[i]!.emission, exposureS);
    Object.assign(numbers, beamNumbers(`${side}.${i}`, beam, rate));
  });
  return numbers;
}

function beamNumbers(
  prefix: string,
  beam: ModelSideResult['perBeam'][number],
  rate: Dec,
): Record<string, number> {
  const { candidate, exposure } = beam.governing;
  const numbers: Record<string, number> = {
    [`${prefix}.mpe.radiantExposure`]: candidate.limit.toNumber(),
    [`${prefix}.mpe.irradiance`]: candidate.limit.mul(rate).toNumber(),
    ...(isOpen(beam)
      ? {}
      : { [`${prefix}.mpe.limitingAperture`]: candidate.apertureMm.toNumber() }),
    [`${prefix}.exposure.radiantExposure`]: exposure.toNumber(),
    [`${prefix}.exposure.irradiance`]: exposure.mul(rate).toNumber(),
    [`${prefix}.exposure.distance`]: beam.distanceM.toNumber(),
    [`${prefix}.opticalDensity`]: beam.opticalDensity.toNumber(),
  };
  if (beam.at) {
    const there = largest(beam.at.compared);
    numbers[`${prefix}.at.radiantExposure`] = there.exposure.toNumber();
    numbers[`${prefix}.at.opticalDensity`] = beam.at.ratio.gt(1)
      ? beam.at.ratio.log(10).toNumber()
      : 0;
  }
  return numbers;
}

/** Whether limits over different apertures govern alike, so that either may be named. */
function isOpen({ governing, all }: ModelSideResult['perBeam'][number]): boolean {
  return all.some(
    ({ candidate, ratio }) =>
      !candidate.apertureMm.eq(governing.candidate.apertureMm) &&
      ratio.div(governing.ratio).gt(1 - 1e-9),
  );
}
