import type { Settings, SettingsInput } from '@shared/model/settings';

import { changesBetween, recordChange } from '../../audit-trail/record-change';
import type { Context } from '../../context/context';
import { requireVersion } from '../../http/etag';
import { findSettings, updateSettings } from './settings-repository';

export function readSettings(ctx: Pick<Context, 'tx'>): Promise<Settings> {
  return findSettings(ctx.tx);
}

export async function changeSettings(
  ctx: Context,
  { version, input }: { version: number; input: SettingsInput },
): Promise<Settings> {
  const before = await findSettings(ctx.tx);
  requireVersion(before, version);
  const after: Settings = {
    ...input,
    // A reason belongs to the exception; without the exception it would mislead.
    authorMayApproveReason: input.authorMayApprove ? input.authorMayApproveReason : undefined,
    lsoPhone: input.lsoPhone || undefined,
    version: version + 1,
    updatedAt: ctx.now.toISOString(),
  };
  await updateSettings(ctx.tx, after);
  await recordChange(ctx, {
    action: 'settings.update',
    recordKind: 'settings',
    recordId: 'settings',
    recordName: 'Settings',
    changes: changesBetween(inputOf(before), inputOf(after)),
    reason: after.authorMayApproveReason ?? null,
  });
  return after;
}

function inputOf({ version: _version, updatedAt: _updatedAt, ...input }: Settings) {
  return input;
}
