import * as z from 'zod';
import {
  idSchema,
  instantSchema,
  pageOf,
  pageQuery,
  requiredText,
  shortText,
  versionSchema,
} from './common';

export const ROLES = [
  'administrator',
  'lso',
  'deputy-lso',
  'laser-supervisor',
  'operator',
  'auditor',
  'committee',
  'department-head',
  'occupational-health',
  'interlock-technician',
  'purchasing',
  'personnel',
] as const;
export const roleSchema = z.enum(ROLES);
export type Role = z.infer<typeof roleSchema>;

export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  administrator: 'Administrator',
  lso: 'Laser safety officer',
  'deputy-lso': 'Deputy laser safety officer',
  'laser-supervisor': 'Laser supervisor',
  operator: 'Operator',
  auditor: 'Auditor',
  committee: 'Laser safety committee',
  'department-head': 'Head of department',
  'occupational-health': 'Occupational health',
  'interlock-technician': 'Interlock technician',
  purchasing: 'Purchasing',
  personnel: 'Personnel office',
};

export const personInputSchema = z.strictObject({
  name: requiredText('the name'),
  email: z
    .email({ error: 'Enter an e-mail address, for example name@institute.example.' })
    .max(254),
  department: shortText(60).optional(),
  roles: z.array(roleSchema).max(ROLES.length),
  active: z.boolean(),
});
export type PersonInput = z.infer<typeof personInputSchema>;

export const personSchema = personInputSchema.extend({
  id: idSchema,
  version: versionSchema,
  createdAt: instantSchema,
  /** False until the person has set a password from the invitation. */
  hasPassword: z.boolean(),
});
export type Person = z.infer<typeof personSchema>;

export const invitationSchema = z.strictObject({
  person: personSchema,
  /** Shown once; opens the page on which the person sets a password. Ends after 60 minutes. */
  invitationToken: z.string(),
});

export const personListQuerySchema = z.strictObject({
  ...pageQuery,
  q: z.string().trim().max(100).optional(),
  role: roleSchema.optional(),
});
export const personPageSchema = pageOf(personSchema);

export const passwordSchema = z
  .string()
  .min(12, { error: 'A password has at least 12 characters.' })
  .max(128, { error: 'A password has at most 128 characters.' });

export const acceptInvitationSchema = z.strictObject({
  token: z.string().min(20).max(200),
  password: passwordSchema,
});
