import type { EMISSION_MODES, Emission } from '@shared/model/lasers';
import type { QuantityKind } from '@shared/model/quantity-units';

export type Mode = (typeof EMISSION_MODES)[number];
export type Delivery = Emission['delivery'];

/** Every number of a line that comes with its source. */
export const QUANTITY_NAMES = [
  'wavelengthNm',
  'wavelengthToNm',
  'powerW',
  'operatingPowerW',
  'peakPowerW',
  'pulseEnergyJ',
  'pulseDurationS',
  'repetitionRateHz',
  'pulsesPerBurst',
  'intraBurstRateHz',
  'burstRateHz',
  'diameterMm',
  'diameterYMm',
  'divergenceMrad',
  'divergenceYMrad',
  'sourceMrad',
  'numericalAperture',
  'coreUm',
  'modeFieldDiameterUm',
] as const satisfies readonly (keyof Emission)[];
export type QuantityName = (typeof QUANTITY_NAMES)[number];

/** One number of a line as the form asks for it. */
export interface QuantitySpec {
  readonly name: QuantityName;
  readonly label: string;
  /** Absent for a plain number. */
  readonly kind?: QuantityKind;
  readonly hint?: string;
  readonly optional?: boolean;
}

export const MODE_WORDS: Readonly<Record<Mode, string>> = {
  cw: 'Continuous (CW)',
  single: 'Single pulse',
  repetitive: 'Repetitive pulses',
  'mode-locked': 'Mode-locked',
  burst: 'Bursts of pulses',
  modulated: 'Modulated',
};

export const DELIVERY_WORDS: Readonly<Record<Delivery, string>> = {
  beam: 'Free beam',
  'multimode-fiber': 'Multimode fiber, open end',
  'single-mode-fiber': 'Single-mode fiber, open end',
};

const ENERGY: QuantitySpec = { name: 'pulseEnergyJ', label: 'Pulse energy', kind: 'energy' };
const DURATION: QuantitySpec = {
  name: 'pulseDurationS',
  label: 'Pulse duration',
  kind: 'duration',
  hint: 'Full width at half maximum',
};
const RATE: QuantitySpec = { name: 'repetitionRateHz', label: 'Repetition rate', kind: 'rate' };
const MEAN: QuantitySpec = { name: 'powerW', label: 'Mean power', kind: 'power' };
const PEAK: QuantitySpec = {
  name: 'peakPowerW',
  label: 'Peak power',
  kind: 'power',
  optional: true,
};
const USUAL: QuantitySpec = {
  name: 'operatingPowerW',
  label: 'Usually set to',
  kind: 'power',
  hint: 'The maximum is evaluated',
  optional: true,
};

/** What each mode asks for. The pulse energy may be given as a mean or a peak power instead. */
export const MODE_FIELDS: Readonly<Record<Mode, readonly QuantitySpec[]>> = {
  cw: [{ name: 'powerW', label: 'Power, maximum', kind: 'power' }, USUAL],
  single: [{ ...ENERGY, hint: 'Or the peak power' }, DURATION, PEAK],
  repetitive: [
    { ...ENERGY, hint: 'Or the mean power' },
    DURATION,
    RATE,
    { ...MEAN, hint: 'In place of the pulse energy', optional: true },
    PEAK,
  ],
  'mode-locked': [MEAN, DURATION, RATE, { ...ENERGY, optional: true }, USUAL],
  burst: [
    { ...ENERGY, hint: 'Of one pulse, or the mean power' },
    DURATION,
    { name: 'pulsesPerBurst', label: 'Pulses in a burst' },
    { name: 'intraBurstRateHz', label: 'Rate inside a burst', kind: 'rate' },
    { name: 'burstRateHz', label: 'Rate of the bursts', kind: 'rate' },
    { ...MEAN, hint: 'In place of the pulse energy', optional: true },
  ],
  modulated: [
    { ...PEAK, optional: false, hint: 'The highest power' },
    { ...MEAN, optional: true },
    { ...DURATION, label: 'On-time', hint: 'With the rate; else evaluated as CW', optional: true },
    { ...RATE, label: 'Modulation rate', optional: true },
    USUAL,
  ],
};

const NUMERICAL_APERTURE: QuantitySpec = {
  name: 'numericalAperture',
  label: 'Numerical aperture',
  hint: 'For example 0.22',
};

/** What each way out asks for beside widths and angles of a free beam. */
export const FIBER_FIELDS: Readonly<Record<Delivery, readonly QuantitySpec[]>> = {
  beam: [],
  'multimode-fiber': [
    NUMERICAL_APERTURE,
    { name: 'coreUm', label: 'Core diameter', kind: 'micrometers', optional: true },
  ],
  'single-mode-fiber': [
    { name: 'modeFieldDiameterUm', label: 'Mode-field diameter', kind: 'micrometers' },
    { ...NUMERICAL_APERTURE, hint: 'When the mode field is not known', optional: true },
  ],
};

/** The numbers that a line in this mode and with this way out has. */
export function quantitiesOf(line: {
  readonly mode: Mode;
  readonly delivery: Delivery;
  readonly isTunable: boolean;
  readonly isElliptical: boolean;
}): readonly QuantityName[] {
  const names = (specs: readonly QuantitySpec[]) => specs.map(({ name }) => name);
  const free: readonly QuantityName[] = ['diameterMm', 'divergenceMrad', 'sourceMrad'];
  const second: readonly QuantityName[] = ['diameterYMm', 'divergenceYMrad'];
  const isFree = line.delivery === 'beam';
  return [
    'wavelengthNm',
    ...(line.isTunable ? (['wavelengthToNm'] as const) : []),
    ...names(MODE_FIELDS[line.mode]),
    ...names(FIBER_FIELDS[line.delivery]),
    ...(isFree ? free : []),
    ...(isFree && line.isElliptical ? second : []),
  ];
}
