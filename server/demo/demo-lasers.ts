import type { Provenance } from '@shared/model/common';
import type { Emission, LaserInput, Quantity } from '@shared/model/lasers';

import type { DemoPersonId } from './demo-people';

/** What a laser of the demo has become, and when; the seed takes it there through the services. */
export type DemoFate =
  | 'in-use'
  | 'evaluated'
  | 'commissioning'
  | 'registered'
  | 'received'
  | 'in-check'
  | 'checked'
  | 'draft'
  | 'stored'
  | 'blocked'
  | 'service-open'
  | 'on-loan';

export interface DemoLaser {
  readonly tag: string;
  readonly maker: string;
  readonly model: string;
  /** Code of the area; absent for a mobile laser. */
  readonly area?: string;
  /** Authors and answers for it; of the area when absent. */
  readonly supervisor?: DemoPersonId;
  readonly lines: readonly Emission[];
  readonly sets?: Readonly<Record<string, readonly number[]>>;
  readonly fate: DemoFate;
  /** Days before today on which the last step was taken. */
  readonly daysAgo?: number;
  readonly why?: string;
  readonly record: Partial<LaserInput>;
  /** Wavelengths, nm, at which tunable lines are evaluated, by the place of the line. */
  readonly atNm?: Readonly<Record<number, number>>;
  readonly conditions?: string;
  readonly assumptions?: readonly string[];
  /** Days before today on which the evaluation was signed; spread over the year when absent. */
  readonly signedDaysAgo?: number;
}

interface Beam {
  /** Diameter at 1/e², mm: one axis or two. */
  readonly d?: number | readonly [number, number];
  /** Full divergence at 1/e², mrad. Absent: unknown. */
  readonly div?: number | readonly [number, number];
  readonly source?: Provenance;
  readonly label?: string;
  readonly toNm?: number;
  readonly more?: Partial<Emission>;
}

type Timing = Partial<
  Record<
    | 'powerW'
    | 'operatingPowerW'
    | 'peakPowerW'
    | 'pulseEnergyJ'
    | 'pulseDurationS'
    | 'repetitionRateHz'
    | 'pulsesPerBurst'
    | 'intraBurstRateHz'
    | 'burstRateHz',
    number
  >
>;

function line(nm: number, mode: Emission['mode'], timing: Timing, beam: Beam): Emission {
  const source = beam.source ?? 'data-sheet';
  const q = (value: number): Quantity => ({ value, source });
  const [dx, dy] = pair(beam.d);
  const [divX, divY] = pair(beam.div);
  const numbers = {
    ...timing,
    diameterMm: dx,
    diameterYMm: dy,
    divergenceMrad: divX,
    divergenceYMrad: divY,
  };
  const quantities = Object.entries(numbers).flatMap(([field, value]) =>
    value === undefined ? [] : [[field, q(value)] as const],
  );
  return {
    id: idOf(nm, beam.label),
    ...(beam.label ? { label: beam.label } : {}),
    wavelengthNm: q(nm),
    ...(beam.toNm ? { wavelengthToNm: q(beam.toNm) } : {}),
    mode,
    delivery: 'beam',
    diameterConvention: '1/e2',
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    profile: 'gaussian',
    ...(Object.fromEntries(quantities) as Partial<Emission>),
    ...beam.more,
  };
}

function cw(nm: number, powerW: number, beam: Beam & { usualW?: number } = {}): Emission {
  const { usualW } = beam;
  return line(nm, 'cw', { powerW, ...(usualW ? { operatingPowerW: usualW } : {}) }, beam);
}

type Train = readonly [pulseEnergyJ: number, pulseDurationS: number, repetitionRateHz: number];

function pulsed(nm: number, [pulseEnergyJ, pulseDurationS, repetitionRateHz]: Train, beam: Beam) {
  return line(nm, 'repetitive', { pulseEnergyJ, pulseDurationS, repetitionRateHz }, beam);
}

function modeLocked(nm: number, [powerW, pulseDurationS, repetitionRateHz]: Train, beam: Beam) {
  return line(nm, 'mode-locked', { powerW, pulseDurationS, repetitionRateHz }, beam);
}

