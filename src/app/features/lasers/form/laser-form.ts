import {
  type AbstractControl,
  type FormControl,
  type FormGroup,
  type NonNullableFormBuilder,
  type ValidatorFn,
} from '@angular/forms';
import { emissionSchema, laserInputSchema, type LaserInput } from '@shared/model/lasers';

import { zodValidator } from '../../../ui/field/zod-validator';
import type { TypedQuantity } from '../../../ui/quantity-field/quantity-field';
import { QUANTITY_NAMES, type QuantityName } from './emission-fields';
import type {
  EmissionSetValue,
  EmissionValue,
  LaserFormValue,
  QuantityValue,
} from './laser-form-value';

type ControlsOf<T> = { [Name in keyof T]: FormControl<T[Name]> };

export type QuantityForm = FormGroup<ControlsOf<QuantityValue>>;
export type EmissionForm = FormGroup<
  ControlsOf<Omit<EmissionValue, QuantityName>> & Record<QuantityName, QuantityForm>
>;
export type EmissionSetForm = FormGroup<ControlsOf<EmissionSetValue>>;

const { shape } = laserInputSchema;
const { shape: line } = emissionSchema;

type Fb = NonNullableFormBuilder;

export type LaserForm = ReturnType<typeof laserForm>;

/** The fields of a laser, filled with what the record or a draft holds. */
export function laserForm(fb: Fb, value: LaserFormValue) {
  return fb.group({
    ...recordControls(fb, value.record),
    emissions: fb.array(value.emissions.map((emission) => emissionForm(fb, emission))),
    emissionSets: fb.array(value.emissionSets.map((set) => emissionSetForm(fb, set))),
  });
}

/** What the form holds, as plain data. */
export function laserFormValue(form: LaserForm): LaserFormValue {
  const { emissions, emissionSets, ...record } = form.getRawValue();
  return {
    record: record as LaserFormValue['record'],
    emissions: emissions as EmissionValue[],
    emissionSets,
  };
}

export function emissionForm(fb: Fb, value: EmissionValue): EmissionForm {
  const quantities = Object.fromEntries(
    QUANTITY_NAMES.map((name) => [
      name,
      quantityForm(fb, value[name], name === 'wavelengthNm' ? hasWavelength : undefined),
    ]),
  ) as Record<QuantityName, QuantityForm>;
  return fb.group({
    ...quantities,
    id: fb.control(value.id),
    label: fb.control(value.label, zodValidator(line.label)),
    mode: fb.control(value.mode),
    delivery: fb.control(value.delivery),
    isTunable: fb.control(value.isTunable),
    isElliptical: fb.control(value.isElliptical),
    diameterConvention: fb.control(value.diameterConvention),
    divergenceConvention: fb.control(value.divergenceConvention),
    divergenceAngle: fb.control(value.divergenceAngle),
    profile: fb.control(value.profile),
    waistDistanceM: fb.control<TypedQuantity | null>(value.waistDistanceM),
    m2: fb.control<number | null>(value.m2, zodValidator(line.m2)),
    collimation: fb.control(value.collimation),
    connector: fb.control(value.connector, zodValidator(line.connector)),
    scan: fb.control(value.scan, zodValidator(line.scan)),
    polarization: fb.control(value.polarization, zodValidator(line.polarization)),
  });
}

export function emissionSetForm(fb: Fb, value: EmissionSetValue): EmissionSetForm {
  return fb.group({
    name: fb.control(value.name, ({ value: name }) =>
      name ? null : { missing: 'Enter a name for the set.' },
    ),
    emissionIds: fb.control(value.emissionIds, ({ value: ids }) =>
      ids.length ? null : { missing: 'Choose the lines that can be on together.' },
    ),
  });
}

function hasWavelength({ value }: AbstractControl<TypedQuantity | null>) {
  return value === null ? { missing: 'Enter the wavelength, for example 532 nm.' } : null;
}

