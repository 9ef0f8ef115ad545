import type { Beam, PerAxis } from '../case';
import { checkEmission } from './check-emission';
import type { UsedOfBeam } from './check-path';
import type { FieldCheck, NumberRange } from './field-check';

const MOST_BEAMS = 64;
const BEAMS_ALLOWED = `a list of 1 to ${MOST_BEAMS} beams`;

const BEAM_FIELDS = new Set([
  'label',
  'wavelengthNm',
  'emission',
  'diameterMm',
  'divergenceMrad',
  'width',
  'profile',
  'sourceMrad',
  'waistDistanceM',
  'm2',
]);

type BeamFields = Partial<Record<keyof Beam, unknown>>;

const WAVELENGTH: NumberRange = {
  isInside: (value) => value >= 180 && value <= 1e6,
  allowed: 'a number of nanometers from 180 to 1 000 000',
};

const ANY_NUMBER: NumberRange = { isInside: () => true, allowed: 'a finite number' };

/** Checks every beam. */
export function checkBeams(check: FieldCheck, beams: unknown, used: UsedOfBeam): void {
  if (!Array.isArray(beams)) {
    const what = beams === undefined ? 'beams is missing.' : 'beams must be a list.';
    check.fail('beams', what, BEAMS_ALLOWED);
  } else if (beams.length < 1 || beams.length > MOST_BEAMS) {
    check.fail('beams', `There are ${beams.length} beams.`, BEAMS_ALLOWED);
  } else {
    const list = check.within('beams');
    for (let i = 0; i < beams.length; i++) checkBeam(list.within(i), beams[i], used);
  }
}

function checkBeam(check: FieldCheck, beam: unknown, used: UsedOfBeam): void {
  const fields: BeamFields | undefined = check.object(beam, BEAM_FIELDS);
  if (fields === undefined) return;
  if (fields.label !== undefined) check.text(fields.label, 'label');
  checkWavelength(check, fields.wavelengthNm);
  checkEmission(check.within('emission'), fields.emission);
  if (fields.sourceMrad !== undefined) check.perAxis(fields.sourceMrad, 'sourceMrad');
  checkGeometry(check, fields, used);
}

function checkWavelength(check: FieldCheck, wavelengthNm: unknown): void {
  if (typeof wavelengthNm === 'object' && wavelengthNm !== null && !Array.isArray(wavelengthNm)) {
    check.fail(
      'wavelengthNm',
      'A wavelength range is not evaluated by this version.',
      `a single wavelength: ${WAVELENGTH.allowed}`,
    );
  } else {
    check.number(wavelengthNm, 'wavelengthNm', WAVELENGTH);
  }
}

function checkGeometry(check: FieldCheck, fields: BeamFields, used: UsedOfBeam): void {
  const { diameterMm, divergenceMrad, waistDistanceM, profile, width, m2 } = fields;
  const isDiameter = used.diameter && check.perAxis(diameterMm, 'diameterMm');
  const isDivergence = used.divergence && check.perAxis(divergenceMrad, 'divergenceMrad');
  if (used.profile) {
    check.choice(profile, 'profile', ['gaussian', 'top-hat']);
    if (profile !== 'top-hat' || width !== undefined) check.choice(width, 'width', ['1/e', '1/e2']);
  }
  if (!used.waist) return;
  if (m2 !== undefined) check.number(m2, 'm2');
  if (waistDistanceM === undefined) return;
  const isWaist = check.number(waistDistanceM, 'waistDistanceM', ANY_NUMBER);
  if (isWaist && isDiameter && isDivergence) {
    checkWaist(check, waistDistanceM, diameterMm as PerAxis, divergenceMrad as PerAxis);
  }
}

/** A beam that narrows from the exit to its waist must have some width left there. */
function checkWaist(
  check: FieldCheck,
  waistDistanceM: number,
  diameterMm: PerAxis,
  divergenceMrad: PerAxis,
): void {
  const farthestM = Math.min(reachOfWaist(0), reachOfWaist(1));
  if (Math.abs(waistDistanceM) < farthestM) return;
  const printed = Number(farthestM.toPrecision(6));
  check.fail(
    'waistDistanceM',
    `With this divergence the beam has no positive waist ${waistDistanceM} m from the exit.`,
    `between -${printed} and ${printed} m, edges excluded (diameter / divergence)`,
  );

  function reachOfWaist(axis: 0 | 1): number {
    const d = typeof diameterMm === 'number' ? diameterMm : diameterMm[axis];
    const phi = typeof divergenceMrad === 'number' ? divergenceMrad : divergenceMrad[axis];
    return d / phi;
  }
}
