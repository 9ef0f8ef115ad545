import * as z from 'zod';
import {
  areaRefSchema,
  idSchema,
  instantSchema,
  localDateSchema,
  noteSchema,
  pageOf,
  pageQuery,
  personRefSchema,
  provenanceSchema,
  reasonSchema,
  requiredText,
  shortText,
  versionSchema,
} from './common';
import { laserFileSchema } from './files';
import { ruleSetIdSchema } from './hazard-case';
import { LASER_EVENTS, LASER_STATES } from '../workflow/laser-life-cycle';

/** A positive number in the unit of its field's name, the text it was typed as, and where it came from. */
export const quantitySchema = z.strictObject({
  value: z.number().positive({ error: 'This number is more than 0.' }),
  /** As written by the person, unit included: "5 mW". */
  text: shortText(40).optional(),
  source: provenanceSchema,
  uncertaintyPct: z.number().min(0).max(100).optional(),
  /** Calibration date of the meter, when measured. */
  calibratedOn: localDateSchema.optional(),
});
export type Quantity = z.infer<typeof quantitySchema>;

/** A wavelength in nm, where limits exist. */
const wavelengthSchema = quantitySchema.refine(
  ({ value }) => !Number.isFinite(value) || (value >= 180 && value <= 1e6),
  { path: ['value'], error: 'A wavelength is from 180 to 1,000,000 nm.' },
);

export const EMISSION_MODES = [
  'cw',
  'single',
  'repetitive',
  'mode-locked',
  'burst',
  'modulated',
] as const;
export const WIDTH_CONVENTIONS = ['1/e', '1/e2', 'fwhm'] as const;
export const DELIVERIES = ['beam', 'multimode-fiber', 'single-mode-fiber'] as const;

/** One line in one operating mode, as the data sheet gives it; `emission-beam.ts` converts it. */
export const emissionSchema = z.strictObject({
  id: idSchema,
  label: shortText(60).optional(),
  /** From 180 to 1,000,000 nm. With `wavelengthToNm`: the lower end of a tuning range. */
  wavelengthNm: wavelengthSchema,
  wavelengthToNm: wavelengthSchema.optional(),
  mode: z.enum(EMISSION_MODES),
  /** CW: power. Pulsed: mean power, in place of the pulse energy. Maximum, not usual, value. */
  powerW: quantitySchema.optional(),
  /** What is normally set, when it is below the maximum. The maximum is evaluated. */
  operatingPowerW: quantitySchema.optional(),
  peakPowerW: quantitySchema.optional(),
  pulseEnergyJ: quantitySchema.optional(),
  pulseDurationS: quantitySchema.optional(),
  repetitionRateHz: quantitySchema.optional(),
  pulsesPerBurst: quantitySchema.optional(),
  intraBurstRateHz: quantitySchema.optional(),
  burstRateHz: quantitySchema.optional(),
  delivery: z.enum(DELIVERIES),
  diameterMm: quantitySchema.optional(),
  /** Second axis of an elliptical beam. */
  diameterYMm: quantitySchema.optional(),
  diameterConvention: z.enum(WIDTH_CONVENTIONS),
  /** Absent: unknown; the cautious assumption is then stated in every result. */
  divergenceMrad: quantitySchema.optional(),
  divergenceYMrad: quantitySchema.optional(),
  divergenceConvention: z.enum(WIDTH_CONVENTIONS),
  divergenceAngle: z.enum(['full', 'half']),
  profile: z.enum(['gaussian', 'top-hat']),
  sourceMrad: quantitySchema.optional(),
  waistDistanceM: z.number().optional(),
  m2: z.number().min(1).optional(),
  numericalAperture: quantitySchema.optional(),
  coreUm: quantitySchema.optional(),
  modeFieldDiameterUm: quantitySchema.optional(),
  connector: shortText(60).optional(),
  scan: shortText(200).optional(),
  collimation: z.enum(['collimated', 'diverging', 'focused']).optional(),
  polarization: shortText(60).optional(),
});
export type Emission = z.infer<typeof emissionSchema>;

/** Lines that can be on together. Without any set, all lines can. */
export const emissionSetSchema = z.strictObject({
  name: requiredText('a name for the set', 60),
  emissionIds: z.array(idSchema).min(1).max(64),
});

export const LASER_CLASSES = [
  '1',
  '1M',
  '1C',
  '2',
  '2M',
  '3R',
  '3B',
  '4',
  'I',
  'IIa',
  'II',
  'IIIa',
  'IIIb',
  'IV',
] as const;
export const laserClassSchema = z.enum(LASER_CLASSES);

const flag = z.boolean().optional();