function quantityForm(fb: Fb, value: QuantityValue, rule?: ValidatorFn): QuantityForm {
  return fb.group({
    value: fb.control<TypedQuantity | null>(value.value, rule),
    source: fb.control(value.source),
    uncertaintyPct: fb.control<number | null>(value.uncertaintyPct, percent),
    calibratedOn: fb.control(value.calibratedOn),
  });
}

function percent({ value }: { value: number | null }) {
  return value === null || (value >= 0 && value <= 100)
    ? null
    : { percent: 'An uncertainty from 0 to 100 %.' };
}

function recordControls(fb: Fb, record: Partial<LaserInput>) {
  const text = (name: keyof LaserInput & keyof typeof shape) =>
    fb.control(String(record[name] ?? ''), zodValidator(shape[name]));
  const choice = <T extends string>(value: T | undefined) => fb.control<T | ''>(value ?? '');
  const flag = (value: boolean | undefined) => fb.control<boolean | null>(value ?? null);
  const { safetyFeatures, disposal } = record;
  return {
    tag: text('tag'),
    maker: text('maker'),
    model: text('model'),
    serial: text('serial'),
    year: fb.control<number | null>(record.year ?? null, zodValidator(shape.year)),
    homeBuilt: fb.control(record.homeBuilt ?? false),
    assetNumber: text('assetNumber'),
    labelAsFound: text('labelAsFound'),
    accession: text('accession'),
    marking: text('marking'),

    declaredClass: choice(record.declaredClass),
    declaredStandard: text('declaredStandard'),
    declaredStandardOn: text('declaredStandardOn'),
    verifiedClass: choice(record.verifiedClass),
    openClass: choice(record.openClass),
    serviceClass: choice(record.serviceClass),

    purpose: text('purpose'),
    beamPath: choice(record.beamPath),
    medium: choice(record.medium),
    beamChangingOptics: text('beamChangingOptics'),
    alignmentLaser: flag(record.alignmentLaser),
    unattended: flag(record.unattended),
    outdoor: flag(record.outdoor),
    teaching: flag(record.teaching),
    onPeopleOrAnimals: flag(record.onPeopleOrAnimals),

    areaId: fb.control(record.areaId ?? ''),
    table: text('table'),
    mobile: fb.control(record.mobile ?? false),
    keyLocation: text('keyLocation'),

    supervisorId: fb.control(record.supervisorId ?? ''),
    alternateId: fb.control(record.alternateId ?? ''),
    department: text('department'),
    costCenter: text('costCenter'),
    contact: text('contact'),
    inServiceSince: text('inServiceSince'),
    lastUsedOn: text('lastUsedOn'),
    nextUseOn: text('nextUseOn'),
    notSeenSince: text('notSeenSince'),

    safetyFeatures: fb.group({
      keySwitch: flag(safetyFeatures?.keySwitch),
      remoteInterlock: flag(safetyFeatures?.remoteInterlock),
      shutter: flag(safetyFeatures?.shutter),
      emissionIndicator: flag(safetyFeatures?.emissionIndicator),
      emissionDelay: flag(safetyFeatures?.emissionDelay),
      housingInterlock: flag(safetyFeatures?.housingInterlock),
      manualReset: flag(safetyFeatures?.manualReset),
      emergencyStop: flag(safetyFeatures?.emergencyStop),
    }),

    registrationNumber: text('registrationNumber'),
    registrationFeeDueOn: text('registrationFeeDueOn'),
    certificateExpiresOn: text('certificateExpiresOn'),
    notices: text('notices'),

    disposal: fb.group({
      method: fb.control(disposal?.method ?? ''),
      disabled: fb.control(disposal?.disabled ?? false),
      cordRemoved: fb.control(disposal?.cordRemoved ?? false),
      hazardousPartsRemoved: fb.control(disposal?.hazardousPartsRemoved ?? false),
    }),
    orderNumber: text('orderNumber'),
    supplier: text('supplier'),
    receivedOn: text('receivedOn'),
    note: text('note'),
  };
}
