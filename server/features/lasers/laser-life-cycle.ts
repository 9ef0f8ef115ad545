import { beamOf } from '@shared/model/emission-beam';
import { lineName } from '@shared/model/laser-inputs';
import type { LaserInput, LaserTransition } from '@shared/model/lasers';
import { addMonths, dateWords, type LocalDate } from '@shared/model/local-date';
import {
  LASER_LIFE_CYCLE,
  type LaserEffect,
  type LaserEvent,
  type LaserGuard,
  type LaserState,
  NOT_RECORDED_GUARDS,
} from '@shared/workflow/laser-life-cycle';
import type { Actor as Part } from '@shared/workflow/machine';

import type { Context } from '../../context/context';
import type { Guard, StepInput, Workflow } from '../../workflow/transition';
import {
  type LaserRecord,
  type PlaceOf,
  placementOf,
  placementOfArea,
  type StoredBlock,
} from './laser-record';
import {
  addPlace,
  findLaser,
  type LaserMarks,
  updateLaserInput,
  updateLaserMarks,
} from './laser-repository';

/** A laser with the facts that its guards look at. */
export interface LaserSubject {
  readonly laser: LaserRecord;
  readonly today: LocalDate;
  /** Photos on record. */
  readonly photos: number;
  /** An approved evaluation whose inputs are the laser's present ones. */
  readonly hasCurrentEvaluation: boolean;
  /** Any evaluation, sealed, approved or stale, whose inputs are the laser's present ones. */
  readonly inputsEqualSealed: boolean;
  /** The state before the record exists. */
  readonly isNew?: boolean;
}

export interface LaserStep extends StepInput {
  readonly waiver?: LaserTransition['waiver'];
  /** The area that the step asks for. */
  readonly area?: PlaceOf;
  readonly blockCause?: StoredBlock['cause'];
}

type LaserGuardCheck = Guard<LaserSubject, LaserStep>;

/** The last day that a waiver given today may name. */
const WAIVER_MONTHS = 12;

export const LASER_WORKFLOW: Workflow<
  LaserSubject,
  LaserStep,
  LaserState,
  LaserEvent,
  LaserGuard,
  LaserEffect
> = {
  machine: LASER_LIFE_CYCLE,
  recordKind: 'laser',
  identify: ({ laser, isNew }) => ({
    id: laser.id,
    name: laser.tag,
    state: isNew ? 'start' : laser.state,
  }),
  hasPart,
  guards: guards(),
  moveTo: (ctx, subject, to) =>
    // A new laser is stored in its first state at once.
    subject.isNew && subject.laser.state === to
      ? Promise.resolve({ ...subject, isNew: false })
      : mark(ctx, subject, { state: to, stateSince: ctx.now.toISOString() }),
  effects: {
    quarantine: (ctx, subject) => mark(ctx, subject, { quarantine: true }),
    'under-waiver': (ctx, subject, { reason, waiver }) => {
      if (!waiver) throw new Error('The guard "dated-waiver" let a step without a waiver pass.');
      return mark(ctx, subject, {
        waiver: {
          ...waiver,
          reason: reason ?? '',
          grantedById: ctx.actor.id,
          grantedByName: ctx.actor.name,
          grantedAt: ctx.now.toISOString(),
        },
      });
    },
    released: (ctx, subject) => mark(ctx, subject, { releasedAt: ctx.now.toISOString() }),
    blocked: (ctx, subject, { reason, blockCause = 'person' }) => {
      const isPerson = blockCause === 'person';
      return mark(ctx, subject, {
        block: {
          reason: reason ?? '',
          cause: blockCause,
          byId: isPerson ? ctx.actor.id : null,
          byName: isPerson ? ctx.actor.name : 'Limen',
          at: ctx.now.toISOString(),
        },
      });
    },
    unblock: (ctx, subject) => mark(ctx, subject, { block: null }),
    'move-place': (ctx, subject, { area }) => (area ? move(ctx, subject, area) : asIs(subject)),
    'note-receiver': (ctx, subject, { area }) =>
      mark(ctx, subject, { transferAreaId: area?.id ?? null }),
    'forget-receiver': (ctx, subject) => mark(ctx, subject, { transferAreaId: null }),
    'old-approval-void': async (ctx, subject) => {
      const receiver = subject.laser.transferArea;
      const moved = receiver ? await move(ctx, subject, receiver) : subject;
      return mark(ctx, moved, { transferAreaId: null });
    },
  },
};

function hasPart(part: Part, { laser }: LaserSubject, { actor }: Context): boolean {
  switch (part) {
    case 'anyone':
      return true;
    case 'lso':
    case 'deputy-lso':
    case 'committee':
    case 'purchasing':
      return actor.roles.includes(part);
    case 'supervisor':
      return actor.roles.includes('laser-supervisor') && supervisorsOf(laser).includes(actor.id);
    default:
      return false;
  }
}

