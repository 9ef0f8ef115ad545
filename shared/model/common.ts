import * as z from 'zod';

/** A record's identity: opaque, never reused. */
export const idSchema = z
  .string()
  .min(1)
  .max(64)
  .regex(/^[A-Za-z0-9_-]+$/, {
    error: 'An id has letters, digits, - and _ only.',
  });

/** A UTC instant as text, to the millisecond: 2026-12-01T09:30:00.000Z. */
export const instantSchema = z.iso.datetime({ precision: 3 });

/** A date in the site's zone, with its year: 2026-12-01. */
export const localDateSchema = z.iso.date({
  error: 'Give the date as year-month-day, for example 2026-12-01.',
});

/** One line of text a person typed, trimmed. */
export function shortText(max = 120) {
  return z
    .string()
    .trim()
    .max(max, { error: `At most ${max} characters.` });
}

/** One line of text that must not be empty. */
export function requiredText(what: string, max = 120) {
  return shortText(max).min(1, { error: `Enter ${what}.` });
}

/** Longer text: a reason, a note. */
export const noteSchema = z.string().trim().max(4000, { error: 'At most 4,000 characters.' });

/** A reason that will be read years later. */
export const reasonSchema = noteSchema.min(10, {
  error: 'Give a reason of at least 10 characters; it is kept with the record.',
});

/** Where a number came from. A word, never a letter: D, I, R and M are eyewear modes. */
export const PROVENANCES = ['label', 'data-sheet', 'measured', 'estimated'] as const;
export const provenanceSchema = z.enum(PROVENANCES);
export type Provenance = z.infer<typeof provenanceSchema>;

/** Optimistic concurrency: the number in the strong ETag. */
export const versionSchema = z.int().min(1);

export const pageQuery = {
  /** Opaque key of the first row after the page before. */
  after: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
};

export function pageOf<T extends z.ZodType>(row: T) {
  return z.strictObject({
    rows: z.array(row),
    /** Key for the next page; null when this is the last. */
    next: z.string().nullable(),
    /** Rows that the filter finds in all. */
    total: z.int(),
  });
}

/** A person as shown beside a record. */
export const personRefSchema = z.strictObject({ id: idSchema, name: z.string() });
export type PersonRef = z.infer<typeof personRefSchema>;

export const areaRefSchema = z.strictObject({ id: idSchema, code: z.string(), name: z.string() });
export type AreaRef = z.infer<typeof areaRefSchema>;
