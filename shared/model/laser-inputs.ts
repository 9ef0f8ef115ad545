import type { Area } from './areas';
import type { LaserInputs } from './evaluations';
import type { Emission, Laser, Quantity } from './lasers';
import { figure } from '../text/figure';
import { PROVENANCE_WORDS } from '../text/provenance-words';

type InputsOf = Pick<Laser, 'emissions' | 'emissionSets' | 'areaId' | 'beamPath'>;

/** The part of a laser's record that its evaluation rests on. */
export function laserInputsOf(
  laser: InputsOf,
  wallDistanceM: Area['wallDistanceM'] = undefined,
): LaserInputs {
  return {
    emissions: laser.emissions,
    emissionSets: laser.emissionSets,
    ...(laser.areaId ? { areaId: laser.areaId } : {}),
    ...(wallDistanceM !== undefined ? { wallDistanceM } : {}),
    ...(laser.beamPath ? { beamPath: laser.beamPath } : {}),
  };
}

/**
 * What the hash of the inputs is taken of: all of them but the text a number was typed as, since
 * "5 mW" and "0.005 W" are the same input.
 */
export function hashedInputs(inputs: LaserInputs): LaserInputs {
  return { ...inputs, emissions: inputs.emissions.map(withoutTexts) };
}

function withoutTexts(emission: Emission): Emission {
  const entries = Object.entries(emission).map(([field, value]) => {
    return [field, isQuantity(value) ? withoutText(value) : value] as const;
  });
  return Object.fromEntries(entries) as Emission;
}

function withoutText({ text: _typed, ...quantity }: Quantity): Quantity {
  return quantity;
}

function isQuantity(value: unknown): value is Quantity {
  return typeof value === 'object' && value !== null && 'value' in value && 'source' in value;
}

export interface InputChange {
  readonly field: string;
  readonly sealed: string;
  readonly today: string;
}

/** Every input that differs, in words: the field, what was sealed, what it is today. */
export function changedInputs(sealed: LaserInputs, today: LaserInputs): InputChange[] {
  const changes: InputChange[] = [];
  for (const before of sealed.emissions) {
    const after = today.emissions.find(({ id }) => id === before.id);
    const line = lineName(before);
    if (!after) changes.push({ field: line, sealed: 'on record', today: 'removed' });
    else changes.push(...changedFields(line, before, after));
  }
  for (const after of today.emissions) {
    if (!sealed.emissions.some(({ id }) => id === after.id)) {
      changes.push({ field: lineName(after), sealed: 'not on record', today: 'added' });
    }
  }
  pushIfDifferent(changes, 'Sets of lines', setsText(sealed), setsText(today));
  // The id of an area says nothing to a reader: the place is told as changed, not as what.
  if (sealed.areaId !== today.areaId) {
    changes.push({ field: 'Area', sealed: 'the area as evaluated', today: 'another area' });
  }
  pushIfDifferent(changes, 'Distance to the wall', wallText(sealed), wallText(today));
  pushIfDifferent(changes, 'Beam path', sealed.beamPath ?? NONE, today.beamPath ?? NONE);
  return changes;
}

const NONE = 'not given';

/** "532 nm", or "690–1040 nm" with the label in front when there is one. */
export function lineName(emission: Emission): string {
  const from = figure(emission.wavelengthNm.value);
  const to = emission.wavelengthToNm ? `–${figure(emission.wavelengthToNm.value)}` : '';
  const line = `${from}${to} nm`;
  return emission.label ? `${emission.label}, ${line}` : line;
}

function changedFields(line: string, before: Emission, after: Emission): InputChange[] {
  const changes: InputChange[] = [];
  const fields = new Set([...Object.keys(before), ...Object.keys(after)]) as Set<keyof Emission>;
  for (const field of fields) {
    pushIfDifferent(
      changes,
      `${line}: ${words(field)}`,
      valueText(field, before[field]),
      valueText(field, after[field]),
    );
  }
  return changes;
}

function pushIfDifferent(
  changes: InputChange[],
  field: string,
  sealed: string,
  today: string,
): void {
  if (sealed !== today) changes.push({ field, sealed, today });
}

const UNITS: readonly (readonly [suffix: string, unit: string])[] = [
  ['Mrad', 'mrad'],
  ['Nm', 'nm'],
  ['Mm', 'mm'],
  ['Um', 'µm'],
  ['Hz', 'Hz'],
  ['W', 'W'],
  ['J', 'J'],
  ['S', 's'],
  ['M', 'm'],
];

function unitOf(field: string): readonly [suffix: string, unit: string] {
  return UNITS.find(([suffix]) => field.endsWith(suffix)) ?? ['', ''];
}

/** "pulseEnergyJ" as "pulse energy". */
function words(field: string): string {
  const [suffix] = unitOf(field);
  const name = suffix ? field.slice(0, -suffix.length) : field;
  return name.replace(/[A-Z]/g, (capital) => ` ${capital.toLowerCase()}`);
}

/** Unrounded, so that any difference shows. */
function valueText(field: string, value: unknown): string {
  if (value === undefined) return NONE;
  const [, unit] = unitOf(field);
  const number = isQuantity(value) ? value.value : value;
  const text = unit ? `${String(number)} ${unit}` : String(number);
  if (!isQuantity(value)) return text;
  const uncertainty = value.uncertaintyPct === undefined ? '' : ` ± ${value.uncertaintyPct} %`;
  const calibrated = value.calibratedOn ? `, meter calibrated ${value.calibratedOn}` : '';
  return `${text}${uncertainty} (${PROVENANCE_WORDS[value.source]}${calibrated})`;
}

function setsText(inputs: LaserInputs): string {
  const names = new Map(inputs.emissions.map((emission) => [emission.id, lineName(emission)]));
  const sets = inputs.emissionSets.map(
    (set) => `${set.name}: ${set.emissionIds.map((id) => names.get(id) ?? id).join(' + ')}`,
  );
  return sets.length > 0 ? sets.join('; ') : 'none';
}

function wallText(inputs: LaserInputs): string {
  return inputs.wallDistanceM === undefined ? NONE : `${inputs.wallDistanceM} m`;
}
