/** A published document, or a table of one. */
export interface Source {
  /** As it is cited in a derivation. */
  readonly cite: string;
}

/** Every source of a number in the engine, once. */
export const SOURCES = {
  'icnirp-2013:eye': {
    cite: 'ICNIRP Guidelines on limits of exposure to laser radiation (2013), Health Phys. 105(3):271-295, exposure limits of the eye',
  },
  'icnirp-2013:skin': {
    cite: 'ICNIRP Guidelines on limits of exposure to laser radiation (2013), Health Phys. 105(3):271-295, exposure limits of the skin',
  },
  'icnirp-2013:factors': {
    cite: 'ICNIRP Guidelines on limits of exposure to laser radiation (2013), Health Phys. 105(3):271-295, correction factors',
  },
  'icnirp-2013:apertures': {
    cite: 'ICNIRP Guidelines on limits of exposure to laser radiation (2013), Health Phys. 105(3):271-295, limiting apertures',
  },
  'eu-2006-25:2.1': { cite: 'Directive 2006/25/EC, Annex II, limiting apertures' },
  'eu-2006-25:2.2': { cite: 'Directive 2006/25/EC, Annex II, Table 2.2 (eye, below 10 s)' },
  'eu-2006-25:2.3': { cite: 'Directive 2006/25/EC, Annex II, Table 2.3 (eye, from 10 s)' },
  'eu-2006-25:2.2-2.3': { cite: 'Directive 2006/25/EC, Annex II, Tables 2.2 and 2.3 (eye)' },
  'eu-2006-25:2.4': { cite: 'Directive 2006/25/EC, Annex II, Table 2.4 (skin)' },
  'eu-2006-25:2.5': { cite: 'Directive 2006/25/EC, Annex II, Table 2.5 (correction factors)' },
  'eu-2006-25:2.6': {
    cite: 'Directive 2006/25/EC, Annex II, Table 2.6 (repetitive exposure), consolidated text 26.7.2019',
  },
  'iec-60825-1-2014:A.1': { cite: 'IEC 60825-1:2014, Table A.1 (MPE of the eye, C6 = 1)' },
  'iec-60825-1-2014:A.2': {
    cite: 'IEC 60825-1:2014, Table A.2 (MPE of the eye, extended sources)',
  },
  'iec-60825-1-2014:A.3': { cite: 'IEC 60825-1:2014, Table A.3 (MPE of the skin)' },
  'iec-60825-1-2014:factors': {
    cite: 'IEC 60825-1:2014, Table 9 (correction factors and break times)',
  },
  'iec-60825-1-2014:pulses': { cite: 'IEC 60825-1:2014, clause 4.3 f) (repetitive pulses)' },
  'iec-60825-1-2014:apertures': { cite: 'IEC 60825-1:2014, Annex A, aperture diameters for MPE' },
  'ansi-z136.1-2014:5': { cite: 'ANSI Z136.1-2014, Table 5 (MPE of the eye)' },
  'ansi-z136.1-2014:6': { cite: 'ANSI Z136.1-2014, Table 6 (parameters and correction factors)' },
  'ansi-z136.1-2014:7': { cite: 'ANSI Z136.1-2014, Table 7 (MPE of the skin)' },
  'ansi-z136.1-2014:8': { cite: 'ANSI Z136.1-2014, Table 8 (limiting apertures)' },
  'ansi-z136.1-2007:5': { cite: 'ANSI Z136.1-2007, Table 5 (MPE of the eye)' },
  'ansi-z136.1-2007:6': { cite: 'ANSI Z136.1-2007, Table 6 (parameters and correction factors)' },
  'ansi-z136.1-2007:7': { cite: 'ANSI Z136.1-2007, Table 7 (MPE of the skin)' },
  'ansi-z136.1-2007:8': { cite: 'ANSI Z136.1-2007, Table 8 (limiting apertures)' },
  'ansi-z136.1-1993:limits': {
    cite: 'ANSI Z136.1-1993, MPE tables of eye and skin (the values that the OSHA Technical Manual prints)',
  },
  'ansi-z136.1-1993:factors': { cite: 'ANSI Z136.1-1993, parameters and correction factors' },
  'ansi-z136.1-1993:apertures': { cite: 'ANSI Z136.1-1993, limiting apertures' },
  'ansi-z136.1:1-ns-rule': {
    cite: 'ANSI Z136.1, below 1 ns the irradiance of the 1 ns limit is not exceeded',
  },
  'bgi-832:1': { cite: 'BGI 832, Table 1 (additivity of wavelengths; reproduces DIN EN 60825-1)' },
  'bgi-832:4': { cite: 'BGI 832, Table 4 (reproduces DIN EN 60825-1)' },
  'bgi-832:6a': { cite: 'BGI 832, Table 6a, p. 29 (reproduces DIN EN 60825-1)' },
  'bgi-832:p27': { cite: 'BGI 832, p. 27 (angle of acceptance; reproduces DIN EN 60825-1)' },
  'bgv-b2-da:5': {
    cite: 'BGV B2, Durchführungsanweisungen, Table 5 (apertures of DIN EN 60825-1)',
  },
  'jis-c-6802-2014:errata': {
    cite: 'JIS C 6802:2014 (identical with IEC 60825-1:2014), public errata',
  },
  'no-2011:4.5': {
    cite: 'Norwegian regulation on action and limit values, Annex 4, Table 4.5 (transposes 2006/25/EC Table 2.5)',
  },
  'dguv-203-042:annex-6': { cite: 'DGUV Information 203-042 (May 2018), Annex 6' },
  'training-text:p104': { cite: 'Public training text citing BS EN 60825-1:2014 Annex A, p. 104' },
  'codata-2018': { cite: 'CODATA 2018 (exact since the SI of 2019)' },
  'si-2019': { cite: 'The International System of Units, 9th edition (2019)' },
  'engine:geometry': { cite: 'Gaussian optics, derived in docs/engine.md, "Geometry"' },
  'engine:reading': { cite: 'Rules of reading, docs/engine.md, "Reading the limits"' },
  'engine:aid': { cite: 'Optical aids, docs/engine.md, "Optical aids"' },
} as const satisfies Record<string, Source>;

/** The key of a source. */
export type SourceKey = keyof typeof SOURCES;
