import * as z from 'zod';
import { idSchema, instantSchema } from './common';

/** One thing wrong with the file, by the row and column the person sees in the spreadsheet. */
export const importErrorSchema = z.strictObject({
  /** Row of the file; the header is row 1. */
  row: z.int(),
  column: z.string(),
  /** What the cell holds. */
  given: z.string(),
  message: z.string(),
  allowed: z.string().optional(),
});
export type ImportError = z.infer<typeof importErrorSchema>;

export const importWarningSchema = z.strictObject({
  row: z.int(),
  column: z.string(),
  message: z.string(),
});

export const laserImportSchema = z.strictObject({
  id: idSchema,
  fileName: z.string(),
  /** checked: the dry run is done, nothing is stored yet. */
  status: z.enum(['checking', 'checked', 'saving', 'saved', 'failed', 'canceled']),
  rowsTotal: z.int(),
  rowsDone: z.int(),
  rowsGood: z.int(),
  /** Lasers that would be, or were, created. Rows of one laser share its tag or serial. */
  lasers: z.int(),
  errors: z.array(importErrorSchema),
  /** All of them, also those beyond the 1,000 listed. */
  errorCount: z.int(),
  warnings: z.array(importWarningSchema),
  createdAt: instantSchema,
});
export type LaserImport = z.infer<typeof laserImportSchema>;
