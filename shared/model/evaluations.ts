import * as z from 'zod';
import { EVALUATION_EVENTS, EVALUATION_STATES } from '../workflow/evaluation-life-cycle';
import {
  idSchema,
  instantSchema,
  localDateSchema,
  noteSchema,
  pageOf,
  pageQuery,
  personRefSchema,
  reasonSchema,
  requiredText,
  shortText,
  versionSchema,
} from './common';
import { pathSchema, ruleSetIdSchema } from './hazard-case';
import { emissionSchema, emissionSetSchema, offeredEventSchema } from './lasers';

export const ACTIVITIES = ['operation', 'alignment', 'maintenance', 'service'] as const;
export const activitySchema = z.enum(ACTIVITIES);
export type Activity = z.infer<typeof activitySchema>;

/** One situation that is computed: an activity, the lines that are on together, and the geometry. */
export const scenarioSchema = z.strictObject({
  id: idSchema,
  activity: activitySchema,
  name: requiredText('a name for this situation', 80),
  /** Lines on together, by emission id. */
  emissionIds: z.array(idSchema).min(1, { error: 'Choose at least one line.' }).max(64),
  /** For a tunable line: the wavelength at which this situation is evaluated, nm. */
  atWavelengthNm: z.record(idSchema, z.number().min(180).max(1e6)),
  eyeS: z
    .number()
    .positive({ error: 'The exposure duration is more than 0 s.' })
    .max(30_000, { error: 'At most 30,000 s: the day.' }),
  skinS: z.number().positive().max(30_000).optional(),
  exposureReason: requiredText('why this exposure duration', 400),
  path: pathSchema,
  /** Reflected or transmitted share of the power that takes this path; 1 when all of it. */
  aid: z
    .strictObject({
      objectiveMm: z.number().positive().max(1000),
      magnification: z.number().min(1).max(1000),
      transmission: z.number().positive().max(1),
    })
    .optional(),
  attenuationPerKm: z.number().min(0).max(1e5).optional(),
  growth: z.enum(['hyperbolic', 'linear']).optional(),
  onAxis: z.enum(['peak', 'aperture-mean']).optional(),
  /** Where people can stand: exposure and optical density are given there too, m. */
  atDistanceM: z.number().positive().max(1e7).optional(),
  note: noteSchema.optional(),
});
export type Scenario = z.infer<typeof scenarioSchema>;

/** What the author decides. The lines themselves are a snapshot of the laser's. */
export const evaluationInputSchema = z.strictObject({
  ruleSet: ruleSetIdSchema,
  scenarios: z.array(scenarioSchema).max(40),
  /** Activities without a situation, and why. */
  notCovered: z
    .array(
      z.strictObject({
        activity: activitySchema,
        reason: requiredText('why this activity is not evaluated', 400),
      }),
    )
    .max(4),
  assumptions: z.array(requiredText('the assumption', 400)).max(40),
  controls: noteSchema.optional(),
  nonBeamHazards: noteSchema.optional(),
  conditions: noteSchema.optional(),
  note: noteSchema.optional(),
});
export type EvaluationInput = z.infer<typeof evaluationInputSchema>;

export const evaluationStateSchema = z.enum(EVALUATION_STATES);

/** Inputs of the laser that an evaluation rests on; its hash decides staleness. */
export const laserInputsSchema = z.strictObject({
  emissions: z.array(emissionSchema),
  emissionSets: z.array(emissionSetSchema),
  areaId: idSchema.optional(),
  wallDistanceM: z.number().optional(),
  beamPath: z.string().optional(),
});
export type LaserInputs = z.infer<typeof laserInputsSchema>;

/** The engine's answer for one situation; `result` as engine contract 3, or the field errors. */
export const scenarioResultSchema = z.strictObject({
  scenarioId: idSchema,
  case: z.unknown(),
  result: z.unknown(),
  /** How data-sheet figures became the engine's, and what was assumed. */
  conversions: z.array(z.string()),
  assumptions: z.array(z.string()),
});

export const MEANINGS = [
  'prepared',
  'reviewed',
  'approved',
  'confirmed-unchanged',
  'withdrawn',
] as const;

