import * as z from 'zod';

/** Every way the API refuses, with its HTTP status and title (RFC 9457 problem details). */
export const PROBLEMS = {
  'invalid-input': { status: 400, title: 'Some input needs correction' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'proof-failed': { status: 403, title: 'The proof of presence failed' },
  'not-allowed': { status: 403, title: 'Your role does not allow this' },
  'cross-site': { status: 403, title: 'The request did not come from this site' },
  'not-found': { status: 404, title: 'Nothing is here' },
  'method-not-allowed': { status: 405, title: 'This address does not take that method' },
  conflict: { status: 409, title: 'This conflicts with what is recorded' },
  'guard-failed': { status: 409, title: 'Conditions for this step are not met' },
  gone: { status: 410, title: 'This was used or has ended' },
  'stale-version': { status: 412, title: 'Somebody changed this record meanwhile' },
  'too-large': { status: 413, title: 'This is too large' },
  'unsupported-media': { status: 415, title: 'This kind of content is not taken here' },
  'version-missing': { status: 428, title: 'Say which version you are changing' },
  'too-many': { status: 429, title: 'Too many requests' },
  internal: { status: 500, title: 'Something failed here' },
  unavailable: { status: 503, title: 'Not available at the moment' },
} as const satisfies Record<string, { status: number; title: string }>;

export type ProblemName = keyof typeof PROBLEMS;

export const fieldErrorSchema = z.strictObject({
  /** Path of the field, as in the form: `emissions[0].powerW`. */
  path: z.string(),
  message: z.string(),
  allowed: z.string().optional(),
});
export type FieldError = z.infer<typeof fieldErrorSchema>;

export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  detail: z.string().optional(),
  name: z.enum(Object.keys(PROBLEMS) as [ProblemName, ...ProblemName[]]),
  /** Fields that need correction. */
  errors: z.array(fieldErrorSchema).optional(),
  /** Every guard that failed, not only the first. */
  reasons: z.array(z.string()).optional(),
  /** The version now stored, with `stale-version`. */
  currentVersion: z.int().optional(),
  requestId: z.string().optional(),
});
export type Problem = z.infer<typeof problemSchema>;