export const laserInputSchema = z
  .strictObject({
    /** Generated when empty: L-43. */
    tag: shortText(30)
      .regex(/^[A-Za-z0-9][A-Za-z0-9._/-]*$/, {
        error: 'A tag has letters, digits and . _ / - only.',
      })
      .optional(),
    maker: requiredText('the maker, or "home-built"'),
    model: requiredText('the model'),
    serial: shortText(80).optional(),
    year: z.int().min(1960).max(2100).optional(),
    labelAsFound: noteSchema.optional(),
    accession: shortText(60).optional(),
    marking: shortText(60).optional(),
    homeBuilt: z.boolean(),
    assetNumber: shortText(60).optional(),

    declaredClass: laserClassSchema.optional(),
    declaredStandard: shortText(80).optional(),
    declaredStandardOn: localDateSchema.optional(),
    /** The LSO's own; only the LSO may set it. */
    verifiedClass: laserClassSchema.optional(),
    openClass: laserClassSchema.optional(),
    serviceClass: laserClassSchema.optional(),

    purpose: noteSchema.optional(),
    beamPath: z.enum(['open', 'limited-open', 'enclosed']).optional(),
    alignmentLaser: flag,
    beamChangingOptics: noteSchema.optional(),
    medium: z.enum(['solid', 'semiconductor', 'gas', 'dye', 'fiber', 'other']).optional(),
    unattended: flag,
    outdoor: flag,
    teaching: flag,
    onPeopleOrAnimals: flag,

    areaId: idSchema.optional(),
    table: shortText(60).optional(),
    mobile: z.boolean(),
    keyLocation: shortText(80).optional(),

    supervisorId: idSchema.optional(),
    alternateId: idSchema.optional(),
    department: shortText(60).optional(),
    costCenter: shortText(40).optional(),
    contact: shortText(80).optional(),
    inServiceSince: localDateSchema.optional(),
    lastUsedOn: localDateSchema.optional(),
    nextUseOn: localDateSchema.optional(),
    notSeenSince: localDateSchema.optional(),

    safetyFeatures: z
      .strictObject({
        keySwitch: flag,
        remoteInterlock: flag,
        shutter: flag,
        emissionIndicator: flag,
        emissionDelay: flag,
        housingInterlock: flag,
        manualReset: flag,
        emergencyStop: flag,
      })
      .optional(),

    registrationNumber: shortText(60).optional(),
    registrationFeeDueOn: localDateSchema.optional(),
    certificateExpiresOn: localDateSchema.optional(),
    notices: noteSchema.optional(),

    /** Asked for by one person, cleared by another; the server keeps who asked. */
    disposal: z
      .strictObject({
        method: shortText(200),
        disabled: z.boolean(),
        cordRemoved: z.boolean(),
        hazardousPartsRemoved: z.boolean(),
      })
      .optional(),

    orderNumber: shortText(60).optional(),
    supplier: shortText(120).optional(),
    receivedOn: localDateSchema.optional(),
    note: noteSchema.optional(),

    emissions: z.array(emissionSchema).max(64),
    emissionSets: z.array(emissionSetSchema).max(32),
  })
  .superRefine((laser, context) => {
    const ids = laser.emissions.map((emission) => emission.id);
    ids.forEach((id, index) => {
      if (ids.indexOf(id) !== index) {
        context.addIssue({
          code: 'custom',
          path: ['emissions', index, 'id'],
          message: `Two lines have the id "${id}".`,
        });
      }
    });
    laser.emissionSets.forEach((set, index) => {
      const unknown = set.emissionIds.filter((id) => !ids.includes(id));
      if (unknown.length > 0) {
        context.addIssue({
          code: 'custom',
          path: ['emissionSets', index, 'emissionIds'],
          message: `The set names lines that this laser has not: ${unknown.join(', ')}.`,
        });
      }
    });
  });
export type LaserInput = z.infer<typeof laserInputSchema>;

export const laserStateSchema = z.enum(LASER_STATES);
export const laserEventSchema = z.enum(LASER_EVENTS);

export const waiverSchema = z.strictObject({
  reason: z.string(),
  /** What is not yet recorded here. */
  missing: z.array(z.string()),
  /** Last day, in the site's zone. */
  untilOn: localDateSchema,
  grantedBy: personRefSchema,
  grantedAt: instantSchema,
  ended: z.boolean(),
});

export const blockSchema = z.strictObject({
  reason: z.string(),
  by: personRefSchema.nullable(),
  at: instantSchema,
});

/** How far a laser reaches, as its sealed evaluation says; drawn as the reach strip. */
export const reachSchema = z.strictObject({
  evaluationId: idSchema,
  evaluationNumber: z.int(),
  state: z.enum(['approved', 'stale']),
  ruleSet: ruleSetIdSchema,
  eyeS: z.number(),
  skinS: z.number(),
  eyeDistanceM: z.number(),
  skinDistanceM: z.number(),
  aidedDistanceM: z.number().optional(),
  opticalDensity: z.number(),
  /** Scenario in which the eye distance is the longest. */
  scenario: z.string(),
  /** Eye distance of each line alone, for the ticks. */
  lines: z.array(z.strictObject({ wavelengthNm: z.number(), eyeDistanceM: z.number() })),
});
export type Reach = z.infer<typeof reachSchema>;