/** A signature: who, with the name at that time, when, in which role, what it means, and what was signed. */
export const signatureSchema = z.strictObject({
  id: idSchema,
  meaning: z.enum(MEANINGS),
  signerId: idSchema,
  signerName: z.string(),
  signerRole: z.string(),
  actingFor: z.string().optional(),
  at: instantSchema,
  zone: z.string(),
  /** The sentence signed. */
  statement: z.string(),
  comment: z.string().optional(),
  /** How presence was proven: "password", or "demo, no proof of presence". */
  proof: z.string(),
  /** SHA-256 of the canonical JSON of what was signed. */
  sha256: z.string(),
  /** The hash recomputed now equals it. */
  verified: z.boolean(),
});
export type Signature = z.infer<typeof signatureSchema>;

/** One result that differs between the sealed inputs and today's, and which way. */
export const resultChangeSchema = z.strictObject({
  scenario: z.string(),
  what: z.string(),
  unit: z.string(),
  sealed: z.number().nullable(),
  today: z.number().nullable(),
  direction: z.enum(['worse', 'better', 'same', 'new', 'gone']),
});
export type ResultChange = z.infer<typeof resultChangeSchema>;

export const evaluationSchema = z.strictObject({
  id: idSchema,
  version: versionSchema,
  /** Counts the evaluations of one laser: 1, 2, 3 … */
  number: z.int(),
  laser: z.strictObject({
    id: idSchema,
    tag: z.string(),
    maker: z.string(),
    model: z.string(),
    areaCode: z.string().optional(),
    areaName: z.string().optional(),
    declaredClass: z.string().optional(),
    verifiedClass: z.string().optional(),
  }),
  state: evaluationStateSchema,
  author: personRefSchema,
  checker: personRefSchema.optional(),
  approver: personRefSchema.optional(),
  input: evaluationInputSchema,
  laserInputs: laserInputsSchema,
  /** Hash of the laser's inputs as evaluated, and as they are now. */
  laserInputsHash: z.string(),
  laserInputsHashNow: z.string(),
  engineVersion: z.string(),
  /** Computed by the server. */
  results: z.array(scenarioResultSchema),
  createdAt: instantSchema,
  updatedAt: instantSchema,
  signedAt: instantSchema.optional(),
  reviewOn: localDateSchema.optional(),
  supersedesId: idSchema.optional(),
  supersededById: idSchema.optional(),
  staleReasons: z.array(z.string()),
  /** Filled when the laser's inputs differ from the evaluated ones. */
  whatChanged: z.array(resultChangeSchema),
  inputsChanged: z.array(
    z.strictObject({ field: z.string(), sealed: z.string(), today: z.string() }),
  ),
  signatures: z.array(signatureSchema),
  sealSha256: z.string().optional(),
  returnComment: z.string().optional(),
  /** The sentence that the present signer would sign. */
  statement: z.string(),
  offered: z.array(offeredEventSchema),
  mayEdit: z.boolean(),
});
export type Evaluation = z.infer<typeof evaluationSchema>;

export const evaluationRowSchema = z.strictObject({
  id: idSchema,
  number: z.int(),
  state: evaluationStateSchema,
  laser: z.strictObject({
    id: idSchema,
    tag: z.string(),
    maker: z.string(),
    model: z.string(),
    areaCode: z.string().optional(),
  }),
  ruleSet: ruleSetIdSchema,
  author: personRefSchema,
  checker: personRefSchema.optional(),
  approver: personRefSchema.optional(),
  eyeDistanceM: z.number().optional(),
  skinDistanceM: z.number().optional(),
  opticalDensity: z.number().optional(),
  updatedAt: instantSchema,
  signedAt: instantSchema.optional(),
  reviewOn: localDateSchema.optional(),
  /** Waits for the signed-in person: to check, to sign, to answer a return. */
  waitsForMe: z.boolean(),
});
export type EvaluationRow = z.infer<typeof evaluationRowSchema>;

export const evaluationListQuerySchema = z.strictObject({
  ...pageQuery,
  state: evaluationStateSchema.optional(),
  laserId: idSchema.optional(),
  waiting: z.enum(['me']).optional(),
  q: z.string().trim().max(100).optional(),
});
export const evaluationPageSchema = pageOf(evaluationRowSchema);

export const beginEvaluationSchema = z.strictObject({
  laserId: idSchema,
  /** Start from this evaluation of the same laser instead of the proposed situations. */
  fromId: idSchema.optional(),
});

export const evaluationTransitionSchema = z.strictObject({
  event: z.enum(EVALUATION_EVENTS),
  reason: reasonSchema.optional(),
  comment: shortText(400).optional(),
  /** Proof of presence, where the step is a signature. */
  password: z.string().max(128).optional(),
});
export type EvaluationTransition = z.infer<typeof evaluationTransitionSchema>;
