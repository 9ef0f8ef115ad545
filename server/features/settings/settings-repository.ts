import type { Settings } from '@shared/model/settings';

import { flag, type Tx } from '../../db/database';
import type { SettingsTable } from './settings-table';

export async function findSettings(tx: Tx): Promise<Settings> {
  return toSettings(await tx.selectFrom('settings').selectAll().executeTakeFirstOrThrow());
}

export async function updateSettings(tx: Tx, settings: Settings): Promise<void> {
  await tx
    .updateTable('settings')
    .set({
      version: settings.version,
      updated_at: settings.updatedAt,
      site_name: settings.siteName,
      zone: settings.zone,
      rule_set: settings.ruleSet,
      class_scheme: settings.classScheme,
      author_may_approve: flag(settings.authorMayApprove),
      author_may_approve_reason: settings.authorMayApproveReason ?? null,
      evaluation_review_months: settings.evaluationReviewMonths,
      emergency_phone: settings.emergencyPhone,
      lso_phone: settings.lsoPhone ?? null,
    })
    .execute();
}

function toSettings(row: SettingsTable): Settings {
  return {
    version: row.version,
    updatedAt: row.updated_at,
    siteName: row.site_name,
    zone: row.zone,
    ruleSet: row.rule_set,
    classScheme: row.class_scheme,
    authorMayApprove: row.author_may_approve === 1,
    authorMayApproveReason: row.author_may_approve_reason ?? undefined,
    evaluationReviewMonths: row.evaluation_review_months,
    emergencyPhone: row.emergency_phone,
    lsoPhone: row.lso_phone ?? undefined,
  };
}
