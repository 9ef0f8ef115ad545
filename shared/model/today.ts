import * as z from 'zod';
import { idSchema, instantSchema } from './common';

/** One thing that waits for the signed-in person. */
export const todayItemSchema = z.strictObject({
  kind: z.enum([
    'check',
    'sign',
    'returned',
    'stale',
    'blocked',
    'laser-check',
    'not-evaluated',
    'waiver-ends',
    'review-due',
  ]),
  recordKind: z.enum(['evaluation', 'laser']),
  recordId: idSchema,
  /** "L-16, evaluation 2" */
  title: z.string(),
  /** Why it waits, in one sentence. */
  why: z.string(),
  sinceAt: instantSchema.optional(),
});
export type TodayItem = z.infer<typeof todayItemSchema>;

export const todaySchema = z.strictObject({ items: z.array(todayItemSchema) });
