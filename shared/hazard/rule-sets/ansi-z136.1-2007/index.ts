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

/** ANSI Z136.1-2007, Safe Use of Lasers. */
export const ANSI_Z136_1_2007 = {
  id: 'ansi-z136.1-2007',
  edition: 'ANSI Z136.1-2007',
  title: 'ANSI Z136.1-2007, Safe Use of Lasers',
  supersededBy: 'ansi-z136.1-2014',
  eyeSmallSource: [...EYE_ULTRAVIOLET, ...EYE_RETINA_SMALL_SOURCE, ...EYE_FAR_INFRARED],
  eyeExtendedSource: [...EYE_ULTRAVIOLET, ...EYE_RETINA_EXTENDED_SOURCE, ...EYE_FAR_INFRARED],
  skin: SKIN,
  apertures: { eye: EYE_APERTURES, skin: SKIN_APERTURES },
  factors: FACTORS,
  pulseTrain: { countedWithin: 'exposure', coversSkin: false },
  shortestS: 1e-13,
  defaultModel: { growth: 'hyperbolic', onAxis: 'aperture-mean' },
} as const satisfies RuleSet;