function multimode(numericalAperture: number, coreUm: number, source: Provenance = 'data-sheet') {
  return {
    delivery: 'multimode-fiber' as const,
    numericalAperture: { value: numericalAperture, source },
    coreUm: { value: coreUm, source },
  };
}

function singleMode(modeFieldUm: number, numericalAperture?: number) {
  return {
    delivery: 'single-mode-fiber' as const,
    modeFieldDiameterUm: { value: modeFieldUm, source: 'data-sheet' as const },
    ...(numericalAperture
      ? { numericalAperture: { value: numericalAperture, source: 'label' as const } }
      : {}),
  };
}

function pair(value: Beam['d']): readonly [number | undefined, number | undefined] {
  if (value === undefined) return [undefined, undefined];
  return typeof value === 'number' ? [value, undefined] : value;
}

function idOf(nm: number, label: string | undefined): string {
  const word = label ? `-${label.toLowerCase().replace(/[^a-z0-9]+/g, '-')}` : '';
  return `line-${String(nm).replace('.', '_')}${word}`;
}

function classes(declaredClass: LaserInput['declaredClass'], openClass?: LaserInput['openClass']) {
  return { declaredClass, ...(openClass ? { openClass, serviceClass: openClass } : {}) };
}

const L = 'label';
const M = 'measured';
const E = 'estimated';
const ns = (value: number) => value * 1e-9;
const fs = (value: number) => value * 1e-15;

const OH_HELIUM_NEON = { medium: 'gas', teaching: true } as const;