export const laserRowSchema = z.strictObject({
  id: idSchema,
  version: versionSchema,
  tag: z.string(),
  maker: z.string(),
  model: z.string(),
  serial: z.string().optional(),
  area: areaRefSchema.optional(),
  wallDistanceM: z.number().optional(),
  supervisor: personRefSchema.optional(),
  department: z.string().optional(),
  declaredClass: laserClassSchema.optional(),
  verifiedClass: laserClassSchema.optional(),
  openClass: laserClassSchema.optional(),
  state: laserStateSchema,
  lines: z.array(
    z.strictObject({
      wavelengthNm: z.number(),
      wavelengthToNm: z.number().optional(),
      mode: z.enum(EMISSION_MODES),
      /** "CW, 5 W" or "5 mJ, 35 fs, 1 kHz". */
      summary: z.string(),
    }),
  ),
  reach: reachSchema.optional(),
  /** What waits, in words, worst first: "Evaluation stale", "Waiver ends 3 May 2027". */
  attention: z.array(z.string()),
});
export type LaserRow = z.infer<typeof laserRowSchema>;

/** A step that the workflow offers from the present state, and what stands in its way for this person. */
export const offeredEventSchema = z.strictObject({
  event: z.string(),
  label: z.string(),
  /** Empty: may be done now. Otherwise every reason why not. */
  reasons: z.array(z.string()),
  /** What the step asks for. */
  asks: z.array(z.enum(['reason', 'waiver', 'area', 'password', 'comment'])),
});
export type OfferedEvent = z.infer<typeof offeredEventSchema>;

export const laserSchema = z.strictObject({
  ...laserInputSchema.shape,
  id: idSchema,
  tag: z.string(),
  version: versionSchema,
  createdAt: instantSchema,
  updatedAt: instantSchema,
  state: laserStateSchema,
  stateSince: instantSchema,
  area: areaRefSchema.optional(),
  wallDistanceM: z.number().optional(),
  supervisor: personRefSchema.optional(),
  alternate: personRefSchema.optional(),
  waiver: waiverSchema.optional(),
  block: blockSchema.optional(),
  reach: reachSchema.optional(),
  /** Every evaluation of this laser, newest first. */
  evaluations: z.array(
    z.strictObject({
      id: idSchema,
      number: z.int(),
      state: z.string(),
      signedAt: instantSchema.optional(),
    }),
  ),
  places: z.array(z.strictObject({ area: areaRefSchema.optional(), sinceAt: instantSchema })),
  files: z.array(laserFileSchema),
  attention: z.array(z.string()),
  offered: z.array(offeredEventSchema),
  mayEdit: z.boolean(),
  mayEvaluate: z.boolean(),
});
export type Laser = z.infer<typeof laserSchema>;

export const LASER_SORTS = [
  'attention',
  'tag',
  'maker',
  'area',
  'class',
  'wavelength',
  'eye-distance',
  'optical-density',
  'state',
] as const;

/** Filters of the list: the same words in the screen's address and in the API. */
export const laserFilterSchema = z.strictObject({
  /** Words in any order: a serial, a maker, "532 nm 3B B-204". */
  q: z.string().trim().max(100).optional(),
  areaId: idSchema.optional(),
  department: z.string().max(60).optional(),
  supervisorId: idSchema.optional(),
  class: laserClassSchema.optional(),
  state: laserStateSchema.optional(),
  /** Lines or tuning ranges that meet this band, nm. */
  fromNm: z.coerce.number().min(180).max(1e6).optional(),
  toNm: z.coerce.number().min(180).max(1e6).optional(),
  attention: z.enum(['any', 'stale', 'blocked', 'not-evaluated']).optional(),
});
export type LaserFilter = z.infer<typeof laserFilterSchema>;

export const laserListQuerySchema = z.strictObject({
  ...pageQuery,
  ...laserFilterSchema.shape,
  sort: z.enum(LASER_SORTS).default('attention'),
  order: z.enum(['asc', 'desc']).default('asc'),
});
export type LaserListQuery = z.infer<typeof laserListQuerySchema>;

export const laserPageSchema = z.strictObject({
  ...pageOf(laserRowSchema).shape,
  /** Counts over all that this person may see, whatever the filter. */
  counts: z.strictObject({
    all: z.int(),
    attention: z.int(),
    blocked: z.int(),
    stale: z.int(),
    notEvaluated: z.int(),
  }),
});
export type LaserPage = z.infer<typeof laserPageSchema>;

export const duplicateQuerySchema = z.strictObject({
  serial: z.string().trim().min(1).max(80),
  maker: z.string().trim().max(120).optional(),
  exceptId: idSchema.optional(),
});
export const duplicatesSchema = z.strictObject({
  lasers: z.array(
    z.strictObject({
      id: idSchema,
      tag: z.string(),
      maker: z.string(),
      model: z.string(),
      areaCode: z.string().optional(),
    }),
  ),
});

export const laserTransitionSchema = z.strictObject({
  event: laserEventSchema,
  reason: reasonSchema.optional(),
  /** Take-over of a laser from a former register, at most 12 months ahead. */
  waiver: z
    .strictObject({
      untilOn: localDateSchema,
      missing: z.array(requiredText('what is not yet recorded', 200)).min(1).max(20),
    })
    .optional(),
  areaId: idSchema.optional(),
});
export type LaserTransition = z.infer<typeof laserTransitionSchema>;
