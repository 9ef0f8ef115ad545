import * as z from 'zod';
import {
  idSchema,
  instantSchema,
  noteSchema,
  pageOf,
  pageQuery,
  personRefSchema,
  requiredText,
  shortText,
  versionSchema,
} from './common';

export const areaInputSchema = z.strictObject({
  /** The room's code on the door, unique on the site: B-204. */
  code: requiredText('the code of the room, for example B-204', 30),
  name: requiredText('the name of the area'),
  building: requiredText('the building', 60),
  room: requiredText('the room', 30),
  department: requiredText('the department', 60),
  supervisorId: idSchema.optional(),
  alternateId: idSchema.optional(),
  /** Longest free line from an aperture to the nearest wall along a beam, m. */
  wallDistanceM: z
    .number()
    .positive({ error: 'The distance to the wall is more than 0 m.' })
    .max(100_000, { error: 'At most 100,000 m.' })
    .optional(),
  phone: shortText(40).optional(),
  note: noteSchema.optional(),
});
export type AreaInput = z.infer<typeof areaInputSchema>;

export const areaSchema = areaInputSchema.extend({
  id: idSchema,
  version: versionSchema,
  createdAt: instantSchema,
  supervisor: personRefSchema.optional(),
  alternate: personRefSchema.optional(),
  laserCount: z.int(),
  /** Highest class on record in the room, verified before declared. */
  highestClass: z.string().optional(),
  /** Whether the signed-in person may change it. */
  mayEdit: z.boolean(),
});
export type Area = z.infer<typeof areaSchema>;

export const areaListQuerySchema = z.strictObject({
  ...pageQuery,
  q: z.string().trim().max(100).optional(),
  department: z.string().max(60).optional(),
});
export type AreaListQuery = z.infer<typeof areaListQuerySchema>;
export const areaPageSchema = pageOf(areaSchema);
