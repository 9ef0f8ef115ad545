import type { RuleSet } from '../rule-set';
import { EYE_APERTURES, SKIN_APERTURES } from './apertures';
import {
  EYE_FAR_INFRARED,
  EYE_RETINA_EXTENDED_SOURCE,
  EYE_RETINA_SMALL_SOURCE,
  EYE_ULTRAVIOLET,
} from './eye';
import { FACTORS } from './factors';
import { SKIN } from './skin';

/** Directive 2006/25/EC on artificial optical radiation, Annex II. */
export const EU_2006_25 = {
  id: 'eu-2006-25',
  edition: '2006/25/EC',
  title: 'Directive 2006/25/EC on artificial optical radiation, Annex II',
  eyeSmallSource: [...EYE_ULTRAVIOLET, ...EYE_RETINA_SMALL_SOURCE, ...EYE_FAR_INFRARED],
  eyeExtendedSource: [...EYE_ULTRAVIOLET, ...EYE_RETINA_EXTENDED_SOURCE, ...EYE_FAR_INFRARED],
  skin: SKIN,
  apertures: { eye: EYE_APERTURES, skin: SKIN_APERTURES },
  factors: FACTORS,
  pulseTrain: { countedWithin: 'exposure', coversSkin: true },
  shortestS: 1e-13,
  defaultModel: { growth: 'linear', onAxis: 'aperture-mean' },
} as const satisfies RuleSet;
