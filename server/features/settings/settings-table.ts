import type { RuleSetId } from '@shared/hazard/rule-sets/rule-set-ids';
import type { SettingsInput } from '@shared/model/settings';

import type { Flag } from '../../db/database';

export interface SettingsTable {
  id: 1;
  site_name: string;
  zone: string;
  rule_set: RuleSetId;
  class_scheme: SettingsInput['classScheme'];
  author_may_approve: Flag;
  author_may_approve_reason: string | null;
  evaluation_review_months: number;
  emergency_phone: string;
  lso_phone: string | null;
  version: number;
  updated_at: string;
}

declare module '../../db/database' {
  interface Database {
    settings: SettingsTable;
  }
}
