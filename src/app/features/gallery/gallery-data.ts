import type { ExposureChartModel } from '@shared/drawing/exposure-chart';
import type { Reach } from '@shared/drawing/reach';
import type { SwatchLine } from '@shared/drawing/line-swatch';
import type { Problem } from '@shared/model/problem';

/** States of the strip, each with the words that say what to look at. */
// prettier-ignore
export const REACHES: readonly { readonly name: string; readonly reach: Reach }[] = [
  { name: 'Ordinary: skin ends before the wall', reach: { skinDistanceM: 7.9, eyeDistanceM: 165, aidedDistanceM: 978, wallDistanceM: 8.4 } },
  { name: 'Nowhere above the limit', reach: { skinDistanceM: 0, eyeDistanceM: 0, wallDistanceM: 8.4 } },
  { name: 'Eye and skin end together, no aided lane', reach: { skinDistanceM: 249, eyeDistanceM: 249, aidedDistanceM: 249, wallDistanceM: 24 } },
  { name: 'Eye only', reach: { skinDistanceM: 0, eyeDistanceM: 9.48, aidedDistanceM: 64.6, wallDistanceM: 8 } },
  { name: 'Beyond the axis', reach: { skinDistanceM: 5870, eyeDistanceM: 133_000, aidedDistanceM: 480_000, wallDistanceM: 9.5 } },
  {
    name: 'Several beams: ticks in the eye lane',
    reach: {
      skinDistanceM: 168,
      eyeDistanceM: 1508,
      aidedDistanceM: 10_100,
      wallDistanceM: 11,
      lines: [
        { wavelengthNm: 457.9, eyeDistanceM: 371 },
        { wavelengthNm: 476.5, eyeDistanceM: 545 },
        { wavelengthNm: 488, eyeDistanceM: 772 },
        { wavelengthNm: 496.5, eyeDistanceM: 527 },
        { wavelengthNm: 514.5, eyeDistanceM: 892 },
        { wavelengthNm: 1064, eyeDistanceM: 120 },
      ],
    },
  },
  { name: 'Not evaluated', reach: 'unknown' },
  { name: 'What got better: dashed at the sealed distance', reach: { skinDistanceM: 1.45, eyeDistanceM: 39.3, aidedDistanceM: 267, wallDistanceM: 8, sealedEyeDistanceM: 56.4 } },
  { name: 'Uncertainty', reach: { skinDistanceM: 168, eyeDistanceM: 1508, aidedDistanceM: 10_100, wallDistanceM: 11, eyeBandM: [1340, 1720] } },
  { name: 'Shorter than the axis, skin farther than eye', reach: { skinDistanceM: 3.2, eyeDistanceM: 0.06, wallDistanceM: 4 } },
  { name: 'Loading', reach: 'loading' },
];

export const SWATCHES: readonly (readonly SwatchLine[])[] = [
  ...[
    193, 248, 308, 355, 400, 405, 457.9, 488, 532, 561, 589, 632.8, 670, 700, 780, 1064, 1550, 4600,
    10_600,
  ].map((wavelengthNm) => [{ wavelengthNm }]),
  [{ wavelengthNm: 690, wavelengthToNm: 1040 }],
  [{ wavelengthNm: 410, wavelengthToNm: 710 }],
  [{ wavelengthNm: 1064 }, { wavelengthNm: 532 }, { wavelengthNm: 355 }],
  [{ wavelengthNm: 800 }, { wavelengthNm: 10_600 }],
  [300, 400, 500, 600, 700, 800, 900, 1000].map((wavelengthNm) => ({ wavelengthNm })),
];

/** 5.7 W in a Gaussian beam of 1.06 mm and 0.354 mrad at 1/e, mean over 7 mm. */
function irradianceAt(distanceM: number, powerW: number): number {
  const width = 1.061e-3 + 0.3536e-3 * distanceM;
  const share = 1 - Math.exp(-((7e-3 / width) ** 2));
  return (powerW * share) / ((Math.PI * 7e-3 ** 2) / 4);
}

const DISTANCES = Array.from({ length: 121 }, (_, index) => 0.1 * 10 ** (index / 20));

function points(powerW: number) {
  return DISTANCES.map((distanceM) => ({ distanceM, value: irradianceAt(distanceM, powerW) }));
}

export const CHART: ExposureChartModel = {
  unit: 'W/m²',
  title: 'all lines together, mean over 7 mm',
  points: points(5.7),
  lines: [
    { wavelengthNm: 457.9, points: points(0.35) },
    { wavelengthNm: 488, points: points(1.5) },
    { wavelengthNm: 514.5, points: points(2) },
  ],
  limits: [
    { side: 'eye', value: 25.4, label: 'Eye limit 25.4 W/m², 0.25 s', distanceM: 1508 },
    { side: 'skin', value: 2000, label: 'Skin limit 2.00 kW/m², 10 s', distanceM: 168 },
  ],
  wallDistanceM: 11,
};

// prettier-ignore
export const PROBLEM: Problem = {
  type: '/problems/invalid-input',
  name: 'invalid-input',
  status: 400,
  title: 'Some input needs correction',
  errors: [
    { path: 'serial', message: 'Enter the serial number.' },
    { path: 'wavelengthNm', message: 'Wavelength must be from 180 to 1,000,000 nm; you gave 18.', allowed: '180 to 1,000,000 nm' },
  ],
};

export const GUARDS: Problem = {
  type: '/problems/guard-failed',
  name: 'guard-failed',
  status: 409,
  title: 'Conditions for this step are not met',
  reasons: ['Interlock tests are not recorded here.', 'The evaluation is stale.'],
};

export const FORMULAS: readonly string[] = [
  'E_EL = 18*t^0.75/t',
  '18*0.25^(-0.25)',
  'sqrt(-D_f^2/ln(1 - pi*D_f^2*E_EL/(4*Phi)))',
  '(D - d_63)/phi_63',
  'log10(E_0/E_EL)',
  '1.8e-3*C_A*C_E*t^0.75',
  'min(alpha_max, max(alpha, 1.5))',
];
