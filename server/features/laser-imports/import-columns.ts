import { LASER_CLASSES, DELIVERIES, EMISSION_MODES, WIDTH_CONVENTIONS } from '@shared/model/lasers';
import type { Emission, LaserInput, Quantity } from '@shared/model/lasers';
import type { QuantityKind } from '@shared/model/quantity-units';

/** What a cell is read as. */
export type CellKind =
  | { readonly is: 'text' }
  | {
      readonly is: 'choice';
      readonly of: readonly string[];
      readonly also?: Readonly<Record<string, string>>;
    }
  | { readonly is: 'date' }
  | { readonly is: 'flag' }
  | { readonly is: 'year' }
  | { readonly is: 'quantity'; readonly kind: QuantityKind; readonly unit: string }
  | { readonly is: 'number' };

type QuantityField = {
  [F in keyof Emission]-?: NonNullable<Emission[F]> extends Quantity ? F : never;
}[keyof Emission];

export type Column =
  | {
      readonly header: string;
      readonly of: 'laser';
      readonly field: keyof LaserInput;
      readonly cell: CellKind;
    }
  | {
      readonly header: string;
      readonly of: 'line';
      readonly field: keyof Emission;
      readonly cell: CellKind;
    }
  | {
      readonly header: string;
      readonly of: 'quantity';
      readonly field: QuantityField;
      readonly cell: CellKind;
    }
  /** Looked up: an area by its code, a person by the e-mail address; the source of the row's numbers. */
  | {
      readonly header: string;
      readonly of: 'area' | 'supervisor' | 'alternate' | 'source';
      readonly cell: CellKind;
    };

const text = { is: 'text' } as const;
const date = { is: 'date' } as const;
const flag = { is: 'flag' } as const;
const number = { is: 'number' } as const;
const laserClass = { is: 'choice', of: LASER_CLASSES } as const;
const convention = {
  is: 'choice',
  of: WIDTH_CONVENTIONS,
  also: { '1/e²': '1/e2', '1/e^2': '1/e2' },
} as const;

function quantity(kind: QuantityKind, unit: string) {
  return { is: 'quantity', kind, unit } as const;
}

