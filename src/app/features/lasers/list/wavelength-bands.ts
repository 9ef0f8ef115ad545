/** Wavelength bands of the filter; the lower edge belongs to the band. */
export const WAVELENGTH_BANDS = [
  { words: 'Ultraviolet, 180–400 nm', fromNm: 180, toNm: 400 },
  { words: 'Visible, 400–700 nm', fromNm: 400, toNm: 700 },
  { words: 'Near infrared, 700–1400 nm', fromNm: 700, toNm: 1400 },
  { words: 'Infrared from 1400 nm', fromNm: 1400, toNm: 1e6 },
] as const;

/** What the filter's button says of the chosen band. */
export function bandWords(fromNm: number | undefined, toNm: number | undefined): string {
  if (fromNm === undefined && toNm === undefined) return '';
  const band = WAVELENGTH_BANDS.find((one) => one.fromNm === fromNm && one.toNm === toNm);
  if (band) return band.words;
  if (toNm === undefined) return `from ${fromNm} nm`;
  return fromNm === undefined ? `to ${toNm} nm` : `${fromNm}–${toNm} nm`;
}