/** While a transfer is open, the receiving area's supervisors act. */
function supervisorsOf(laser: LaserRecord): readonly string[] {
  return laser.state === 'transferring' && laser.transferArea
    ? placementOfArea(laser.transferArea).supervisorIds
    : placementOf(laser).supervisorIds;
}

function guards(): Readonly<Record<LaserGuard, LaserGuardCheck>> {
  return {
    'reason-given': (_, { input }) =>
      when(input !== undefined && !input.reason, 'Give the reason.'),
    'class-and-room-named': ({ laser: { input } }) => [
      ...when(!input.declaredClass, 'Name the class that is expected.'),
      ...when(!input.areaId, 'Name the room.'),
    ],
    'photo-or-description': ({ laser, photos }) =>
      when(photos === 0 && !laser.input.note, 'Describe the laser, or add a photo.'),
    'dated-waiver': ({ today }, { input }) => (input ? waiverReasons(input, today) : []),
    'not-the-requester': ({ laser }, { ctx }) =>
      when(laser.createdBy === ctx.actor.id, 'The one who asked for the laser does not review it.'),
    'tag-and-photo': ({ photos }) => when(photos === 0, 'Add a photo of the laser.'),
    'record-complete': ({ laser }) => missingInRecord(laser),
    'verified-class-set': ({ laser }) =>
      when(!laser.input.verifiedClass, 'Set the class that you have verified.'),
    'evaluation-sealed': ({ hasCurrentEvaluation }) =>
      when(!hasCurrentEvaluation, 'No signed evaluation with the present inputs is on record.'),
    'inputs-equal-sealed': ({ inputsEqualSealed }) =>
      when(!inputsEqualSealed, 'The inputs differ from the sealed ones.'),
    'evaluation-current': ({ hasCurrentEvaluation }) =>
      when(!hasCurrentEvaluation, 'No signed evaluation with the present inputs is on record.'),
    'no-current-evaluation-or-other-room': ({ laser, hasCurrentEvaluation }, { input }) =>
      when(
        input !== undefined &&
          hasCurrentEvaluation &&
          (!input.area || input.area.id === laser.input.areaId),
        'The evaluation is current and the room the same: take it out to commissioning.',
      ),
    'not-own-area': ({ laser }, { ctx }) =>
      when(
        placementOf(laser).supervisorIds.includes(ctx.actor.id),
        'You supervise this laser: somebody else releases it.',
      ),
    'was-released-before': ({ laser }) =>
      when(!laser.releasedAt, 'The laser was never released for use.'),
    'never-released-or-needed': ({ laser, hasCurrentEvaluation }, { input }) =>
      when(
        laser.releasedAt !== null && hasCurrentEvaluation && input !== undefined && !input.reason,
        'Say why the laser is evaluated again although its evaluation is current.',
      ),
    'other-person-asked': ({ laser }, { ctx }) => [
      ...when(!laser.input.disposal, 'Nobody has asked for the disposal in the record.'),
      ...when(
        laser.disposalAskedBy !== null && laser.disposalAskedBy === ctx.actor.id,
        'You asked for the disposal: somebody else clears it.',
      ),
    ],
    'made-harmless': ({ laser: { input } }) => [
      ...when(!input.disposal?.disabled, 'Record that the laser is disabled.'),
      ...when(!input.disposal?.cordRemoved, 'Record that the power cord is removed.'),
      ...when(!input.disposal?.hazardousPartsRemoved, 'Record that hazardous parts are removed.'),
    ],
    'block-cause-closed': ({ laser, today }) => blockReasons(laser, today),
    'key-and-cord-out': ({ laser }) =>
      when(!laser.input.keyLocation, 'Record where the key is kept.'),
    'both-supervisors': ({ laser }, { input }) => [
      ...when(placementOf(laser).supervisorIds.length === 0, 'The laser has no supervisor.'),
      ...when(
        input !== undefined && !input.area && !input.reason,
        'Name the receiving area, or the receiver outside the site.',
      ),
      ...when(
        input?.area !== undefined && placementOfArea(input.area).supervisorIds.length === 0,
        'The receiving area has no supervisor.',
      ),
      ...when(
        input?.area !== undefined && input.area.id === laser.input.areaId,
        'The laser is in that area already.',
      ),
    ],
    'new-owner-accepts': ({ laser }, { ctx }) =>
      when(
        !laser.transferArea ||
          !placementOfArea(laser.transferArea).supervisorIds.includes(ctx.actor.id),
        'The supervisor of the receiving area accepts.',
      ),
    'written-disposition': (_, { input }) =>
      when(input !== undefined && !input.reason, 'Write down the disposition.'),
    'registered-with-authority': notRecorded('registered-with-authority'),
    'controls-ticked': notRecorded('controls-ticked'),
    'commissioning-items-passed': notRecorded('commissioning-items-passed'),
    'interlock-test-passed': notRecorded('interlock-test-passed'),
    'sign-photographed': notRecorded('sign-photographed'),
    'eyewear-sufficient': notRecorded('eyewear-sufficient'),
    'procedure-in-force': notRecorded('procedure-in-force'),
    'permit-active': notRecorded('permit-active'),
    'person-authorized': notRecorded('person-authorized'),
    'change-note-signed': notRecorded('change-note-signed'),
    'service-permit-in-force': notRecorded('service-permit-in-force'),
    'panels-and-interlock-confirmed': notRecorded('panels-and-interlock-confirmed'),
    'loan-form': notRecorded('loan-form'),
  };
}

