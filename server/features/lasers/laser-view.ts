import { lineOf } from '@shared/model/laser-summary';
import type { AreaRef } from '@shared/model/common';
import type { Laser, LaserRow } from '@shared/model/lasers';
import type { LocalDate } from '@shared/model/local-date';

import { isInScope } from '../../auth/scope';
import type { Context } from '../../context/context';
import { offeredEvents } from '../../workflow/transition';
import { attentionOf } from './laser-attention';
import { listEvaluationsOf, listPlaces } from './laser-evaluation-queries';
import { listFiles } from './laser-file-repository';
import { LASER_WORKFLOW } from './laser-life-cycle';
import { type LaserRecord, type PlaceOf, placementOf } from './laser-record';
import { laserSubject } from './laser-standing-service';

/** The laser as its page shows it to the person who asks. */
export async function laserView(ctx: Context, laser: LaserRecord): Promise<Laser> {
  const subject = await laserSubject(ctx, laser);
  const { today } = subject;
  const place = placementOf(laser);
  const isEditable = !LASER_WORKFLOW.machine.terminal.includes(laser.state);
  return {
    ...laser.input,
    ...headOf(laser),
    createdAt: laser.createdAt,
    updatedAt: laser.updatedAt,
    stateSince: laser.stateSince,
    ...optional('alternate', laser.alternate),
    ...optional('waiver', waiverOf(laser, today)),
    ...optional('block', blockOf(laser)),
    ...optional('reach', laser.reach ?? undefined),
    evaluations: await listEvaluationsOf(ctx.tx, laser.id),
    places: await listPlaces(ctx.tx, laser.id),
    files: await listFiles(ctx.tx, laser.id),
    attention: attentionOf(laser, today).map(({ words }) => words),
    offered: isInScope(ctx, 'laser.transition', place)
      ? offeredEvents(ctx, LASER_WORKFLOW, subject)
      : [],
    mayEdit: isEditable && isInScope(ctx, 'laser.update', place),
    mayEvaluate: isEditable && isInScope(ctx, 'evaluation.begin', place),
  };
}

/** The laser as a row of the register. */
export function laserRow(laser: LaserRecord, today: LocalDate): LaserRow {
  const { input } = laser;
  return {
    ...headOf(laser),
    maker: input.maker,
    model: input.model,
    ...optional('serial', input.serial),
    ...optional('department', input.department ?? laser.area?.department),
    ...optional('declaredClass', input.declaredClass),
    ...optional('verifiedClass', input.verifiedClass),
    ...optional('openClass', input.openClass),
    lines: input.emissions.map(lineOf),
    ...optional('reach', laser.reach ?? undefined),
    attention: attentionOf(laser, today).map(({ words }) => words),
  };
}

function headOf(laser: LaserRecord) {
  const { id, version, tag, state, area } = laser;
  return {
    id,
    version,
    tag,
    state,
    ...optional('area', area ? areaRef(area) : undefined),
    ...optional('wallDistanceM', area?.wallDistanceM ?? undefined),
    ...optional('supervisor', laser.supervisor),
  };
}

function areaRef({ id, code, name }: PlaceOf): AreaRef {
  return { id, code, name };
}

function waiverOf({ waiver }: LaserRecord, today: LocalDate): Laser['waiver'] {
  if (!waiver) return undefined;
  const { reason, missing, untilOn, grantedById, grantedByName, grantedAt } = waiver;
  return {
    reason,
    missing: [...missing],
    untilOn,
    grantedBy: { id: grantedById, name: grantedByName },
    grantedAt,
    ended: untilOn < today,
  };
}

function blockOf({ block }: LaserRecord): Laser['block'] {
  if (!block) return undefined;
  const { reason, byId, byName, at } = block;
  return { reason, at, by: byId === null ? null : { id: byId, name: byName } };
}

/** A property that is there only when it has a value. */
function optional<K extends string, V>(key: K, value: V | undefined): { [P in K]?: V } {
  return (value === undefined ? {} : { [key]: value }) as { [P in K]?: V };
}
