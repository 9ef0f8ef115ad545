import { ruleSetById } from '@shared/hazard/rule-sets';
import type { Emission, Quantity } from '@shared/model/lasers';

import type { CsvColumn } from '../../http/csv';
import type { LaserRecord } from './laser-record';

/** One line of a laser; a laser without lines is one row with empty cells. */
export interface CsvRow {
  readonly laser: LaserRecord;
  readonly line: Emission | undefined;
}

export async function* csvRows(lasers: AsyncIterable<LaserRecord>): AsyncGenerator<CsvRow> {
  for await (const laser of lasers) {
    const lines = laser.input.emissions.length > 0 ? laser.input.emissions : [undefined];
    for (const line of lines) yield { laser, line };
  }
}

type QuantityField = {
  [F in keyof Emission]-?: NonNullable<Emission[F]> extends Quantity ? F : never;
}[keyof Emission];

/** Numbers of a line: the column says the unit. The import reads the same headers. */
const NUMBERS: readonly (readonly [header: string, field: QuantityField])[] = [
  ['wavelength_nm', 'wavelengthNm'],
  ['wavelength_to_nm', 'wavelengthToNm'],
  ['power_w', 'powerW'],
  ['operating_power_w', 'operatingPowerW'],
  ['peak_power_w', 'peakPowerW'],
  ['pulse_energy_j', 'pulseEnergyJ'],
  ['pulse_duration_s', 'pulseDurationS'],
  ['repetition_rate_hz', 'repetitionRateHz'],
  ['pulses_per_burst', 'pulsesPerBurst'],
  ['intra_burst_rate_hz', 'intraBurstRateHz'],
  ['burst_rate_hz', 'burstRateHz'],
  ['diameter_mm', 'diameterMm'],
  ['diameter_y_mm', 'diameterYMm'],
  ['divergence_mrad', 'divergenceMrad'],
  ['divergence_y_mrad', 'divergenceYMrad'],
  ['numerical_aperture', 'numericalAperture'],
  ['core_um', 'coreUm'],
  ['mode_field_diameter_um', 'modeFieldDiameterUm'],
];

/** The register as people take it away: the contract's fields with their units. */
export const LASER_COLUMNS: readonly CsvColumn<CsvRow>[] = [
  { header: 'tag', cell: ({ laser }) => laser.tag },
  { header: 'maker', cell: ({ laser }) => laser.input.maker },
  { header: 'model', cell: ({ laser }) => laser.input.model },
  { header: 'serial', cell: ({ laser }) => laser.input.serial },
  { header: 'year', cell: ({ laser }) => laser.input.year },
  { header: 'area', cell: ({ laser }) => laser.area?.code },
  { header: 'department', cell: ({ laser }) => laser.input.department ?? laser.area?.department },
  { header: 'supervisor', cell: ({ laser }) => laser.supervisor?.name },
  { header: 'declared_class', cell: ({ laser }) => laser.input.declaredClass },
  { header: 'verified_class', cell: ({ laser }) => laser.input.verifiedClass },
  { header: 'open_class', cell: ({ laser }) => laser.input.openClass },
  { header: 'state', cell: ({ laser }) => laser.state },
  { header: 'line_label', cell: ({ line }) => line?.label },
  { header: 'mode', cell: ({ line }) => line?.mode },
  ...NUMBERS.map(([header, field]) => ({
    header,
    cell: ({ line }: CsvRow) => line?.[field]?.value,
  })),
  { header: 'delivery', cell: ({ line }) => line?.delivery },
  { header: 'diameter_convention', cell: ({ line }) => line?.diameterConvention },
  { header: 'divergence_convention', cell: ({ line }) => line?.divergenceConvention },
  { header: 'divergence_angle', cell: ({ line }) => line?.divergenceAngle },
  { header: 'profile', cell: ({ line }) => line?.profile },
  { header: 'source', cell: ({ line }) => line?.wavelengthNm.source },
  { header: 'rule_set', cell: ({ laser }) => laser.reach?.ruleSet },
  {
    header: 'edition',
    cell: ({ laser }) => laser.reach && ruleSetById(laser.reach.ruleSet).edition,
  },
  { header: 'evaluation_number', cell: ({ laser }) => laser.reach?.evaluationNumber },
  { header: 'evaluation_state', cell: ({ laser }) => laser.standing },
  { header: 'exposure_duration_eye_s', cell: ({ laser }) => laser.reach?.eyeS },
  { header: 'exposure_duration_skin_s', cell: ({ laser }) => laser.reach?.skinS },
  { header: 'eye_hazard_distance_m', cell: ({ laser }) => laser.reach?.eyeDistanceM },
  { header: 'skin_hazard_distance_m', cell: ({ laser }) => laser.reach?.skinDistanceM },
  { header: 'aided_eye_hazard_distance_m', cell: ({ laser }) => laser.reach?.aidedDistanceM },
  { header: 'optical_density', cell: ({ laser }) => laser.reach?.opticalDensity },
];