/** The register of the demo: inputs and states only, every number of a result comes from the engine. */
// prettier-ignore
export const DEMO_LASERS: readonly DemoLaser[] = [
  { tag: 'L-01', maker: 'Brindlewick', model: 'BW-10f', area: 'A-101', fate: 'in-use',
    lines: [modeLocked(800, [0.6, fs(10), 80e6], { d: 1.2 })],
    record: { ...classes('4'), serial: 'BWF-2207', year: 2022, medium: 'solid', beamPath: 'open', purpose: 'Seed of the amplifier chain and few-cycle experiments.' },
    assumptions: ['Pulses below 100 fs: the tables end there; the LSO has judged the extrapolation.'] },
  { tag: 'L-02', maker: 'Quenlorn', model: 'QG-5', area: 'A-101', fate: 'in-use',
    lines: [cw(532, 5, { d: 2.3, div: 0.5, usualW: 3.5 })],
    record: { ...classes('4'), serial: 'QG5-1184', year: 2021, medium: 'solid', beamPath: 'limited-open', purpose: 'Pump of L-01.' } },
  { tag: 'L-03', maker: 'Brindlewick', model: 'BW-A5', area: 'A-101', fate: 'blocked', daysAgo: 7,
    why: 'Near miss in alignment: a blue stray reflection crossed the table edge. Nobody was exposed.',
    lines: [pulsed(800, [5e-3, fs(35), 1000], { d: 11, div: 0.2 })],
    record: { ...classes('4'), serial: 'BWA-0091', year: 2019, medium: 'solid', beamPath: 'open', purpose: 'Amplifier for the attosecond beam line.', beamChangingOptics: 'Doubling crystal behind the compressor.' } },
  { tag: 'L-04', maker: 'Quenlorn', model: 'QY-20', area: 'A-101', fate: 'in-use',
    lines: [pulsed(527, [20e-3, ns(150), 1000], { d: 3, div: 6 })],
    record: { ...classes('4'), serial: 'QY20-077', year: 2019, medium: 'solid', beamPath: 'enclosed', purpose: 'Pump of the amplifier L-03.' } },
  { tag: 'L-05', maker: 'Tarnovane', model: 'TV-20', area: 'A-102', fate: 'in-use',
    lines: [
      pulsed(1030, [100e-6, fs(250), 200e3], { d: 2.5, div: 0.7 }),
      pulsed(515, [50e-6, fs(250), 200e3], { d: 2.5, div: 0.7 }),
      pulsed(343, [15e-6, fs(250), 200e3], { d: 2.5, div: 0.7 }),
    ],
    record: { ...classes('4'), serial: 'TV20-3310', year: 2023, medium: 'solid', beamPath: 'open', purpose: 'Harmonics for photoemission.' } },
  { tag: 'L-06', maker: 'Oakhollin', model: 'OH-1', area: 'A-102', fate: 'in-use',
    lines: [cw(632.8, 0.8e-3, { d: 0.5, div: 1.7, source: L })],
    record: { ...classes('2'), serial: 'OH1-550', year: 2015, medium: 'gas', alignmentLaser: true, purpose: 'Alignment of the annex beam line.' } },
  { tag: 'L-07', maker: 'Brindlewick', model: 'BW-P', area: 'A-102', fate: 'blocked', daysAgo: 18,
    why: 'Interlock test failed: shutter 2 stayed open. It serves this laser only.',
    lines: [pulsed(1150, [0.3e-3, fs(50), 1000], { d: 5, div: 0.7, toNm: 2600, label: 'parametric output' })],
    record: { ...classes('4'), serial: 'BWP-0213', year: 2020, medium: 'solid', beamPath: 'open', purpose: 'Tunable infrared for pump and probe.' } },
  { tag: 'L-08', maker: 'Tarnovane', model: 'TV-B', area: 'A-102', fate: 'evaluated', daysAgo: 26,
    lines: [
      line(1030, 'burst', { pulseEnergyJ: 4e-6, pulseDurationS: fs(300), pulsesPerBurst: 10, intraBurstRateHz: 50e6, burstRateHz: 100e3 }, { d: 2, div: 0.8, label: 'burst' }),
      line(1030, 'single', { pulseEnergyJ: 40e-6, pulseDurationS: fs(300) }, { d: 2, div: 0.8, label: 'single shot' }),
    ],
    sets: { burst: [0], 'single shot': [1] },
    record: { ...classes('4'), serial: 'TVB-0042', year: 2026, medium: 'solid', beamPath: 'open', purpose: 'Burst-mode machining trials.' } },
  { tag: 'L-09', maker: 'Oakhollin', model: 'OH-2', area: 'A-110', fate: 'in-use',
    lines: [cw(632.8, 2e-3, { d: 0.7, div: 1.2, source: L })],
    record: { ...classes('3R'), serial: 'OH2-117', year: 2016, ...OH_HELIUM_NEON, purpose: 'Student experiments in interference.' } },
  { tag: 'L-10', maker: 'Marrowby', model: 'MB-R', area: 'A-110', fate: 'in-use',
    lines: [cw(650, 0.9e-3, { d: [3, 1], div: [1, 0.9], source: L })],
    record: { ...classes('2'), serial: 'MBR-8841', year: 2020, medium: 'semiconductor', teaching: true, purpose: 'Student experiments.' } },
  { tag: 'L-11', maker: 'unknown', model: 'green pointer', area: 'A-110', fate: 'received', daysAgo: 20,
    lines: [
      cw(532, 62e-3, { d: 1.1, div: 1.4, source: M }),
      cw(1064, 12e-3, { d: 1.1, div: 1.4, source: M, label: 'residual pump' }),
    ],
    record: { ...classes('2'), medium: 'solid', labelAsFound: 'Class 2, < 1 mW, 532 nm. No maker, no serial.', note: 'Green pointer found in the drawer of bench 4; owner unknown. Measured 62 mW at 532 nm and 12 mW at 1064 nm.' } },
  { tag: 'L-12', maker: 'Marrowby', model: 'MB-V', area: 'A-110', fate: 'in-use',
    lines: [cw(405, 80e-3, { d: [1.5, 0.8], div: [1, 1.2] })],
    record: { ...classes('3B'), serial: 'MBV-2004', year: 2018, medium: 'semiconductor', teaching: true, beamPath: 'open', purpose: 'Fluorescence practical.' } },
  { tag: 'L-13', maker: 'Ysbreck', model: 'YS-OPO', area: 'B-203', fate: 'in-use',
    lines: [
      pulsed(410, [45e-3, ns(5), 10], { d: 6, div: 1, toNm: 710, label: 'signal' }),
      pulsed(710, [20e-3, ns(5), 10], { d: 6, div: 2, toNm: 2400, label: 'idler' }),
      pulsed(355, [15e-3, ns(5), 10], { d: 6, div: 1, source: M, label: 'residual' }),
      pulsed(532, [4e-3, ns(5), 10], { d: 6, div: 1, source: M, label: 'residual' }),
      pulsed(1064, [6e-3, ns(5), 10], { d: 6, div: 1, source: M, label: 'residual' }),
    ],
    record: { ...classes('4'), serial: 'YSO-0307', year: 2017, medium: 'solid', beamPath: 'limited-open', purpose: 'Tunable spectroscopy of aerosols.' },
    atNm: { 0: 450, 1: 1064 },
    conditions: 'Signal 410–534 nm only; the idler is stopped in a fixed housing.',
    assumptions: ['The signal has its maximum of 45 mJ at 450 nm; that energy is taken over the whole range.'] },
  { tag: 'L-14', maker: 'Ysbreck', model: 'YS-450', area: 'B-203', fate: 'in-use',
    lines: [
      pulsed(1064, [450e-3, ns(6), 10], { d: 8, div: 0.5 }),
      pulsed(532, [220e-3, ns(6), 10], { d: 8, div: 0.5 }),
      pulsed(355, [130e-3, ns(6), 10], { d: 8, div: 0.5 }),
    ],
    sets: { '1064 nm': [0], '532 nm': [1], '355 nm': [2] },
    record: { ...classes('4'), serial: 'YS450-119', year: 2014, medium: 'solid', beamPath: 'open', purpose: 'Pump of L-13 and L-15.' },
    conditions: 'One harmonic at a time.' },
  { tag: 'L-15', maker: 'Ysbreck', model: 'YS-D', area: 'B-203', fate: 'stored', daysAgo: 410, signedDaysAgo: 780,
    lines: [pulsed(560, [40e-3, ns(5), 10], { d: 4, div: 1, toNm: 640 })],
    record: { ...classes('4'), serial: 'YSD-0022', year: 2009, medium: 'dye', beamPath: 'open', keyLocation: 'Key cabinet B, hook 15', purpose: 'Dye laser, replaced by L-13.' } },
  { tag: 'L-16', maker: 'Quenlorn', model: 'QI-6', area: 'B-203', fate: 'in-use',
    lines: [
      cw(457.9, 0.35, { d: 1.5, div: 0.5, source: L }),
      cw(476.5, 0.75, { d: 1.5, div: 0.5, source: L }),
      cw(488, 1.5, { d: 1.5, div: 0.5, source: L }),
      cw(496.5, 0.7, { d: 1.5, div: 0.5, source: L }),
      cw(501.7, 0.4, { d: 1.5, div: 0.5, source: L }),
      cw(514.5, 2, { d: 1.5, div: 0.5, source: L }),
    ],
    sets: { 'all lines': [0, 1, 2, 3, 4, 5], '488 + 514.5': [2, 5] },
    record: { ...classes('4'), serial: 'QI6-3061', year: 2006, medium: 'gas', beamPath: 'open', purpose: 'Raman and holography.' } },
  { tag: 'L-17', maker: 'Marrowby', model: 'MB-780', area: 'B-204', fate: 'in-use',
    lines: [cw(780, 80e-3, { d: [2.5, 1], div: [0.5, 1] })],
    record: { ...classes('3B'), serial: 'MB780-51', year: 2021, medium: 'semiconductor', beamPath: 'limited-open', purpose: 'Repumper.' } },
  { tag: 'L-18', maker: 'Marrowby', model: 'MB-TA', area: 'B-204', fate: 'in-use',
    lines: [cw(780, 1.5, { more: singleMode(5.6, 0.12) })],
    record: { ...classes('4'), serial: 'MBTA-207', year: 2022, medium: 'semiconductor', beamPath: 'limited-open', purpose: 'Cooling light for the magneto-optical trap.' },
    assumptions: ['Three cases of the fiber: connected, disconnected and broken. The open end is evaluated.'] },
  { tag: 'L-19', maker: 'Fennimarsh', model: 'FM-20', area: 'B-204', fate: 'in-use', signedDaysAgo: 240,
    lines: [cw(1064, 20, { d: 1, div: 1.4, usualW: 8 })],
    record: { ...classes('4'), serial: 'FM20-1405', year: 2020, medium: 'fiber', beamPath: 'limited-open', purpose: 'Dipole trap.' },
    assumptions: ['The limit of 8 W is set in software: it is no hardware limit, the maximum is evaluated.'] },
  { tag: 'L-20', maker: 'Marrowby', model: 'MB-852', area: 'B-204', fate: 'registered', daysAgo: 4,
    lines: [cw(852, 60e-3, { d: [2, 1], div: [0.6, 1.1] })],
    record: { ...classes('3B'), serial: 'MB852-09', year: 2026, medium: 'semiconductor', beamPath: 'limited-open', purpose: 'Second species.' } },
  { tag: 'L-21', maker: 'Oakhollin', model: 'OH-M', area: 'B-210', fate: 'service-open', daysAgo: 2,
    lines: [cw(532, 100e-3, { d: 0.7, div: 1.2, label: 'open stage' })],
    record: { ...classes('1', '3B'), serial: 'OHM-0712', year: 2019, medium: 'solid', beamPath: 'enclosed', purpose: 'Confocal Raman microscope: Class 1 at the eyepiece, 3B at the open stage.' } },
  { tag: 'L-22', maker: 'Oakhollin', model: 'OH-N', area: 'B-210', fate: 'in-check', daysAgo: 5,
    lines: [cw(785, 325e-3, { d: 1, div: 1.5, source: M })],
    record: { ...classes('3B'), serial: 'OHN-0330', year: 2024, medium: 'semiconductor', beamPath: 'limited-open', labelAsFound: '785 nm, 250 mW', purpose: 'Raman excitation.' },
    assumptions: ['Declared 250 mW, measured 325 mW: 30 % apart. The higher one is evaluated.'] },
  { tag: 'L-23', maker: 'Tarnovane', model: 'TV-R', area: 'B-204', fate: 'in-use', signedDaysAgo: 8,
    lines: [cw(700, 1.2, { d: 0.8, div: 1.7, toNm: 1000 })],
    record: { ...classes('4'), serial: 'TVR-G-118', year: 2023, medium: 'solid', beamPath: 'limited-open', contact: 'Zdenka Hroudnova, guest', purpose: 'Laser of a visitor, here for three weeks; not in the own count.' },
    atNm: { 0: 760 },
    conditions: '760–860 nm only, by a sealed mechanical stop.' },
  { tag: 'L-24', maker: 'Fennimarsh', model: 'FM-C', area: 'C-005', fate: 'in-use', signedDaysAgo: 190,
    lines: [cw(10_600, 100, { d: 8, div: 2 })],
    record: { ...classes('4'), serial: 'FMC-2290', year: 2013, medium: 'gas', beamPath: 'limited-open', purpose: 'Cutting of polymers behind a polycarbonate panel.' } },
  { tag: 'L-25', maker: 'Fennimarsh', model: 'FM-4k', area: 'C-005', fate: 'in-use',
    lines: [cw(1070, 4000, { d: 20, div: 5 })],
    record: { ...classes('4'), serial: 'FM4K-0008', year: 2018, medium: 'fiber', beamPath: 'limited-open', purpose: 'Welding cell.' },
    assumptions: ['Behind the collimator. The diffuse zone is larger than the room: the whole room is hazard zone.'] },
  { tag: 'L-26', maker: 'Fennimarsh', model: 'FM-MK', area: 'C-005', fate: 'service-open', daysAgo: 0,
    lines: [pulsed(1064, [1e-3, ns(100), 20e3], { d: 7, div: 1 })],
    record: { ...classes('1', '4'), serial: 'FMMK-0601', year: 2016, medium: 'fiber', beamPath: 'enclosed', purpose: 'Marker: Class 1 with an embedded Class 4.' } },
  { tag: 'L-27', maker: 'Fennimarsh', model: 'FM-H', supervisor: 'P24', fate: 'in-use',
    lines: [cw(1080, 1500, { d: 6, div: 4 })],
    record: { ...classes('4'), serial: 'FMH-0017', year: 2024, medium: 'fiber', mobile: true, beamPath: 'open', outdoor: true, department: 'Materials Processing', purpose: 'Hand-held cleaning, a permit for each job.' } },
  { tag: 'L-28', maker: 'Tarnovane', model: 'TV-U', area: 'C-006', fate: 'blocked', daysAgo: 5,
    why: 'The permit of C-006 has lapsed.',
    lines: [pulsed(355, [100e-6, ns(15), 50e3], { d: 1.5, div: 0.8 })],
    record: { ...classes('4'), serial: 'TVU-0455', year: 2019, medium: 'solid', beamPath: 'enclosed', purpose: 'Drilling of foils.' } },
  { tag: 'L-29', maker: 'Ysbreck', model: 'YS-193', area: 'C-006', fate: 'blocked', daysAgo: 5,
    why: 'The permit of C-006 has lapsed.',
    lines: [pulsed(193, [100e-3, ns(20), 100], { d: [24, 10], div: [3, 1], more: { profile: 'top-hat' } })],
    record: { ...classes('4'), serial: 'YS193-031', year: 2012, medium: 'gas', beamPath: 'enclosed', purpose: 'Ablation of ceramics.' } },
  { tag: 'L-30', maker: 'Ysbreck', model: 'YS-248', area: 'C-006', fate: 'stored', daysAgo: 95,
    lines: [pulsed(248, [250e-3, ns(25), 50], { d: [24, 10], div: [3, 1], more: { profile: 'top-hat' } })],
    record: { ...classes('4'), serial: 'YS248-102', year: 2010, medium: 'gas', beamPath: 'enclosed', table: 'Store E-002, locked', keyLocation: 'Safe, key K-30', purpose: 'Spare of L-29.' } },
  { tag: 'L-31', maker: 'Oakhollin', model: 'OH-3', area: 'C-005', fate: 'in-use',
    lines: [cw(635, 0.9e-3, { d: 3, div: 1, source: L })],
    record: { ...classes('2'), serial: 'OH3-209', year: 2013, medium: 'semiconductor', alignmentLaser: true, purpose: 'Pointing beam of L-24.' } },
  { tag: 'L-32', maker: 'Marrowby', model: 'MB-976', area: 'C-012', fate: 'in-use',
    lines: [cw(976, 10, { more: multimode(0.22, 105) })],
    record: { ...classes('4'), serial: 'MB976-44', year: 2021, medium: 'semiconductor', beamPath: 'limited-open', purpose: 'Pump of fiber amplifiers.' } },
  { tag: 'L-33', maker: 'Quenlorn', model: 'QE-2', area: 'C-012', fate: 'in-use',
    lines: [cw(1550, 2, { more: singleMode(10.4) })],
    record: { ...classes('1', '4'), serial: 'QE2-0909', year: 2022, medium: 'fiber', beamPath: 'enclosed', purpose: 'Amplifier: Class 1 connected, Class 4 open.' } },
  { tag: 'L-34', maker: 'Marrowby', model: 'MB-BAR', area: 'D-305', fate: 'commissioning', daysAgo: 4,
    lines: [cw(808, 40, { d: [10, 0.001], div: [140, 1040] })],
    record: { ...classes('4'), serial: 'MBBAR-3', year: 2025, medium: 'semiconductor', beamPath: 'open', keyLocation: 'Key cabinet D, hook 34', purpose: 'Characterization of bars, two axes.' } },
  { tag: 'L-35', maker: 'Brindlewick', model: 'BW-Q', area: 'D-305', fate: 'checked', daysAgo: 3,
    lines: [cw(4600, 150e-3, { d: 3, div: 5 })],
    record: { ...classes('3B'), serial: 'BWQ-0061', year: 2025, medium: 'semiconductor', beamPath: 'open', purpose: 'Gas sensing.' } },
  { tag: 'L-36', maker: 'Brindlewick', model: 'BW-Q9', area: 'D-305', fate: 'draft', daysAgo: 2,
    lines: [line(9200, 'repetitive', { peakPowerW: 4, pulseDurationS: ns(300), repetitionRateHz: 100e3 }, { d: 4, div: 6, source: E })],
    record: { ...classes('3B'), serial: 'BWQ9-007', year: 2026, medium: 'semiconductor', beamPath: 'open', purpose: 'Gas sensing, pulsed.' } },
  { tag: 'L-37', maker: 'home-built', model: 'array with diffuser', area: 'D-305', fate: 'received', daysAgo: 12,
    lines: [
      line(940, 'repetitive', { powerW: 2, pulseDurationS: ns(2), repetitionRateHz: 1e6 }, { d: [2, 2], div: [700, 700], source: E }),
    ],
    record: { homeBuilt: true, medium: 'semiconductor', note: 'Array of 940 nm emitters with a diffuser, built in the group for depth sensing. Power measured, divergence estimated; class unknown.' } },
  { tag: 'L-38', maker: 'Tarnovane', model: 'TV-2P', area: 'D-301', fate: 'in-use',
    lines: [modeLocked(690, [3, fs(120), 80e6], { d: 1.2, div: 1.2, toNm: 1040 })],
    record: { ...classes('4'), serial: 'TV2P-0714', year: 2022, medium: 'solid', beamPath: 'limited-open', purpose: 'Two-photon microscope.' } },
  { tag: 'L-39', maker: 'Oakhollin', model: 'OH-4C', area: 'D-301', fate: 'in-use',
    lines: [405, 488, 561, 640].map((nm) => cw(nm, 50e-3, { d: 0.7, div: 1.2, more: { connector: 'fiber with collimator' } })),
    record: { ...classes('1', '3B'), serial: 'OH4C-0226', year: 2021, medium: 'semiconductor', beamPath: 'enclosed', purpose: 'Confocal microscope, four lines.' } },
  { tag: 'L-40', maker: 'Quenlorn', model: 'QB-1', area: 'D-301', fate: 'on-loan', daysAgo: 15,
    lines: [cw(473, 100e-3, { source: L, more: multimode(0.22, 200, 'label') })],
    record: { ...classes('3B'), serial: 'QB1-0118', year: 2018, medium: 'solid', beamPath: 'enclosed', keyLocation: 'With the laser', purpose: 'Light for optogenetics.' } },
  { tag: 'L-41', maker: 'Ysbreck', model: 'YS-L', area: 'PC-1', fate: 'in-use',
    lines: [
      pulsed(1064, [300e-3, ns(8), 20], { d: 140, div: 0.05 }),
      pulsed(532, [150e-3, ns(8), 20], { d: 140, div: 0.05 }),
    ],
    record: { ...classes('4'), serial: 'YSL-0013', year: 2020, medium: 'solid', outdoor: true, beamPath: 'open', purpose: 'Aerosol lidar; the beam is expanded 20 times.' },
    conditions: 'Spotter and aviation notice.' },
  { tag: 'L-42', maker: 'unknown', model: 'old tube', area: 'PC-1', fate: 'in-use',
    lines: [cw(670, 4e-3, { d: 3, div: 1.5, source: L })],
    record: { ...classes('IIIa'), medium: 'semiconductor', labelAsFound: 'CLASS IIIa LASER PRODUCT, 670 nm, max 5 mW', declaredStandard: 'FDA, as on the label', purpose: 'Pointing of the telescope.' } },
];

/** Id of a line by its place in the list. */
export function lineId({ tag, lines }: DemoLaser, index: number): string {
  const line = lines[index];
  if (!line) throw new Error(`${tag} has no line ${index}.`);
  return line.id;
}

/** The LSO's own class where it is not the declared one. */
export const VERIFIED_CLASSES: Readonly<Record<string, LaserInput['verifiedClass']>> = {
  'L-11': '3B',
  'L-42': '3R',
};

/** The line that was added to L-03, and the power of L-12 since it was halved. */
export const DOUBLED_LINE = pulsed(400, [1e-3, fs(50), 1000], { d: 11, div: 0.2, source: E });
export const HALVED_POWER_W = 40e-3;
/** The divergence with which L-19 was evaluated at first, by mistake. */
export const WRONG_DIVERGENCE_MRAD = 14;
