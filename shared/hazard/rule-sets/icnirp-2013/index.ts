import type { RuleSet } from '../rule-set';
import { EYE_APERTURES, SKIN_APERTURES } from './apertures';
import {
  EYE_ANTERIOR_CAP,
  EYE_FAR_INFRARED,
  EYE_RETINA_EXTENDED_SOURCE,
  EYE_RETINA_SMALL_SOURCE,
  EYE_ULTRAVIOLET,
} from './eye';
import { FACTORS } from './factors';
import { SKIN } from './skin';

/** ICNIRP Guidelines on Limits of Exposure to Laser Radiation of Wavelengths between 180 nm and 1,000 µm (2013). */
export const ICNIRP_2013 = {
  id: 'icnirp-2013',
  edition: 'ICNIRP 2013',
  title:
    'ICNIRP Guidelines on Limits of Exposure to Laser Radiation of Wavelengths between 180 nm and 1,000 µm (2013)',
  eyeSmallSource: [
    ...EYE_ULTRAVIOLET,
    ...EYE_RETINA_SMALL_SOURCE,
    ...EYE_ANTERIOR_CAP,
    ...EYE_FAR_INFRARED,
  ],
  eyeExtendedSource: [
    ...EYE_ULTRAVIOLET,
    ...EYE_RETINA_EXTENDED_SOURCE,
    ...EYE_ANTERIOR_CAP,
    ...EYE_FAR_INFRARED,
  ],
  skin: SKIN,
  apertures: { eye: EYE_APERTURES, skin: SKIN_APERTURES },
  factors: FACTORS,
  pulseTrain: { countedWithin: 'T2', coversSkin: false },
  shortestS: 1e-13,
  defaultModel: { growth: 'linear', onAxis: 'aperture-mean' },
} as const satisfies RuleSet;
