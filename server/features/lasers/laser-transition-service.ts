import type { LaserEvent } from '@shared/workflow/laser-life-cycle';

import { changesBetween } from '../../audit-trail/record-change';
import type { Context } from '../../context/context';
import { transition } from '../../workflow/transition';
import { LASER_WORKFLOW, type LaserStep } from './laser-life-cycle';
import type { LaserRecord } from './laser-record';
import { laserSubject, refreshStanding, requireLaser } from './laser-standing-service';

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
