import type { Beam, Emission as BeamEmission, Path, PerAxis } from '../hazard/case';
import {
  fullFromHalfAngle,
  oneOverE2FromFwhm,
  pulseEnergyFromMeanPower,
} from '../hazard/convert-beam';
import { figure } from '../text/figure';
import type { Emission, Quantity } from './lasers';
import type { FieldError } from './problem';

/** A line as the engine takes it, with every step from the data sheet told in a sentence. */
export type BeamOf =
  | {
      readonly ok: true;
      readonly beam: Beam;
      /** The way out of a fiber; absent for a free beam. */
      readonly fiber?: Path;
      readonly conversions: readonly string[];
      readonly assumptions: readonly string[];
    }
  | { readonly ok: false; readonly errors: readonly FieldError[] };

interface Notes {
  readonly conversions: string[];
  readonly assumptions: string[];
  readonly errors: FieldError[];
}

/**
 * The engine's beam for one line of a laser: the maximum is evaluated, the operating value is only
 * told. Widths come out at 1/e², angles as full angles, pulses by their energy.
 *
 * @param atWavelengthNm for a tunable line: the wavelength that is evaluated, nm
 * @param path the scenario's path; a lens, a diffuse spot and a fiber need fewer figures of the beam
 */
export function beamOf(
  emission: Emission,
  atWavelengthNm?: number,
  path: Path = { kind: 'direct' },
): BeamOf {
  const notes: Notes = { conversions: [], assumptions: [], errors: [] };
  const wavelengthNm = wavelengthOf(emission, atWavelengthNm, notes);
  const timing = timingOf(emission, notes);
  const isFiberEnd = path.kind === 'direct' && emission.delivery !== 'beam';
  const fiber = isFiberEnd ? fiberOf(emission, notes) : undefined;
  const hasShape = path.kind === 'lens' || (path.kind === 'direct' && !isFiberEnd);
  const shape = hasShape ? shapeOf(emission, wavelengthNm, notes) : {};
  if (notes.errors.length > 0 || !timing || wavelengthNm === undefined) {
    return { ok: false, errors: notes.errors };
  }
  mentionOperatingPower(emission, notes);
  if (emission.scan) {
    notes.assumptions.push(
      'The scan is not credited: evaluated as a beam that stands still, as after a failure.',
    );
  }
  const beam: Beam = {
    ...(emission.label ? { label: emission.label } : {}),
    wavelengthNm,
    emission: timing,
    width: '1/e2',
    profile: emission.profile,
    ...shape,
    ...(emission.sourceMrad ? { sourceMrad: emission.sourceMrad.value } : {}),
    ...(emission.waistDistanceM !== undefined ? { waistDistanceM: emission.waistDistanceM } : {}),
    ...(emission.m2 !== undefined ? { m2: emission.m2 } : {}),
  };
  const { conversions, assumptions } = notes;
  return { ok: true, beam, ...(fiber ? { fiber } : {}), conversions, assumptions };
}

function wavelengthOf(
  emission: Emission,
  atWavelengthNm: number | undefined,
  notes: Notes,
): number | undefined {
  const fromNm = emission.wavelengthNm.value;
  if (!(fromNm >= 180 && fromNm <= 1e6)) {
    fail(
      notes,
      'wavelengthNm',
      `The wavelength is ${fromNm} nm.`,
      'A wavelength from 180 to 1,000,000 nm.',
    );
    return undefined;
  }
  if (!emission.wavelengthToNm) return fromNm;
  const toNm = emission.wavelengthToNm.value;
  const range = `${figure(fromNm)}–${figure(toNm)} nm`;
  if (!(toNm > fromNm && toNm <= 1e6)) {
    fail(
      notes,
      'wavelengthToNm',
      `The tuning range ends at ${figure(toNm)} nm, not above its beginning of ${figure(fromNm)} nm.`,
      `More than ${figure(fromNm)} and at most 1,000,000 nm.`,
    );
    return undefined;
  }
  if (atWavelengthNm === undefined || !(atWavelengthNm >= fromNm && atWavelengthNm <= toNm)) {
    fail(
      notes,
      'atWavelengthNm',
      atWavelengthNm === undefined
        ? `The line is tunable over ${range}; no wavelength is chosen.`
        : `${figure(atWavelengthNm)} nm is outside the tuning range ${range}.`,
      `A wavelength from ${figure(fromNm)} to ${figure(toNm)} nm.`,
    );
    return undefined;
  }
  notes.assumptions.push(
    `Evaluated at ${figure(atWavelengthNm)} nm of ${range}; other wavelengths are not covered here.`,
  );
  return atWavelengthNm;
}

