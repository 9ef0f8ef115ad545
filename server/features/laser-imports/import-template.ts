import { csvLine } from '../../http/csv';
import { COLUMNS } from './import-columns';

type Example = Readonly<Record<string, string | number>>;

/** Two lasers of invented makers: one continuous in SI, one pulsed with units in the cells. */
const EXAMPLES: readonly Example[] = [
  {
    tag: 'EX-01',
    maker: 'Quenlorn',
    model: 'QG-5',
    serial: 'QG5-0000',
    year: 2021,
    declared_class: '4',
    area: 'B-204',
    mode: 'cw',
    wavelength_nm: 532,
    power_w: 5,
    delivery: 'beam',
    diameter_mm: 2.3,
    diameter_convention: '1/e2',
    divergence_mrad: 0.5,
    divergence_convention: '1/e2',
    divergence_angle: 'full',
    profile: 'gaussian',
    source: 'data-sheet',
  },
  {
    tag: 'EX-02',
    maker: 'Ysbreck',
    model: 'YS-450',
    serial: 'YS450-000',
    year: 2014,
    declared_class: '4',
    area: 'B-204',
    mode: 'repetitive',
    wavelength_nm: '1064 nm',
    pulse_energy_j: '450 mJ',
    pulse_duration_s: '6 ns',
    repetition_rate_hz: '10 Hz',
    delivery: 'beam',
    diameter_mm: '8 mm',
    diameter_convention: 'fwhm',
    divergence_mrad: '0.25 mrad',
    divergence_convention: 'fwhm',
    divergence_angle: 'half',
    profile: 'gaussian',
    source: 'label',
  },
];

/** Header and two example rows, to be replaced. */
export function importTemplate(): string {
  const rows = EXAMPLES.map((example) => COLUMNS.map(({ header }) => example[header]));
  return [COLUMNS.map(({ header }) => header), ...rows].map(csvLine).join('');
}
