import type { LaserInput, LaserTransition } from '@shared/model/lasers';
import { addDays, addMonths, daysBetween, localDateAt } from '@shared/model/local-date';
import {
  type LaserEvent,
  type LaserGuard,
  NOT_RECORDED_GUARDS,
} from '@shared/workflow/laser-life-cycle';

import type { Context } from '../context/context';
import {
  goStaleByReview,
  requireEvaluation,
} from '../features/evaluations/evaluation-staleness-service';
import { changeLaser, storeLaser, transitionLaser } from '../features/lasers/laser-service';
import {
  everyLaserId,
  refreshStanding,
  requireLaser,
} from '../features/lasers/laser-standing-service';
import { moveLaser } from '../features/lasers/laser-transition-service';
import { readSettings } from '../features/settings/settings-service';
import { DEMO_AREAS } from './demo-areas';
import { type Chronicle, type Hand, newChronicle } from './demo-chronicle';
import { type DemoEvaluation, noteEvaluation, take } from './demo-evaluations';
import type { Institute } from './demo-institute';
import {
  DEMO_LASERS,
  type DemoLaser,
  DOUBLED_LINE,
  HALVED_POWER_W,
  lineId,
  VERIFIED_CLASSES,
  WRONG_DIVERGENCE_MRAD,
} from './demo-lasers';
import { noteFormerLasers } from './demo-former-lasers';
import type { DemoPersonId } from './demo-people';

/** The day on which the lasers of the former register were taken over. */
const TAKEN_OVER_DAYS_AGO = 90;
const WAIVER_DAYS = 360;
/** The deputy's departments; elsewhere the LSO checks. */
const DEPUTY_AREAS: readonly string[] = ['A-101', 'A-102', 'A-110', 'B-203', 'B-204', 'B-210'];

interface Site {
  readonly institute: Institute;
  readonly chronicle: Chronicle;
  /** Days before today on which something was signed that is reviewed in 11 days. */
  readonly nearReviewDaysAgo: number;
}

/** A laser of the seed with the id that it gets on its way. */
interface Seeded {
  readonly laser: DemoLaser;
  readonly supervisor: DemoPersonId;
  readonly checker: DemoPersonId;
  id: string;
}

/** The register and its evaluations, through the services, in the order in which it happened. */
export async function seedLasers(institute: Institute): Promise<void> {
  const ctx = institute.as('P01', 0);
  const { zone, evaluationReviewMonths } = await readSettings(ctx);
  const today = localDateAt(ctx.edges.clock(), zone);
  const signedOn = addMonths(addDays(today, 11), -evaluationReviewMonths);
  const chronicle = newChronicle();
  const site = { institute, chronicle, nearReviewDaysAgo: daysBetween(signedOn, today) };
  DEMO_LASERS.forEach((laser, index) => noteLaser(site, laser, index));
  noteFormerLasers(chronicle, institute);
  await chronicle.unfold(institute);
  // Dates of the calendar are read once more, now that it is today.
  for (const id of await everyLaserId(ctx)) await refreshStanding(ctx, id);
}

function noteLaser(site: Site, laser: DemoLaser, index: number): void {
  const area = DEMO_AREAS.find(({ code }) => code === laser.area);
  const supervisor = laser.supervisor ?? area?.supervisor;
  if (!supervisor) throw new Error(`${laser.tag} has no supervisor.`);
  const checker = DEPUTY_AREAS.includes(laser.area ?? '') ? 'P02' : 'P01';
  const seeded: Seeded = { laser, supervisor, checker, id: '' };
  switch (laser.fate) {
    case 'received':
      noteFound(site, seeded);
      return;
    case 'registered':
      noteRegistration(site, seeded, laser.daysAgo ?? 0);
      return;
    case 'draft':
    case 'in-check':
    case 'checked':
      noteOpen(site, seeded, (laser.daysAgo ?? 0) + 12);
      noteEvaluation(site.chronicle, planOf(seeded, laser.daysAgo ?? 0, laser.fate));
      return;
    default:
      noteEvaluated(site, seeded, index);
      noteFate(site, seeded);
  }
}

/** Found or home-built: declared, and for the found one the LSO has measured the class. */
function noteFound({ institute, chronicle }: Site, seeded: Seeded): void {
  const { laser, supervisor } = seeded;
  chronicle.note(laser.daysAgo ?? 0, async (by) => {
    const stored = await storeLaser(by(supervisor), inputFor(institute, laser), 'declare-found');
    seeded.id = stored.id;
  });
  if (VERIFIED_CLASSES[laser.tag]) {
    chronicle.note((laser.daysAgo ?? 1) - 1, (by) => verify(by, seeded));
  }
}

