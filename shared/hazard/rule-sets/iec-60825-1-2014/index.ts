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

/** IEC 60825-1:2014, Safety of laser products, Annex A (maximum permissible exposure). */
export const IEC_60825_1_2014 = {
  id: 'iec-60825-1-2014',
  edition: 'IEC 60825-1:2014',
  title: 'IEC 60825-1:2014, Safety of laser products, Annex A (maximum permissible exposure)',
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
