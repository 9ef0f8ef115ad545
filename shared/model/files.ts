import * as z from 'zod';
import { idSchema, instantSchema, personRefSchema, shortText } from './common';

export const LASER_FILE_KINDS = [
  'data-sheet',
  'photo',
  'label-photo',
  'manual',
  'declaration',
  'measurement-report',
] as const;
export const laserFileKindSchema = z.enum(LASER_FILE_KINDS);

/** Fields beside the file in the multipart upload. */
export const laserFileInputSchema = z.strictObject({
  kind: laserFileKindSchema,
  note: shortText(200).optional(),
});

export const laserFileSchema = z.strictObject({
  id: idSchema,
  kind: laserFileKindSchema,
  name: z.string(),
  mediaType: z.string(),
  sizeBytes: z.int(),
  sha256: z.string(),
  note: z.string().optional(),
  uploadedBy: personRefSchema,
  uploadedAt: instantSchema,
});
export type LaserFile = z.infer<typeof laserFileSchema>;

export const MAX_FILE_BYTES = 20 * 1024 * 1024;
export const MAX_FILES_PER_LASER = 10;