function noteRegistration(site: Site, seeded: Seeded, daysAgo: number): void {
  const { laser, supervisor } = seeded;
  site.chronicle.note(daysAgo + 1, async (by) => {
    const input = inputFor(site.institute, laser);
    seeded.id = (await storeLaser(by(supervisor), input, 'register')).id;
  });
  site.chronicle.note(daysAgo, (by) => step(by(supervisor), seeded, { event: 'submit-record' }));
}

/** Registered, class verified, evaluation opened. */
function noteOpen(site: Site, seeded: Seeded, daysAgo: number): void {
  noteRegistration(site, seeded, daysAgo + 3);
  site.chronicle.note(daysAgo + 1, (by) => verify(by, seeded));
  site.chronicle.note(daysAgo, (by) => step(by('P01'), seeded, { event: 'open-evaluation' }));
}

/** Signed evaluations: one for most, two for those whose first is superseded or withdrawn. */
function noteEvaluated(site: Site, seeded: Seeded, index: number): void {
  const { laser } = seeded;
  const spread = 110 + ((index * 37) % 480);
  const near = laser.tag === 'L-41' ? site.nearReviewDaysAgo : spread;
  const fresh = laser.fate === 'evaluated' || laser.fate === 'commissioning';
  const signedDaysAgo = laser.signedDaysAgo ?? (fresh ? (laser.daysAgo ?? 0) + 30 : near);
  const firstDaysAgo = FIRST_VERSION_DAYS_AGO[laser.tag] ?? signedDaysAgo;
  noteOpen(site, seeded, firstDaysAgo + 8);
  const first = noteEvaluation(site.chronicle, planOf(seeded, firstDaysAgo, 'approved'));
  if (laser.tag === 'L-19') noteCorrection(site, seeded, first);
  if (firstDaysAgo !== signedDaysAgo) {
    noteEvaluation(site.chronicle, planOf(seeded, signedDaysAgo, 'approved'));
  }
  if (laser.tag === 'L-15') noteReviewPassed(site, first, signedDaysAgo);
}

const FIRST_VERSION_DAYS_AGO: Readonly<Record<string, number>> = { 'L-19': 330, 'L-24': 500 };

/** The divergence of L-19 was wrong: withdrawn, corrected, evaluated again. */
function noteCorrection(
  { institute, chronicle }: Site,
  seeded: Seeded,
  first: DemoEvaluation,
): void {
  chronicle.note(256, async (by) => {
    const reason = 'The divergence was entered ten times too large: 14 instead of 1.4 mrad.';
    await take(by, 'P01', { evaluation: first, event: 'withdraw', reason });
  });
  chronicle.note(254, async (by) => {
    const { version, input } = await requireLaser(by(seeded.supervisor), seeded.id);
    const corrected = { ...input, emissions: inputFor(institute, seeded.laser, true).emissions };
    await changeLaser(by(seeded.supervisor), seeded.id, { version, input: corrected });
    const reason = 'The divergence is corrected; a new evaluation is needed.';
    await step(by('P01'), seeded, { event: 're-evaluate', reason });
  });
}

/** What the calendar did once the review date of L-15 had passed. */
function noteReviewPassed(
  { chronicle, nearReviewDaysAgo }: Site,
  first: DemoEvaluation,
  signed: number,
): void {
  // Signed this many days before what is reviewed in 11 days.
  const passedDaysAgo = signed - nearReviewDaysAgo - 11 - 1;
  chronicle.note(passedDaysAgo, async (by) => {
    const ctx = by('P01');
    const stored = await requireEvaluation(ctx, first.current?.id ?? '');
    await goStaleByReview(ctx, stored);
  });
}

/** From evaluated on to what the laser is today. */
function noteFate(site: Site, seeded: Seeded): void {
  const { chronicle } = site;
  const { laser, supervisor } = seeded;
  const daysAgo = laser.daysAgo ?? 0;
  const { fate, why } = laser;
  if (fate === 'evaluated') return;
  if (fate === 'stored') {
    const reason = 'Key and cord are out; the room is locked.';
    chronicle.note(daysAgo, (by) => step(by(supervisor), seeded, { event: 'store', reason }));
    return;
  }
  if (fate === 'commissioning') {
    const reason = 'Stored until the clean room was ready for it.';
    chronicle.note(daysAgo + 20, (by) => step(by(supervisor), seeded, { event: 'store', reason }));
    chronicle.note(daysAgo, (by) => step(by(supervisor), seeded, { event: 'take-out' }));
    return;
  }
  noteTakeOver(site, seeded);
  noteChange(site, seeded);
  if (fate === 'blocked') {
    const blocker = laser.tag === 'L-03' ? 'P02' : 'P01';
    chronicle.note(daysAgo, (by) =>
      step(by(blocker), seeded, { event: 'block', reason: why ?? 'Blocked.' }),
    );
  }
  if (fate === 'on-loan') {
    chronicle.note(daysAgo, (by) => step(by(supervisor), seeded, { event: 'lend' }));
  }
  if (fate === 'service-open') {
    chronicle.note(daysAgo, (by) => moveBySystem(by('P01'), seeded, 'service-starts'));
  }
}

