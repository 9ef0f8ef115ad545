import { PROVENANCE_WORDS } from '../text/provenance-words';
import type { Emission, Quantity } from './lasers';
import { formatFull, formatWavelength } from './quantity-format';

/** One input of a line as it is read: what, how much, and where it came from. */
export interface EmissionFigure {
  readonly what: string;
  readonly text: string;
  /** "label", "measured ± 5 %"; empty for what is not a measured number. */
  readonly provenance: string;
}

type QuantityField = {
  [Field in keyof Emission]-?: Exclude<Emission[Field], undefined> extends Quantity ? Field : never;
}[keyof Emission];

const QUANTITIES: readonly (readonly [field: QuantityField, what: string, unit: string])[] = [
  ['powerW', 'Power', 'W'],
  ['operatingPowerW', 'Usual power', 'W'],
  ['peakPowerW', 'Peak power', 'W'],
  ['pulseEnergyJ', 'Pulse energy', 'J'],
  ['pulseDurationS', 'Pulse duration', 's'],
  ['repetitionRateHz', 'Repetition rate', 'Hz'],
  ['pulsesPerBurst', 'Pulses in a burst', ''],
  ['intraBurstRateHz', 'Rate inside a burst', 'Hz'],
  ['burstRateHz', 'Rate of bursts', 'Hz'],
  ['sourceMrad', 'Apparent source', 'mrad'],
  ['numericalAperture', 'Numerical aperture', ''],
  ['coreUm', 'Fiber core', 'µm'],
  ['modeFieldDiameterUm', 'Mode-field diameter', 'µm'],
];

const CONVENTIONS = { '1/e': 'at 1/e', '1/e2': 'at 1/e²', fwhm: 'at half maximum' } as const;

/** Every input of a line, in the order of a data sheet. */
export function emissionFigures(emission: Emission): EmissionFigure[] {
  return [
    wavelengthFigure(emission),
    { what: 'Mode', text: emission.mode === 'cw' ? 'CW' : emission.mode, provenance: '' },
    ...QUANTITIES.flatMap(([field, what, unit]) => {
      const quantity = emission[field];
      return quantity
        ? [{ what, text: quantityText(quantity, unit), provenance: provenanceText(quantity) }]
        : [];
    }),
    ...widthFigures(emission),
    {
      what: 'Profile',
      text: emission.profile === 'gaussian' ? 'Gaussian' : 'top-hat',
      provenance: '',
    },
    ...plainFigures(emission),
  ];
}

function wavelengthFigure({ wavelengthNm, wavelengthToNm }: Emission): EmissionFigure {
  const from = formatWavelength(wavelengthNm.value);
  const text = wavelengthToNm
    ? `${from.text} to ${formatWavelength(wavelengthToNm.value).text}`
    : from.text;
  return { what: 'Wavelength', text, provenance: provenanceText(wavelengthNm) };
}

function widthFigures(emission: Emission): EmissionFigure[] {
  const { diameterMm, diameterYMm, divergenceMrad, divergenceYMrad, delivery } = emission;
  const gaussian = emission.profile === 'gaussian';
  const figures: EmissionFigure[] = [];
  if (diameterMm) {
    const convention = gaussian ? CONVENTIONS[emission.diameterConvention] : 'full width';
    const text = `${axesText(diameterMm, diameterYMm, 'mm')} ${convention}`;
    figures.push({ what: 'Diameter at the exit', text, provenance: provenanceText(diameterMm) });
  }
  if (divergenceMrad) {
    const convention = gaussian ? CONVENTIONS[emission.divergenceConvention] : 'full width';
    const text = `${axesText(divergenceMrad, divergenceYMrad, 'mrad')} ${emission.divergenceAngle} angle, ${convention}`;
    figures.push({ what: 'Divergence', text, provenance: provenanceText(divergenceMrad) });
  } else if (delivery === 'beam') {
    figures.push({ what: 'Divergence', text: 'unknown', provenance: 'cautious value assumed' });
  }
  return figures;
}

function plainFigures({ waistDistanceM, m2, scan, delivery }: Emission): EmissionFigure[] {
  const words = {
    beam: '',
    'multimode-fiber': 'multimode fiber',
    'single-mode-fiber': 'single-mode fiber',
  };
  const plain: (readonly [string, string | undefined])[] = [
    ['Delivery', words[delivery] || undefined],
    [
      'Waist from the exit',
      waistDistanceM === undefined ? undefined : formatFull(waistDistanceM, 'm'),
    ],
    ['M²', m2 === undefined ? undefined : String(m2)],
    ['Scan', scan],
  ];
  return plain.flatMap(([what, text]) => (text ? [{ what, text, provenance: '' }] : []));
}

function axesText(x: Quantity, y: Quantity | undefined, unit: string): string {
  return y ? `${formatFull(x.value, '')} × ${formatFull(y.value, unit)}` : quantityText(x, unit);
}

/** As the person typed it, with its unit; otherwise the stored number. */
function quantityText({ value, text }: Quantity, unit: string): string {
  return text && /[^\d.,\s]/.test(text) ? text.trim() : formatFull(value, unit);
}

function provenanceText({ source, uncertaintyPct }: Quantity): string {
  const word = PROVENANCE_WORDS[source];
  return uncertaintyPct === undefined ? word : `${word} ± ${uncertaintyPct}\u202f%`;
}