function timingOf(emission: Emission, notes: Notes): BeamEmission | undefined {
  switch (emission.mode) {
    case 'cw':
      return continuousOf(emission, notes);
    case 'modulated':
      return modulatedOf(emission, notes);
    case 'single': {
      const pulseDurationS = need(emission, 'pulseDurationS', 'the pulse duration', notes);
      const pulseEnergyJ = pulseEnergyOf(emission, undefined, notes);
      if (pulseEnergyJ === undefined || pulseDurationS === undefined) return undefined;
      return { mode: 'single', pulseEnergyJ, pulseDurationS };
    }
    case 'repetitive':
    case 'mode-locked': {
      const pulseDurationS = need(emission, 'pulseDurationS', 'the pulse duration', notes);
      const repetitionRateHz = need(emission, 'repetitionRateHz', 'the repetition rate', notes);
      const pulseEnergyJ = pulseEnergyOf(emission, repetitionRateHz, notes);
      if (pulseEnergyJ === undefined || !pulseDurationS || !repetitionRateHz) return undefined;
      return { mode: 'repetitive', pulseEnergyJ, pulseDurationS, repetitionRateHz };
    }
    case 'burst':
      return burstOf(emission, notes);
  }
}

function continuousOf(emission: Emission, notes: Notes): BeamEmission | undefined {
  const powerW = need(emission, 'powerW', 'the power', notes);
  return powerW === undefined ? undefined : { mode: 'cw', powerW };
}

/** Without a duration and a rate the modulation is not credited: continuous at its highest power. */
function modulatedOf(emission: Emission, notes: Notes): BeamEmission | undefined {
  const { pulseDurationS, repetitionRateHz } = emission;
  const hasEnergy = emission.pulseEnergyJ ?? emission.peakPowerW ?? emission.powerW;
  if (pulseDurationS && repetitionRateHz && hasEnergy) {
    const pulseEnergyJ = pulseEnergyOf(emission, repetitionRateHz.value, notes);
    if (pulseEnergyJ === undefined) return undefined;
    return {
      mode: 'repetitive',
      pulseEnergyJ,
      pulseDurationS: pulseDurationS.value,
      repetitionRateHz: repetitionRateHz.value,
    };
  }
  const powerW = Math.max(emission.powerW?.value ?? 0, emission.peakPowerW?.value ?? 0);
  if (powerW === 0) {
    fail(
      notes,
      'peakPowerW',
      'The peak power of the modulated line is missing.',
      'A power above 0 W, or the pulse duration and the repetition rate.',
    );
    return undefined;
  }
  notes.assumptions.push(
    `The modulation is not credited: evaluated as continuous at ${figure(powerW, 'W')}.`,
  );
  return { mode: 'cw', powerW };
}

function burstOf(emission: Emission, notes: Notes): BeamEmission | undefined {
  const pulseDurationS = need(emission, 'pulseDurationS', 'the pulse duration', notes);
  const pulsesPerBurst = need(emission, 'pulsesPerBurst', 'the number of pulses in a burst', notes);
  const intraBurstRateHz = need(emission, 'intraBurstRateHz', 'the rate inside a burst', notes);
  const burstRateHz = need(emission, 'burstRateHz', 'the rate of the bursts', notes);
  const meanRateHz =
    pulsesPerBurst !== undefined && burstRateHz !== undefined
      ? pulsesPerBurst * burstRateHz
      : undefined;
  const pulseEnergyJ = pulseEnergyOf(emission, meanRateHz, notes);
  if (!pulseEnergyJ || !pulseDurationS || !pulsesPerBurst || !intraBurstRateHz || !burstRateHz) {
    return undefined;
  }
  return {
    mode: 'burst',
    pulseEnergyJ,
    pulseDurationS,
    pulsesPerBurst,
    intraBurstRateHz,
    burstRateHz,
  };
}

