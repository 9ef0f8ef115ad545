import type { FieldError } from '@shared/model/problem';

/** What to enter where a field is empty, by the last name of its path. */
const MISSING: Readonly<Record<string, string>> = {
  eyeS: 'Enter how long the eye is exposed, for example 0.25 s.',
  focalLengthMm: 'Enter the focal length, for example 100 mm.',
  numericalAperture: 'Enter the numerical aperture, more than 0 and less than 1, for example 0.22.',
  modeFieldDiameterUm: 'Enter the mode-field diameter, for example 5.6 µm.',
  reflectance: 'Enter the reflectance, more than 0 and up to 1.',
  angleDeg: 'Enter the viewing angle from 0° to below 90°.',
  objectiveMm: 'Enter the diameter of the objective, for example 50 mm.',
  magnification: 'Enter the magnification, 1 or more.',
  transmission: 'Enter the transmission, more than 0 and up to 1.',
  wavelengthNm: 'Enter the wavelength, for example 532 nm.',
  powerW: 'Enter the power, for example 5 mW.',
  pulseEnergyJ: 'Enter the energy of one pulse, for example 2 mJ.',
  pulseDurationS: 'Enter the pulse duration, for example 10 ns.',
  repetitionRateHz: 'Enter the repetition rate, for example 1 kHz.',
  pulsesPerBurst: 'Enter the number of pulses in a burst.',
  intraBurstRateHz: 'Enter the rate inside a burst, for example 50 MHz.',
  burstRateHz: 'Enter the rate of the bursts, for example 100 kHz.',
  diameterMm: 'Enter the beam diameter, for example 2.3 mm.',
  divergenceMrad: 'Enter the full divergence, for example 0.5 mrad.',
};

/** Errors whose words are those of the schema's machinery get ours instead. */
export function inOurWords(errors: readonly FieldError[]): FieldError[] {
  return errors.map((error) => {
    if (!/^(Invalid input|Too (small|big))/.test(error.message)) return error;
    return {
      ...error,
      message: MISSING[lastName(error.path)] ?? 'Enter a value that this field allows.',
    };
  });
}

/** The label of a field on the bench, by the last name of its path. */
const LABELS: Readonly<Record<string, string>> = {
  eyeS: 'Exposure, eye',
  skinS: 'Exposure, skin',
  exposureReason: 'Why this duration',
  name: 'Name of the situation',
  emissionIds: 'Lines on together',
  focalLengthMm: 'Focal length',
  diameterAtLensMm: 'Beam at the lens',
  numericalAperture: 'Numerical aperture',
  modeFieldDiameterUm: 'Mode-field diameter',
  reflectance: 'Reflectance',
  angleDeg: 'Viewing angle',
  spotMm: 'Lit spot',
  objectiveMm: 'Objective',
  magnification: 'Magnification',
  transmission: 'Transmission',
  attenuationPerKm: 'Attenuation of the air',
  atDistanceM: 'Also at this distance',
  wavelengthNm: 'Wavelength',
  powerW: 'Power',
  pulseEnergyJ: 'Pulse energy',
  pulseDurationS: 'Pulse duration',
  repetitionRateHz: 'Repetition rate',
  pulsesPerBurst: 'Pulses in a burst',
  intraBurstRateHz: 'Rate in a burst',
  burstRateHz: 'Rate of bursts',
  diameterMm: 'Diameter, exit',
  diameterYMm: 'Diameter, y',
  divergenceMrad: 'Divergence, full',
  divergenceYMrad: 'Divergence, y',
  sourceMrad: 'Apparent source',
  sourceYMrad: 'Source, y',
  waistDistanceM: 'Waist from the exit',
  m2: 'M²',
};

/** The sentence of an error with the label of its field in front, for a list away from the field. */
export function labeledMessage({ path, message }: FieldError): string {
  const label = LABELS[lastName(path)];
  return label ? `${label}: ${message}` : message;
}

function lastName(path: string): string {
  return /([A-Za-z0-9]+)(?:\[\d+\])*$/.exec(path)?.[1] ?? '';
}
