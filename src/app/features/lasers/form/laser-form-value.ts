import type { Provenance } from '@shared/model/common';
import {
  type Emission,
  type Laser,
  type LaserInput,
  laserInputSchema,
  type Quantity,
} from '@shared/model/lasers';

import type { TypedQuantity } from '../../../ui/quantity-field/quantity-field';
import { QUANTITY_NAMES, type QuantityName, quantitiesOf } from './emission-fields';

/** A number with its source, as the form holds it. */
export interface QuantityValue {
  value: TypedQuantity | null;
  source: Provenance;
  uncertaintyPct: number | null;
  calibratedOn: string;
}

/** A line as the form holds it: every number of every mode, so that a change of mind loses none. */
export interface EmissionValue extends Record<QuantityName, QuantityValue> {
  id: string;
  label: string;
  mode: Emission['mode'];
  delivery: Emission['delivery'];
  isTunable: boolean;
  isElliptical: boolean;
  diameterConvention: Emission['diameterConvention'];
  divergenceConvention: Emission['divergenceConvention'];
  divergenceAngle: Emission['divergenceAngle'];
  profile: Emission['profile'];
  waistDistanceM: TypedQuantity | null;
  m2: number | null;
  collimation: NonNullable<Emission['collimation']> | '';
  connector: string;
  scan: string;
  polarization: string;
}

export interface EmissionSetValue {
  name: string;
  emissionIds: string[];
}

/** The record as the form holds it; plain data, so that a draft can be kept as JSON. */
export interface LaserFormValue {
  record: Omit<LaserInput, 'emissions' | 'emissionSets'>;
  emissions: EmissionValue[];
  emissionSets: EmissionSetValue[];
}

export function emptyQuantity(source: Provenance = 'data-sheet'): QuantityValue {
  return { value: null, source, uncertaintyPct: null, calibratedOn: '' };
}

/** A new line; its numbers are first taken to come from where those of `like` do. */
export function emptyEmission(id: string, source: Provenance = 'data-sheet'): EmissionValue {
  const quantities = Object.fromEntries(
    QUANTITY_NAMES.map((name) => [name, emptyQuantity(source)]),
  ) as Record<QuantityName, QuantityValue>;
  return {
    ...quantities,
    id,
    label: '',
    mode: 'cw',
    delivery: 'beam',
    isTunable: false,
    isElliptical: false,
    diameterConvention: '1/e2',
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    profile: 'gaussian',
    waistDistanceM: null,
    m2: null,
    collimation: '',
    connector: '',
    scan: '',
    polarization: '',
  };
}

export function emptyLaser(emissionId: string): LaserFormValue {
  return {
    record: { maker: '', model: '', homeBuilt: false, mobile: false },
    emissions: [emptyEmission(emissionId)],
    emissionSets: [],
  };
}

/** The part of a stored laser that can be changed. */
export function laserInputOf(laser: Laser): LaserInput {
  const names = Object.keys(laserInputSchema.shape) as (keyof LaserInput)[];
  const known = names.flatMap((name) => (laser[name] === undefined ? [] : [[name, laser[name]]]));
  return Object.fromEntries(known) as LaserInput;
}

/** The form for a record. */
export function formValueOf({ emissions, emissionSets, ...record }: LaserInput): LaserFormValue {
  return {
    record,
    emissions: emissions.map(emissionValue),
    emissionSets: emissionSets.map(({ name, emissionIds }) => ({ name, emissionIds })),
  };
}

/** A second laser of the same kind: what belongs to the first one alone is left out. */
export function copyOf(input: LaserInput): LaserFormValue {
  const { record, ...lines } = formValueOf(input);
  const own: readonly (keyof LaserInput)[] = [
    'tag',
    'serial',
    'assetNumber',
    'verifiedClass',
    'inServiceSince',
    'lastUsedOn',
    'nextUseOn',
    'notSeenSince',
    'registrationNumber',
    'registrationFeeDueOn',
    'certificateExpiresOn',
    'orderNumber',
    'receivedOn',
    'disposal',
  ];
  const kept = Object.entries(record).filter(([name]) => !own.includes(name as keyof LaserInput));
  return { record: Object.fromEntries(kept) as LaserFormValue['record'], ...lines };
}

/** The record for a form, in the shape of the contract and not yet checked by it. */
export function laserInputFrom({ record, emissions, emissionSets }: LaserFormValue): object {
  const { disposal, ...rest } = record;
  const isAskedFor = disposal && Object.values(disposal).some(Boolean);
  return {
    ...rest,
    ...(isAskedFor && { disposal }),
    emissions: emissions.map(emissionFrom),
    emissionSets,
  };
}

function emissionValue(emission: Emission): EmissionValue {
  const quantities = Object.fromEntries(
    QUANTITY_NAMES.map((name) => [name, quantityValue(emission[name])]),
  ) as Record<QuantityName, QuantityValue>;
  const { waistDistanceM } = emission;
  return {
    ...emptyEmission(emission.id),
    ...quantities,
    label: emission.label ?? '',
    mode: emission.mode,
    delivery: emission.delivery,
    isTunable: emission.wavelengthToNm !== undefined,
    isElliptical: (emission.diameterYMm ?? emission.divergenceYMrad) !== undefined,
    diameterConvention: emission.diameterConvention,
    divergenceConvention: emission.divergenceConvention,
    divergenceAngle: emission.divergenceAngle,
    profile: emission.profile,
    waistDistanceM:
      waistDistanceM === undefined ? null : { value: waistDistanceM, text: `${waistDistanceM} m` },
    m2: emission.m2 ?? null,
    collimation: emission.collimation ?? '',
    connector: emission.connector ?? '',
    scan: emission.scan ?? '',
    polarization: emission.polarization ?? '',
  };
}

function quantityValue(quantity: Quantity | undefined): QuantityValue {
  if (!quantity) return emptyQuantity();
  const { value, text, source, uncertaintyPct, calibratedOn } = quantity;
  return {
    value: { value, ...(text && { text }) },
    source,
    uncertaintyPct: uncertaintyPct ?? null,
    calibratedOn: calibratedOn ?? '',
  };
}

/** A line in the shape of the contract. */
export function emissionFrom(line: EmissionValue): object {
  const quantities = quantitiesOf(line).map((name) => [name, quantityFrom(line[name])]);
  const { id, label, mode, delivery, profile, m2, scan, polarization } = line;
  const { diameterConvention, divergenceConvention, divergenceAngle } = line;
  const isFree = delivery === 'beam';
  return {
    ...Object.fromEntries(quantities),
    ...{ id, label, mode, delivery, profile, scan, polarization },
    ...{ diameterConvention, divergenceConvention, divergenceAngle },
    ...(isFree
      ? { m2, waistDistanceM: line.waistDistanceM?.value, collimation: line.collimation }
      : { connector: line.connector }),
  };
}

function quantityFrom({
  value,
  source,
  uncertaintyPct,
  calibratedOn,
}: QuantityValue): object | undefined {
  if (!value) return undefined;
  return {
    value: value.value,
    text: value.text,
    source,
    uncertaintyPct,
    ...(source === 'measured' && { calibratedOn }),
  };
}
