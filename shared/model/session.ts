import * as z from 'zod';
import { idSchema, requiredText } from './common';
import { passwordSchema, roleSchema } from './people';

export const signInSchema = z.strictObject({
  email: z.string().trim().min(1, { error: 'Enter your e-mail address.' }).max(254),
  password: z.string().min(1, { error: 'Enter your password.' }).max(128),
});
export type SignIn = z.infer<typeof signInSchema>;

export const changePasswordSchema = z.strictObject({
  currentPassword: z.string().min(1, { error: 'Enter your present password.' }).max(128),
  newPassword: passwordSchema,
});

/** The first administrator, made with the one-time token that the server prints to its log. */
export const setupSchema = z.strictObject({
  token: requiredText('the one-time token', 200),
  name: requiredText('your name'),
  email: z.email({ error: 'Enter an e-mail address.' }).max(254),
  password: passwordSchema,
});

export const signedInUserSchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  department: z.string().optional(),
  roles: z.array(roleSchema),
  /** Areas this person supervises, as supervisor or alternate. */
  areaIds: z.array(idSchema),
});

export const demoAccountSchema = z.strictObject({
  email: z.string(),
  password: z.string(),
  name: z.string(),
  role: z.string(),
  /** One sentence: what this person can do in the demo. */
  note: z.string(),
});

export const sessionSchema = z.strictObject({
  user: signedInUserSchema.nullable(),
  site: z.strictObject({ name: z.string(), zone: z.string() }),
  /** Only in demo mode; null everywhere else. */
  demo: z.strictObject({ accounts: z.array(demoAccountSchema) }).nullable(),
  /** True until the first administrator exists. */
  needsSetup: z.boolean(),
  /** Seconds without a request after which the session ends. */
  idleTimeoutS: z.int(),
});
export type Session = z.infer<typeof sessionSchema>;
