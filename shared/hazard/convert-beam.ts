import type { Emission, PerAxis } from './case';

/** A converted number, and the conversion as a sentence and as plain mathematics. */
export interface Conversion {
  readonly value: number;
  readonly formula: string;
  readonly substituted: string;
  readonly sentence: string;
}

/** A converted emission, with each number that was converted. */
export interface EmissionConversion {
  readonly emission: Emission;
  readonly conversions: readonly Conversion[];
}

/**
 * The width of a Gaussian between its 1/e² points, from its full width at half maximum.
 *
 * @param fwhm any length or angle, above 0.
 * @source engine:geometry
 * @example oneOverE2FromFwhm(1).value // 1.699
 */
export function oneOverE2FromFwhm(fwhm: number): Conversion {
  return {
    value: fwhm * Math.sqrt(2 / Math.log(2)),
    formula: 'D_FWHM*sqrt(2/log(2))',
    substituted: `${fwhm}*sqrt(2/log(2))`,
    sentence: 'A Gaussian is 1.699 times as wide between its 1/e² points as at half maximum.',
  };
}

/**
 * The width of a Gaussian between its 1/e points, from its full width at half maximum.
 *
 * @param fwhm any length or angle, above 0.
 * @source engine:geometry
 * @example oneOverEFromFwhm(1).value // 1.201
 */
export function oneOverEFromFwhm(fwhm: number): Conversion {
  return {
    value: fwhm / Math.sqrt(Math.log(2)),
    formula: 'D_FWHM/sqrt(log(2))',
    substituted: `${fwhm}/sqrt(log(2))`,
    sentence: 'A Gaussian is 1.201 times as wide between its 1/e points as at half maximum.',
  };
}

/**
 * A full angle from a half angle.
 *
 * @example fullFromHalfAngle(0.4).value // 0.8
 */
export function fullFromHalfAngle(halfAngle: number): Conversion {
  return {
    value: 2 * halfAngle,
    formula: '2*theta',
    substituted: `2*${halfAngle}`,
    sentence: 'The data sheet gives the half angle; divergence is the full angle.',
  };
}

/**
 * The energy of a pulse, J, from mean power, W, and repetition rate, Hz.
 *
 * @example pulseEnergyFromMeanPower(2, 1000).value // 0.002
 */
export function pulseEnergyFromMeanPower(meanPowerW: number, repetitionRateHz: number): Conversion {
  return {
    value: meanPowerW / repetitionRateHz,
    formula: 'P_mean/f',
    substituted: `${meanPowerW}/${repetitionRateHz}`,
    sentence: 'The pulse energy is the mean power divided by the repetition rate.',
  };
}

/** The emission of a mode-locked laser, from its mean power, rate and pulse duration. */
export function modeLockedEmission(laser: {
  readonly meanPowerW: number;
  readonly repetitionRateHz: number;
  readonly pulseDurationS: number;
}): EmissionConversion {
  const energy = pulseEnergyFromMeanPower(laser.meanPowerW, laser.repetitionRateHz);
  return {
    emission: {
      mode: 'repetitive',
      pulseEnergyJ: energy.value,
      pulseDurationS: laser.pulseDurationS,
      repetitionRateHz: laser.repetitionRateHz,
    },
    conversions: [energy],
  };
}

/**
 * The emission of a laser that is switched on and off, from its peak power, its rate and either the
 * on-time or the duty (the part of the period that it is on, above 0 and up to 1).
 */
export function modulatedEmission(
  laser: { readonly peakPowerW: number; readonly modulationRateHz: number } & (
    { readonly duty: number } | { readonly onTimeS: number }
  ),
): EmissionConversion {
  const { peakPowerW, modulationRateHz } = laser;
  const conversions: Conversion[] = [];
  let onTimeS: number;
  if ('duty' in laser) {
    onTimeS = laser.duty / modulationRateHz;
    conversions.push({
      value: onTimeS,
      formula: 'duty/f',
      substituted: `${laser.duty}/${modulationRateHz}`,
      sentence: 'Each pulse lasts the duty divided by the modulation rate.',
    });
  } else {
    onTimeS = laser.onTimeS;
  }
  const pulseEnergyJ = peakPowerW * onTimeS;
  conversions.push({
    value: pulseEnergyJ,
    formula: 'P_peak*t_p',
    substituted: `${peakPowerW}*${onTimeS}`,
    sentence: 'The pulse energy is the peak power times the duration of the pulse.',
  });
  return {
    emission: {
      mode: 'repetitive',
      pulseEnergyJ,
      pulseDurationS: onTimeS,
      repetitionRateHz: modulationRateHz,
    },
    conversions,
  };
}

/** Converts one number, or both axes, and keeps the conversion of the first. */
export function convertAxes(
  value: PerAxis,
  convert: (axis: number) => Conversion,
): { readonly value: PerAxis; readonly conversion: Conversion } {
  if (typeof value === 'number') {
    const conversion = convert(value);
    return { value: conversion.value, conversion };
  }
  const conversion = convert(value[0]);
  return { value: [conversion.value, convert(value[1]).value], conversion };
}
