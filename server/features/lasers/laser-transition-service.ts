import type { LaserEvent } from '@shared/workflow/laser-life-cycle';

import { changesBetween } from '../../audit-trail/record-change';
import type { Context } from '../../context/context';
import { transition } from '../../workflow/transition';
import { LASER_WORKFLOW, type LaserStep } from './laser-life-cycle';
import type { LaserRecord } from './laser-record';
import { lasersWithEndedWaiver } from './laser-queries';
import { laserSubject, refreshStanding, requireLaser, siteToday } from './laser-standing-service';

/** Takes a laser one step further, by the person who acts or by the product itself. */
export async function moveLaser(
  ctx: Context,
  laser: LaserRecord,
  step: { event: LaserEvent; input: LaserStep; bySystem?: boolean; isNew?: boolean },
): Promise<LaserRecord> {
  const { isNew = false, ...rest } = step;
  const subject = { ...(await laserSubject(ctx, laser)), isNew };
  const { waiver, area } = step.input;
  const changes = [
    ...(isNew ? changesBetween(null, laser.input) : []),
    ...(waiver ? [{ field: 'waiver', before: laser.waiver, after: waiver }] : []),
    ...(area ? [{ field: 'areaId', before: laser.area?.id ?? null, after: area.id }] : []),
  ];
  await transition(ctx, LASER_WORKFLOW, { subject, changes, ...rest });
  await refreshStanding(ctx, laser.id);
  return requireLaser(ctx, laser.id);
}

/** Lasers in use under a waiver that ended before `today`. */
export async function lasersPastWaiver(ctx: Pick<Context, 'tx'>, today: string): Promise<string[]> {
  return (await lasersWithEndedWaiver(ctx.tx, today)).map(({ id }) => id);
}

/** Blocks a laser whose waiver has ended; nothing when it is no longer so. */
export async function endWaiver(ctx: Context, laserId: string): Promise<void> {
  const laser = await requireLaser(ctx, laserId);
  const today = await siteToday(ctx);
  if (!laser.waiver || laser.waiver.untilOn >= today || !USED.has(laser.state)) return;
  const input = {
    reason: `The waiver ended on ${laser.waiver.untilOn}. Still missing: ${laser.waiver.missing.join(' ')}`,
    blockCause: 'waiver-ended' as const,
  };
  await moveLaser(ctx, laser, { event: 'block', input, bySystem: true });
}

const USED: ReadonlySet<string> = new Set(['in-use', 'change-open', 'service-open']);
