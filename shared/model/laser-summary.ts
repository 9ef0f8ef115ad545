import type { Emission, LASER_CLASSES, LaserRow } from './lasers';
import { figure } from '../text/figure';

type LaserClass = (typeof LASER_CLASSES)[number];

/** Order of consequence; equivalents of the FDA scheme stand beside the IEC's, never converted. */
const CLASS_RANKS: Readonly<Record<LaserClass, number>> = {
  '1': 1,
  I: 1,
  '1C': 2,
  '1M': 2,
  IIa: 3,
  '2': 3,
  II: 3,
  '2M': 4,
  '3R': 5,
  IIIa: 5,
  '3B': 6,
  IIIb: 6,
  '4': 7,
  IV: 7,
};

/** 1 (Class 1) to 7 (Class 4); 0 when the class is unknown. */
export function classRank(laserClass: LaserClass | undefined): number {
  return laserClass ? CLASS_RANKS[laserClass] : 0;
}

/** The line as a list shows it. */
export function lineOf(emission: Emission): LaserRow['lines'][number] {
  return {
    wavelengthNm: emission.wavelengthNm.value,
    ...(emission.wavelengthToNm ? { wavelengthToNm: emission.wavelengthToNm.value } : {}),
    mode: emission.mode,
    summary: emissionSummary(emission),
  };
}

/** "CW, 5 W" or "5 mJ, 35 fs, 1 kHz": the maximum, as on record. */
export function emissionSummary(emission: Emission): string {
  const say = (field: SummaryField, unit: string) => {
    const quantity = emission[field];
    return quantity ? [figure(quantity.value, unit)] : [];
  };
  const energy = say('pulseEnergyJ', 'J');
  const power = energy.length > 0 ? [] : say('powerW', 'W');
  const peak =
    energy.length + power.length > 0 ? [] : say('peakPowerW', 'W').map((w) => `${w} peak`);
  const pulse = [...energy, ...power, ...peak, ...say('pulseDurationS', 's')];
  switch (emission.mode) {
    case 'cw':
      return ['CW', ...say('powerW', 'W')].join(', ');
    case 'single':
      return [...pulse, 'single'].join(', ');
    case 'burst': {
      const count = emission.pulsesPerBurst
        ? [`${figure(emission.pulsesPerBurst.value)} a burst`]
        : [];
      return [...pulse, ...count, ...say('burstRateHz', 'Hz')].join(', ');
    }
    case 'repetitive':
      return [...pulse, ...say('repetitionRateHz', 'Hz')].join(', ');
    case 'mode-locked':
    case 'modulated':
      return [emission.mode, ...pulse, ...say('repetitionRateHz', 'Hz')].join(', ');
  }
}

type SummaryField =
  'powerW' | 'peakPowerW' | 'pulseEnergyJ' | 'pulseDurationS' | 'repetitionRateHz' | 'burstRateHz';
