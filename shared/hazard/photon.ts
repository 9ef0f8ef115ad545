/** Planck constant, J s, exact. @source si-2019 */
export const PLANCK_CONSTANT_J_S = 6.62607015e-34;

/** Speed of light in vacuum, m/s, exact. @source si-2019 */
export const SPEED_OF_LIGHT_M_PER_S = 299_792_458;

/** Elementary charge, C, exact; the energy of 1 eV in J. @source si-2019 */
export const ELEMENTARY_CHARGE_C = 1.602176634e-19;

/** One photon of a wavelength. */
export interface Photon {
  readonly photonEnergyJ: number;
  readonly photonEnergyEv: number;
  readonly frequencyHz: number;
}

/**
 * Energy E = hc/λ and frequency ν = c/λ of a photon.
 *
 * @param wavelengthNm vacuum wavelength, nm, above 0.
 * @source si-2019
 * @example photonOf(532).photonEnergyEv // 2.3305
 */
export function photonOf(wavelengthNm: number): Photon {
  const frequencyHz = SPEED_OF_LIGHT_M_PER_S / (wavelengthNm * 1e-9);
  const photonEnergyJ = PLANCK_CONSTANT_J_S * frequencyHz;
  return { photonEnergyJ, photonEnergyEv: photonEnergyJ / ELEMENTARY_CHARGE_C, frequencyHz };
}
