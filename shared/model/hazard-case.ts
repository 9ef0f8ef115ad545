import * as z from 'zod';
import { RULE_SET_IDS } from '../hazard/rule-sets/rule-set-ids';

/** The rule sets of the engine; the engine itself checks the rest of a case. */
export const ruleSetIdSchema = z.enum(RULE_SET_IDS);

const axes = z.union([
  z.number().positive(),
  z.tuple([z.number().positive(), z.number().positive()]),
]);

/** The path of the beam to the person, as the engine takes it. */
export const pathSchema = z.union([
  z.strictObject({ kind: z.literal('direct') }),
  z.strictObject({
    kind: z.literal('lens'),
    focalLengthMm: z.number().positive(),
    diameterAtLensMm: axes.optional(),
  }),
  z.strictObject({ kind: z.literal('fiber'), numericalAperture: z.number().positive().lt(1) }),
  z.strictObject({ kind: z.literal('fiber'), modeFieldDiameterUm: z.number().positive() }),
  z.strictObject({
    kind: z.literal('diffuse'),
    reflectance: z.number().positive().max(1),
    angleDeg: z.number().min(0).lt(90),
    spotMm: z.number().positive().optional(),
  }),
]);