/** Never true by itself: met only by a running waiver that names these very words. */
function notRecorded(guard: LaserGuard): LaserGuardCheck {
  const words = NOT_RECORDED_GUARDS[guard] ?? 'This is not recorded here.';
  return ({ laser, today }) =>
    when(
      !(laser.waiver && laser.waiver.untilOn >= today && laser.waiver.missing.includes(words)),
      words,
    );
}

/** Every field that a complete record lacks; lines are complete when the engine can take them. */
function missingInRecord(laser: LaserRecord): string[] {
  const { input } = laser;
  const lines = input.emissions.flatMap((emission) => {
    const at = emission.wavelengthToNm ? emission.wavelengthNm.value : undefined;
    const beam = beamOf(emission, at);
    if (beam.ok) return [];
    return beam.errors.map(({ message }) => `${lineName(emission)}: ${message}`);
  });
  return [
    ...when(!input.areaId && !input.mobile, 'Name the area, or say that the laser is mobile.'),
    ...when(placementOf(laser).supervisorIds.length === 0, 'Name the supervisor.'),
    ...when(!input.declaredClass && !input.homeBuilt, 'Enter the class that the maker declares.'),
    ...when(input.emissions.length === 0, 'Enter at least one line.'),
    ...lines,
  ];
}

function waiverReasons({ waiver }: LaserStep, today: LocalDate): string[] {
  if (!waiver) return ['Give a waiver: its last day, and what is not yet recorded here.'];
  const latest = addMonths(today, WAIVER_MONTHS);
  return [
    ...when(waiver.untilOn <= today, 'The last day of the waiver lies after today.'),
    ...when(
      waiver.untilOn > latest,
      `A waiver ends within 12 months: at the latest on ${dateWords(latest)}.`,
    ),
  ];
}

function blockReasons({ block, waiver, standing }: LaserRecord, today: LocalDate): string[] {
  switch (block?.cause) {
    case 'waiver-ended':
      return when(
        !waiver || waiver.untilOn < today,
        `The waiver has ended. Still missing: ${waiver?.missing.join(' ') ?? 'its records.'}`,
      );
    case 'evaluation-withdrawn':
    case 'review-passed':
      return when(standing !== 'approved', 'A newer evaluation is not signed.');
    default:
      // A person blocked it: the reason of the release says how the cause was closed.
      return [];
  }
}

function when(fails: boolean, reason: string): string[] {
  return fails ? [reason] : [];
}

async function mark(ctx: Context, subject: LaserSubject, marks: LaserMarks): Promise<LaserSubject> {
  const { id } = subject.laser;
  await updateLaserMarks(ctx.tx, id, { ...marks, at: ctx.now.toISOString() });
  return reread(ctx, subject);
}

async function move(ctx: Context, subject: LaserSubject, area: PlaceOf): Promise<LaserSubject> {
  const { laser } = subject;
  const at = ctx.now.toISOString();
  const input = { ...withoutSupervisors(laser.input), areaId: area.id };
  await updateLaserInput(ctx.tx, laser, { input, tag: laser.tag, area, at });
  await addPlace(ctx.tx, { laserId: laser.id, areaId: area.id, at });
  return reread(ctx, subject);
}

/** Those named on the laser were those of the old place. */
function withoutSupervisors({
  supervisorId: _supervisor,
  alternateId: _alternate,
  ...kept
}: LaserInput) {
  return kept;
}

async function reread(ctx: Context, subject: LaserSubject): Promise<LaserSubject> {
  const laser = await findLaser(ctx.tx, subject.laser.id);
  if (!laser) throw new Error(`The laser ${subject.laser.id} vanished within a transaction.`);
  return { ...subject, laser, isNew: false };
}

function asIs(subject: LaserSubject): Promise<LaserSubject> {
  return Promise.resolve(subject);
}
