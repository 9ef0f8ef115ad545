import type { Scene, SceneBeam } from './scene';

/** What an optical aid does to one beam. */
export interface AidedBeam {
  /** How much larger the source is seen. */
  readonly magnification: number;
  /** D_c, what the aid gathers from, for a limit averaged over an aperture, m. */
  readonly collectingApertureM: (apertureM: number) => number;
  /** G, by how much the exposure of a wide beam rises. */
  readonly gain: (apertureM: number) => number;
}

/** Glass lets through from 302 to 2800 nm; elsewhere an aid changes nothing. */
const SHORTEST_NM = 302;
const LONGEST_NM = 2800;

/** The bare eye. */
export const UNAIDED: AidedBeam = {
  magnification: 1,
  collectingApertureM: (apertureM) => apertureM,
  gain: () => 1,
};

/**
 * The aid of the scene in front of the eye: it gathers what passes `D_c = min(D_obj, M D_f)` and
 * lets the part τ of it through the aperture D_f.
 *
 * @source engine:aid
 */
export function aidedBeam({ aid }: Scene, { beam, hasSource }: SceneBeam): AidedBeam {
  const { wavelengthNm } = beam;
  if (aid === undefined || wavelengthNm < SHORTEST_NM || wavelengthNm >= LONGEST_NM) return UNAIDED;
  const { objectiveMm, magnification, transmission } = aid;
  const collectingApertureM = (apertureM: number) =>
    Math.min(objectiveMm * 1e-3, magnification * apertureM);
  return {
    magnification: hasSource ? magnification : 1,
    collectingApertureM,
    gain: (apertureM) => transmission * (collectingApertureM(apertureM) / apertureM) ** 2,
  };
}
