import * as z from 'zod';
import { instantSchema, reasonSchema, requiredText, shortText, versionSchema } from './common';
import { ruleSetIdSchema } from './hazard-case';

export const CLASS_SCHEMES = ['iec-60825-1-2014', '21-cfr-1040.10'] as const;

export const settingsInputSchema = z
  .strictObject({
    siteName: requiredText('the name of the site'),
    zone: requiredText('the time zone, for example Europe/Berlin', 60).refine(isTimeZone, {
      error: 'Give an IANA time zone, for example Europe/Berlin.',
    }),
    /** The rule set for limits that the site has adopted. */
    ruleSet: ruleSetIdSchema,
    classScheme: z.enum(CLASS_SCHEMES),
    /** Whether the one who wrote an evaluation may approve it: for a site with one LSO only. */
    authorMayApprove: z.boolean(),
    authorMayApproveReason: reasonSchema.optional(),
    /** Months until a signed evaluation is reviewed. */
    evaluationReviewMonths: z.int().min(1).max(120),
    emergencyPhone: requiredText('the emergency number', 40),
    lsoPhone: shortText(40).optional(),
  })
  .refine((settings) => !settings.authorMayApprove || settings.authorMayApproveReason, {
    path: ['authorMayApproveReason'],
    error: 'Say why the author may approve here; the reason is kept.',
  });
export type SettingsInput = z.infer<typeof settingsInputSchema>;

export const settingsSchema = z.strictObject({
  ...settingsInputSchema.shape,
  version: versionSchema,
  updatedAt: instantSchema,
});
export type Settings = z.infer<typeof settingsSchema>;

function isTimeZone(zone: string): boolean {
  try {
    new Intl.DateTimeFormat('en-US', { timeZone: zone });
    return true;
  } catch {
    // RangeError is how Intl says that it does not know the zone.
    return false;
  }
}