const ALWAYS_MISSING: readonly LaserGuard[] = [
  'commissioning-items-passed',
  'interlock-test-passed',
  'sign-photographed',
  'eyewear-sufficient',
  'procedure-in-force',
  'permit-active',
  'person-authorized',
];
const ALSO_MISSING: Readonly<Partial<Record<DemoLaser['fate'], LaserGuard>>> = {
  'on-loan': 'loan-form',
  'service-open': 'service-permit-in-force',
};

/** In use by a dated waiver that names what is not recorded here. */
function noteTakeOver({ chronicle }: Site, seeded: Seeded): void {
  const { laser } = seeded;
  const isGuest = laser.tag === 'L-23';
  const daysAgo = isGuest ? 8 : TAKEN_OVER_DAYS_AGO;
  const lasts = isGuest ? 20 : WAIVER_DAYS;
  const also = ALSO_MISSING[laser.fate];
  const missing = [...ALWAYS_MISSING, ...(also ? [also] : [])].flatMap(
    (guard) => NOT_RECORDED_GUARDS[guard] ?? [],
  );
  chronicle.note(daysAgo, async (by) => {
    const ctx = by('P01');
    const { zone } = await readSettings(ctx);
    const untilOn = addDays(localDateAt(ctx.now, zone), lasts);
    const reason = isGuest
      ? 'Laser of a visitor, here until the end of the visit.'
      : 'Taken over from the former register; its paper records are complete.';
    await step(ctx, seeded, { event: 'take-over', reason, waiver: { untilOn, missing } });
  });
}

/** The two changes of inputs that made evaluations stale. */
function noteChange({ chronicle }: Site, seeded: Seeded): void {
  const { tag } = seeded.laser;
  const edits: Readonly<Record<string, readonly [number, (input: LaserInput) => LaserInput]>> = {
    'L-03': [8, (input) => ({ ...input, emissions: [...input.emissions, DOUBLED_LINE] })],
    'L-12': [3, withHalvedPower],
  };
  const edit = edits[tag];
  if (!edit) return;
  const [daysAgo, change] = edit;
  chronicle.note(daysAgo, async (by) => {
    const { version, input } = await requireLaser(by(seeded.supervisor), seeded.id);
    await changeLaser(by(seeded.supervisor), seeded.id, { version, input: change(input) });
  });
}

function withHalvedPower(input: LaserInput): LaserInput {
  const emissions = input.emissions.map((emission) => ({
    ...emission,
    powerW: { value: HALVED_POWER_W, source: 'measured' as const },
  }));
  return { ...input, emissions };
}

function planOf(
  seeded: Seeded,
  daysAgo: number,
  until: 'draft' | 'in-check' | 'checked' | 'approved',
) {
  const { laser, supervisor: author, checker } = seeded;
  return { laser, laserId: () => seeded.id, author, checker, daysAgo, until };
}

async function verify(by: Hand, seeded: Seeded): Promise<void> {
  const { version, input, tag } = await requireLaser(by('P01'), seeded.id);
  const verifiedClass = VERIFIED_CLASSES[tag] ?? input.declaredClass;
  await changeLaser(by('P01'), seeded.id, { version, input: { ...input, verifiedClass } });
}

async function step(ctx: Context, { id }: Seeded, move: LaserTransition): Promise<void> {
  const { version } = await requireLaser(ctx, id);
  await transitionLaser(ctx, id, { version, step: move });
}

async function moveBySystem(ctx: Context, { id }: Seeded, event: LaserEvent): Promise<void> {
  await moveLaser(ctx, await requireLaser(ctx, id), { event, input: {}, bySystem: true });
}

function inputFor(institute: Institute, laser: DemoLaser, isCorrected = false): LaserInput {
  const wrong = laser.tag === 'L-19' && !isCorrected;
  const emissions = wrong
    ? laser.lines.map((line) => ({
        ...line,
        divergenceMrad: { value: WRONG_DIVERGENCE_MRAD, source: 'data-sheet' as const },
      }))
    : [...laser.lines];
  return {
    tag: laser.tag,
    maker: laser.maker,
    model: laser.model,
    homeBuilt: false,
    mobile: false,
    ...(laser.area ? { areaId: institute.areaId(laser.area) } : {}),
    ...(laser.supervisor ? { supervisorId: institute.personId(laser.supervisor) } : {}),
    ...laser.record,
    emissions,
    emissionSets: Object.entries(laser.sets ?? {}).map(([name, lines]) => ({
      name,
      emissionIds: lines.map((index) => lineId(laser, index)),
    })),
  };
}