/** The pulse energy by every way the data sheet gives it; the highest counts. */
function pulseEnergyOf(
  emission: Emission,
  meanRateHz: number | undefined,
  notes: Notes,
): number | undefined {
  const ways: { energyJ: number; conversion?: string }[] = [];
  if (emission.pulseEnergyJ) ways.push({ energyJ: emission.pulseEnergyJ.value });
  if (emission.powerW && meanRateHz) {
    const energyJ = pulseEnergyFromMeanPower(emission.powerW.value, meanRateHz).value;
    const conversion =
      `Pulse energy ${figure(energyJ, 'J')}: the mean power ${figure(emission.powerW.value, 'W')} ` +
      `divided by ${figure(meanRateHz, 'Hz')}.`;
    ways.push({ energyJ, conversion });
  }
  if (emission.peakPowerW && emission.pulseDurationS) {
    const energyJ = emission.peakPowerW.value * emission.pulseDurationS.value;
    const conversion =
      `Pulse energy ${figure(energyJ, 'J')}: the peak power ${figure(emission.peakPowerW.value, 'W')} ` +
      `over ${figure(emission.pulseDurationS.value, 's')}.`;
    ways.push({ energyJ, conversion });
  }
  // Of equal figures the one that was given counts, not one that was converted.
  const [highest] = [...ways].sort((a, b) => differs(a.energyJ, b.energyJ));
  if (!highest) {
    fail(
      notes,
      'pulseEnergyJ',
      'The pulse energy is missing.',
      emission.mode === 'single'
        ? 'A pulse energy, or a peak power with the pulse duration.'
        : 'A pulse energy, a mean power with the repetition rate, or a peak power with the pulse duration.',
    );
    return undefined;
  }
  if (highest.conversion) notes.conversions.push(highest.conversion);
  const lowestJ = Math.min(...ways.map((way) => way.energyJ));
  if (highest.energyJ > lowestJ * 1.01) {
    notes.assumptions.push(
      `The figures give pulse energies from ${figure(lowestJ, 'J')} to ${figure(highest.energyJ, 'J')}; the highest is evaluated.`,
    );
  }
  return highest.energyJ;
}

/** Descending; 0 when they differ by rounding only. */
function differs(a: number, b: number): number {
  return Math.abs(a - b) <= 1e-9 * Math.max(a, b) ? 0 : b - a;
}

/** The way out of the fiber by which the line leaves. */
function fiberOf(emission: Emission, notes: Notes): Path | undefined {
  const { delivery, numericalAperture, modeFieldDiameterUm } = emission;
  if (delivery === 'single-mode-fiber' && modeFieldDiameterUm) {
    return { kind: 'fiber', modeFieldDiameterUm: modeFieldDiameterUm.value };
  }
  if (numericalAperture && numericalAperture.value < 1) {
    if (delivery === 'single-mode-fiber') {
      notes.assumptions.push(
        'The mode field is unknown: the numerical aperture is taken as the 5 % point of the cone.',
      );
    }
    return { kind: 'fiber', numericalAperture: numericalAperture.value };
  }
  if (delivery === 'single-mode-fiber') {
    fail(
      notes,
      'modeFieldDiameterUm',
      'The mode-field diameter of the single-mode fiber is missing.',
      'A mode-field diameter above 0 µm, or a numerical aperture below 1.',
    );
  } else {
    fail(
      notes,
      'numericalAperture',
      numericalAperture
        ? `A numerical aperture of ${numericalAperture.value} is not possible in air.`
        : 'The numerical aperture of the fiber is missing.',
      'A number above 0 and below 1, such as 0.22.',
    );
  }
  return undefined;
}

