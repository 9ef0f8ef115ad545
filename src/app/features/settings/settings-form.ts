import type { NonNullableFormBuilder } from '@angular/forms';
import { type Settings, type SettingsInput, settingsInputSchema } from '@shared/model/settings';

import { zodValidator } from '../../ui/field/zod-validator';

const { shape } = settingsInputSchema;

/** The site's policy as fields. */
export function settingsForm(fb: NonNullableFormBuilder, settings: Settings) {
  return fb.group({
    siteName: [settings.siteName, zodValidator(shape.siteName)],
    zone: [settings.zone, zodValidator(shape.zone)],
    ruleSet: [settings.ruleSet],
    classScheme: [settings.classScheme],
    authorMayApprove: [settings.authorMayApprove],
    authorMayApproveReason: [
      settings.authorMayApproveReason ?? '',
      zodValidator(shape.authorMayApproveReason),
    ],
    evaluationReviewMonths: [
      settings.evaluationReviewMonths,
      zodValidator(shape.evaluationReviewMonths),
    ],
    emergencyPhone: [settings.emergencyPhone, zodValidator(shape.emergencyPhone)],
    lsoPhone: [settings.lsoPhone ?? '', zodValidator(shape.lsoPhone)],
  });
}

/** The part of the stored settings that can be changed. */
export function settingsInput(settings: Settings): SettingsInput {
  const known = Object.keys(shape) as (keyof SettingsInput)[];
  return Object.fromEntries(known.map((name) => [name, settings[name]])) as SettingsInput;
}
