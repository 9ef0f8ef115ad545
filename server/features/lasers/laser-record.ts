import type { PersonRef } from '@shared/model/common';
import type { LaserInputs } from '@shared/model/evaluations';
import { laserInputsOf } from '@shared/model/laser-inputs';
import type { LaserInput, Reach } from '@shared/model/lasers';
import type { Placement } from '@shared/permissions/permissions';
import type { LaserState } from '@shared/workflow/laser-life-cycle';

import type { EvaluationStanding } from './laser-table';

/** A laser as stored, with what its area and people say of it now. */
export interface LaserRecord {
  readonly number: number;
  readonly id: string;
  readonly version: number;
  readonly tag: string;
  readonly input: LaserInput;
  readonly state: LaserState;
  readonly stateSince: string;
  readonly quarantine: boolean;
  readonly releasedAt: string | null;
  readonly waiver: StoredWaiver | null;
  readonly block: StoredBlock | null;
  readonly transferArea: PlaceOf | null;
  readonly disposalAskedBy: string | null;
  readonly standing: EvaluationStanding;
  readonly reviewOn: string | null;
  readonly reach: Reach | null;
  readonly createdBy: string | null;
  readonly createdAt: string;
  readonly updatedAt: string;
  readonly area: PlaceOf | null;
  /** Named on the laser, else of its area. */
  readonly supervisor: PersonRef | undefined;
  readonly alternate: PersonRef | undefined;
}

export interface PlaceOf {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly department: string;
  readonly supervisorId: string | null;
  readonly alternateId: string | null;
  readonly wallDistanceM: number | null;
}

export interface StoredWaiver {
  readonly reason: string;
  readonly missing: readonly string[];
  readonly untilOn: string;
  readonly grantedById: string;
  readonly grantedByName: string;
  readonly grantedAt: string;
}

export interface StoredBlock {
  readonly reason: string;
  readonly cause: 'person' | 'waiver-ended' | 'evaluation-withdrawn' | 'review-passed';
  readonly byId: string | null;
  readonly byName: string;
  readonly at: string;
}

/** The inputs that an evaluation of this laser rests on, as they are now. */
export function inputsOf(laser: Pick<LaserRecord, 'input' | 'area'>): LaserInputs {
  return laserInputsOf(laser.input, laser.area?.wallDistanceM ?? undefined);
}

/** Who supervises the laser: of its area, or named on the laser itself. */
export function placementOf(laser: Pick<LaserRecord, 'input' | 'area'>): Placement {
  const ids = [
    laser.area?.supervisorId,
    laser.area?.alternateId,
    laser.input.supervisorId,
    laser.input.alternateId,
  ];
  return {
    department: laser.input.department ?? laser.area?.department,
    supervisorIds: ids.filter((id): id is string => typeof id === 'string'),
  };
}

/** Who supervises an area. */
export function placementOfArea(area: PlaceOf): Placement {
  const ids = [area.supervisorId, area.alternateId].filter((id) => id !== null);
  return { department: area.department, supervisorIds: ids };
}

/** "l-0000000002": tags in the order that people expect. */
export function tagKey(tag: string): string {
  return tag.toLowerCase().replace(/\d+/g, (digits) => digits.padStart(10, '0'));
}

/** Case, spaces and dashes do not make another serial. */
export function serialKey(serial: string | undefined): string | null {
  const key = (serial ?? '').toUpperCase().replace(/[^\p{L}\p{N}]/gu, '');
  return key === '' ? null : key;
}
