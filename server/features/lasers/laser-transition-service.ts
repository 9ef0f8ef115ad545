import type { LaserEvent } from '@shared/workflow/laser-life-cycle';

import { changesBetween } from '../../audit-trail/record-change';
import type { Context } from '../../context/context';
import { transition } from '../../workflow/transition';
import { LASER_WORKFLOW, type LaserStep } from './laser-life-cycle';
import type { LaserRecord } from './laser-record';
import { lasersWithEndedWaiver } from './laser-queries';
import {
  laserSubject,
  newLaserSubject,
  refreshAttention,
  refreshStanding,
  requireLaser,
  siteToday,
} from './laser-standing-service';

/** Takes a laser one step further, by the person who acts or by the product itself. */
export async function moveLaser(
  ctx: Context,
  laser: LaserRecord,
  step: { event: LaserEvent; input: LaserStep; bySystem?: boolean },
): Promise<LaserRecord> {
  const { waiver, area } = step.input;
  const changes = [
    ...(waiver ? [{ field: 'waiver', before: laser.waiver, after: waiver }] : []),
    ...(area ? [{ field: 'areaId', before: laser.area?.id ?? null, after: area.id }] : []),
  ];
  const subject = await laserSubject(ctx, laser);
  await transition(ctx, LASER_WORKFLOW, { subject, changes, ...step });
  await refreshStanding(ctx, laser.id);
  return requireLaser(ctx, laser.id);
}

/** The first step of a laser that was just stored, with the whole record in its audit entry. */
export async function enterRegister(
  ctx: Context,
  laser: LaserRecord,
  event: LaserEvent,
): Promise<LaserRecord> {
  const subject = await newLaserSubject(ctx, laser);
  const changes = changesBetween(null, laser.input);
  const moved = await transition(ctx, LASER_WORKFLOW, { subject, event, changes, input: {} });
  await refreshAttention(ctx, moved.laser);
  return moved.laser;
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