/** The columns of the file, in the order of the template. Headers name the unit of a bare number. */
// prettier-ignore
export const COLUMNS: readonly Column[] = [
  { header: 'tag', of: 'laser', field: 'tag', cell: text },
  { header: 'maker', of: 'laser', field: 'maker', cell: text },
  { header: 'model', of: 'laser', field: 'model', cell: text },
  { header: 'serial', of: 'laser', field: 'serial', cell: text },
  { header: 'year', of: 'laser', field: 'year', cell: { is: 'year' } },
  { header: 'declared_class', of: 'laser', field: 'declaredClass', cell: laserClass },
  { header: 'declared_standard', of: 'laser', field: 'declaredStandard', cell: text },
  { header: 'open_class', of: 'laser', field: 'openClass', cell: laserClass },
  { header: 'area', of: 'area', cell: text },
  { header: 'supervisor_email', of: 'supervisor', cell: text },
  { header: 'alternate_email', of: 'alternate', cell: text },
  { header: 'mobile', of: 'laser', field: 'mobile', cell: flag },
  { header: 'home_built', of: 'laser', field: 'homeBuilt', cell: flag },
  { header: 'purpose', of: 'laser', field: 'purpose', cell: text },
  { header: 'beam_path', of: 'laser', field: 'beamPath', cell: { is: 'choice', of: ['open', 'limited-open', 'enclosed'] } },
  { header: 'key_location', of: 'laser', field: 'keyLocation', cell: text },
  { header: 'asset_number', of: 'laser', field: 'assetNumber', cell: text },
  { header: 'received_on', of: 'laser', field: 'receivedOn', cell: date },
  { header: 'in_service_since', of: 'laser', field: 'inServiceSince', cell: date },
  { header: 'note', of: 'laser', field: 'note', cell: text },
  { header: 'line_label', of: 'line', field: 'label', cell: text },
  { header: 'mode', of: 'line', field: 'mode', cell: { is: 'choice', of: EMISSION_MODES, also: { pulsed: 'repetitive', continuous: 'cw' } } },
  { header: 'wavelength_nm', of: 'quantity', field: 'wavelengthNm', cell: quantity('wavelength', 'nm') },
  { header: 'wavelength_to_nm', of: 'quantity', field: 'wavelengthToNm', cell: quantity('wavelength', 'nm') },
  { header: 'power_w', of: 'quantity', field: 'powerW', cell: quantity('power', 'W') },
  { header: 'operating_power_w', of: 'quantity', field: 'operatingPowerW', cell: quantity('power', 'W') },
  { header: 'peak_power_w', of: 'quantity', field: 'peakPowerW', cell: quantity('power', 'W') },
  { header: 'pulse_energy_j', of: 'quantity', field: 'pulseEnergyJ', cell: quantity('energy', 'J') },
  { header: 'pulse_duration_s', of: 'quantity', field: 'pulseDurationS', cell: quantity('duration', 's') },
  { header: 'repetition_rate_hz', of: 'quantity', field: 'repetitionRateHz', cell: quantity('rate', 'Hz') },
  { header: 'pulses_per_burst', of: 'quantity', field: 'pulsesPerBurst', cell: number },
  { header: 'intra_burst_rate_hz', of: 'quantity', field: 'intraBurstRateHz', cell: quantity('rate', 'Hz') },
  { header: 'burst_rate_hz', of: 'quantity', field: 'burstRateHz', cell: quantity('rate', 'Hz') },
  { header: 'delivery', of: 'line', field: 'delivery', cell: { is: 'choice', of: DELIVERIES } },
  { header: 'diameter_mm', of: 'quantity', field: 'diameterMm', cell: quantity('diameter', 'mm') },
  { header: 'diameter_y_mm', of: 'quantity', field: 'diameterYMm', cell: quantity('diameter', 'mm') },
  { header: 'diameter_convention', of: 'line', field: 'diameterConvention', cell: convention },
  { header: 'divergence_mrad', of: 'quantity', field: 'divergenceMrad', cell: quantity('divergence', 'mrad') },
  { header: 'divergence_y_mrad', of: 'quantity', field: 'divergenceYMrad', cell: quantity('divergence', 'mrad') },
  { header: 'divergence_convention', of: 'line', field: 'divergenceConvention', cell: convention },
  { header: 'divergence_angle', of: 'line', field: 'divergenceAngle', cell: { is: 'choice', of: ['full', 'half'] } },
  { header: 'profile', of: 'line', field: 'profile', cell: { is: 'choice', of: ['gaussian', 'top-hat'] } },
  { header: 'numerical_aperture', of: 'quantity', field: 'numericalAperture', cell: number },
  { header: 'core_um', of: 'quantity', field: 'coreUm', cell: quantity('micrometers', 'µm') },
  { header: 'mode_field_diameter_um', of: 'quantity', field: 'modeFieldDiameterUm', cell: quantity('micrometers', 'µm') },
  { header: 'source', of: 'source', cell: { is: 'choice', of: ['label', 'data-sheet', 'measured', 'estimated'], also: { 'data sheet': 'data-sheet', datasheet: 'data-sheet' } } },
];

/** Columns of the export that are no inputs: taken along, not read. */
export const NOT_READ: ReadonlySet<string> = new Set([
  'department',
  'supervisor',
  'verified_class',
  'state',
  'rule_set',
  'edition',
  'evaluation_number',
  'evaluation_state',
  'exposure_duration_eye_s',
  'exposure_duration_skin_s',
  'eye_hazard_distance_m',
  'skin_hazard_distance_m',
  'aided_eye_hazard_distance_m',
  'optical_density',
]);

export interface FoundColumn {
  readonly column: Column;
  /** Whether a bare number is understood: the header itself says the unit. */
  readonly saysUnit: boolean;
}

/** The column of a header; `power` is `power_w` without its unit, so every cell must say it. */
export function columnOf(header: string): FoundColumn | undefined {
  const word = header
    .trim()
    .toLowerCase()
    .replace(/[\s-]+/g, '_');
  const column = COLUMNS.find((one) => one.header === word);
  if (column) return { column, saysUnit: true };
  const bare = COLUMNS.find(
    (one) =>
      one.cell.is === 'quantity' && one.header.slice(0, one.header.lastIndexOf('_')) === word,
  );
  return bare && { column: bare, saysUnit: false };
}