function shapeOf(
  emission: Emission,
  wavelengthNm: number | undefined,
  notes: Notes,
): Pick<Beam, 'diameterMm' | 'divergenceMrad'> {
  if (!emission.diameterMm) {
    fail(
      notes,
      'diameterMm',
      'The beam diameter is missing.',
      'A diameter above 0 mm; for a fiber its numerical aperture or mode field instead.',
    );
    return {};
  }
  const diameter = axes(emission.diameterMm, emission.diameterYMm);
  const diameterMm = widthAt1e2(diameter, emission, 'diameter', notes);
  if (emission.divergenceMrad) {
    const given = axes(emission.divergenceMrad, emission.divergenceYMrad);
    const full = fullAngle(given, emission, notes);
    return { diameterMm, divergenceMrad: widthAt1e2(full, emission, 'divergence', notes) };
  }
  if (wavelengthNm === undefined) return {};
  const divergenceMrad = map(diameterMm, (mm) => diffractionLimitMrad(wavelengthNm, mm));
  notes.assumptions.push(
    `The divergence is unknown: evaluated with ${say(divergenceMrad, 'mrad')}, the smallest that a beam of this diameter can have.`,
  );
  return { diameterMm, divergenceMrad };
}

/**
 * Full angle of a Gaussian at its diffraction limit, both at 1/e²: 4λ/(πd).
 *
 * @returns mrad
 */
export function diffractionLimitMrad(wavelengthNm: number, diameterMm: number): number {
  return (4 * wavelengthNm * 1e-9) / (Math.PI * diameterMm * 1e-3) / 1e-3;
}

function fullAngle(value: PerAxis, emission: Emission, notes: Notes): PerAxis {
  if (emission.divergenceAngle === 'full') return value;
  const full = map(value, (half) => fullFromHalfAngle(half).value);
  notes.conversions.push(
    `Divergence: the half angle ${say(value, 'mrad')} is the full angle ${say(full, 'mrad')}.`,
  );
  return full;
}

/** A top-hat has one width, whatever the convention says. */
function widthAt1e2(
  value: PerAxis,
  emission: Emission,
  which: 'diameter' | 'divergence',
  notes: Notes,
): PerAxis {
  const convention =
    which === 'diameter' ? emission.diameterConvention : emission.divergenceConvention;
  if (emission.profile === 'top-hat' || convention === '1/e2') return value;
  const isFwhm = convention === 'fwhm';
  const unit = which === 'diameter' ? 'mm' : 'mrad';
  const at1e2 = map(
    value,
    isFwhm ? (width) => oneOverE2FromFwhm(width).value : oneOverE2FromOneOverE,
  );
  const what = which === 'diameter' ? 'Diameter' : 'Divergence';
  const how = isFwhm ? 'at half maximum (FWHM)' : 'at 1/e';
  const factor = isFwhm ? '1.699' : '1.414';
  notes.conversions.push(
    `${what}: ${say(value, unit)} ${how} is ${say(at1e2, unit)} at 1/e² (Gaussian, times ${factor}).`,
  );
  return at1e2;
}

/** The 1/e² width of a Gaussian from its 1/e width. */
function oneOverE2FromOneOverE(width: number): number {
  return width * Math.SQRT2;
}

function mentionOperatingPower(emission: Emission, notes: Notes): void {
  const { operatingPowerW, powerW } = emission;
  if (!operatingPowerW) return;
  const usual = `usually set to ${figure(operatingPowerW.value, 'W')}`;
  notes.assumptions.push(
    powerW
      ? `The maximum of ${figure(powerW.value, 'W')} is evaluated; it is ${usual}.`
      : `The maximum is evaluated; it is ${usual}.`,
  );
}

function need(
  emission: Emission,
  field:
    | 'powerW'
    | 'pulseDurationS'
    | 'repetitionRateHz'
    | 'pulsesPerBurst'
    | 'intraBurstRateHz'
    | 'burstRateHz',
  what: string,
  notes: Notes,
): number | undefined {
  const quantity = emission[field];
  if (quantity) return quantity.value;
  fail(notes, field, `For this mode ${what} is missing.`, 'A number above 0, with its unit.');
  return undefined;
}

function fail(notes: Notes, path: string, message: string, allowed: string): void {
  notes.errors.push({ path, message, allowed });
}

function axes(x: Quantity, y: Quantity | undefined): PerAxis {
  return y && y.value !== x.value ? [x.value, y.value] : x.value;
}

function map(value: PerAxis, change: (number: number) => number): PerAxis {
  return typeof value === 'number' ? change(value) : [change(value[0]), change(value[1])];
}

function say(value: PerAxis, unit: string): string {
  return typeof value === 'number'
    ? figure(value, unit)
    : `${figure(value[0])} × ${figure(value[1], unit)}`;
}
