import type { Evaluation } from '@shared/model/evaluations';
import { EVALUATION_LIFE_CYCLE } from '@shared/workflow/evaluation-life-cycle';
import type { Settings } from '@shared/model/settings';
import * as fc from 'fast-check';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { acting, type Actor } from '../../server/context/context';
import { transact } from '../../server/context/transact';
import {
  beginEvaluation,
  changeEvaluation,
  transitionEvaluation,
} from '../../server/features/evaluations/evaluation-service';
import { changeSettings, readSettings } from '../../server/features/settings/settings-service';
import { storeLaser } from '../../server/features/lasers/laser-service';
import { ApiError } from '../../server/http/errors';
import { aLaser, answered } from '../support/laser-builders';
import { startTestApp, type TestApp, type TestPerson } from '../support/test-app';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

const PEOPLE = [
  'laser-supervisor',
  'lso',
  'second-lso',
  'deputy-lso',
  'committee',
  'operator',
  'colleague',
] as const satisfies readonly TestPerson[];
type Person = (typeof PEOPLE)[number];

const EVENTS = [
  'send-to-check',
  'confirm',
  'confirm',
  'sign',
  'sign',
  'return',
  'discard',
  'withdraw',
  'confirm-unchanged',
  'go-stale',
  'supersede',
] as const;

type Act =
  | {
      readonly kind: 'step';
      readonly by: Person;
      readonly event: (typeof EVENTS)[number];
      readonly proven: boolean;
    }
  | { readonly kind: 'change'; readonly by: Person }
  | { readonly kind: 'settings'; readonly authorMayApprove: boolean };

const person = fc.constantFrom(...PEOPLE);
const act: fc.Arbitrary<Act> = fc.oneof(
  {
    weight: 10,
    arbitrary: fc.record({
      kind: fc.constant('step' as const),
      by: person,
      event: fc.constantFrom(...EVENTS),
      // Nearly always there, so that sequences come far.
      proven: fc.integer({ min: 0, max: 9 }).map((number) => number > 0),
    }),
  },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('change' as const), by: person }) },
  {
    weight: 1,
    arbitrary: fc.record({
      kind: fc.constant('settings' as const),
      authorMayApprove: fc.boolean(),
    }),
  },
);

function as<T>(by: Person, proof: string | null, work: (ctx: never) => Promise<T>): Promise<T> {
  const role = by === 'second-lso' ? 'lso' : by === 'colleague' ? 'laser-supervisor' : by;
  const actor: Actor = {
    id: app.personIds[by],
    name: by,
    email: '',
    department: 'Optics',
    roles: [role],
    areaIds: [],
  };
  return transact(app.edges, { ...acting(actor, 'test'), proof }, work as never);
}

async function begin(author: Person): Promise<Evaluation> {
  const laserId = await as('lso', null, async (ctx) => {
    const laser = await storeLaser(ctx, aLaser({ areaId: app.areaIds.own }), 'register');
    return laser.id;
  });
  return as(author, null, async (ctx) => {
    const { id, version, input } = await beginEvaluation(ctx, { laserId });
    return changeEvaluation(ctx, id, { version, input: answered(input) });
  });
}

async function setAuthorMayApprove(authorMayApprove: boolean): Promise<void> {
  await as('lso', null, async (ctx) => {
    const settings = await readSettings(ctx);
    const authorMayApproveReason = 'There is one laser safety officer only.';
    const input = { ...inputOfSettings(settings), authorMayApprove, authorMayApproveReason };
    await changeSettings(ctx, { version: settings.version, input });
  });
}

function inputOfSettings({ version: _version, updatedAt: _updatedAt, ...input }: Settings) {
  return input;
}

/** Does what was drawn; a refusal leaves everything as it was. */
async function attempt(now: Evaluation, one: Act): Promise<Evaluation> {
  const { id, version } = now;
  try {
    if (one.kind === 'settings') {
      await setAuthorMayApprove(one.authorMayApprove);
      return now;
    }
    if (one.kind === 'change') {
      const input = { ...now.input, note: `Changed in version ${version}.` };
      return await as(one.by, null, (ctx) => changeEvaluation(ctx, id, { version, input }));
    }
    const step = { event: one.event, reason: 'Drawn by a test of sequences.' };
    return await as(one.by, one.proven ? 'password' : null, (ctx) =>
      transitionEvaluation(ctx, id, { version, step }),
    );
  } catch (error) {
    if (error instanceof ApiError) return now;
    throw error;
  }
}

interface Seen {
  readonly before: Evaluation;
  readonly after: Evaluation;
  readonly one: Act;
  readonly authorMayApprove: boolean;
}

/** What must hold after every act, whoever did it. */
function check({ before, after, one, authorMayApprove }: Seen): void {
  const meanings = after.signatures.map(({ meaning }) => meaning);
  expect(after.signatures.every(({ verified }) => verified)).toBe(true);
  if (after.checker) expect(after.checker.id).not.toBe(after.author.id);
  for (const signature of after.signatures) {
    if (signature.meaning === 'reviewed') expect(signature.signerId).not.toBe(after.author.id);
    if (signature.meaning === 'approved') expect(signature.signerId).toBe(after.approver?.id);
  }
  const isSealed = after.sealSha256 !== undefined;
  expect(isSealed).toBe(['approved', 'stale', 'superseded', 'withdrawn'].includes(after.state));
  if (isSealed) {
    expect(meanings.slice(0, 3)).toEqual(['prepared', 'reviewed', 'approved']);
    expect([app.personIds.lso, app.personIds['second-lso']]).toContain(after.approver?.id);
  }
  if (before.sealSha256) {
    expect(after.sealSha256).toBe(before.sealSha256);
    expect(after.input).toEqual(before.input);
  }
  if (before.state === after.state || one.kind === 'settings') return;
  const row = EVALUATION_LIFE_CYCLE.transitions.find(
    ({ from, to, event }) =>
      from.includes(before.state) &&
      to === after.state &&
      event === (one.kind === 'step' ? one.event : 'input-changed'),
  );
  expect(row?.event, `${before.state} to ${after.state}`).toBeDefined();
  expect(row?.actors).not.toEqual(['system']);
  if (one.kind === 'step' && one.event === 'sign') {
    expect(one.proven).toBe(true);
    if (!authorMayApprove) expect(after.approver?.id).not.toBe(after.author.id);
  }
  if (one.kind === 'step' && one.event === 'confirm') expect(one.proven).toBe(true);
}

it(
  'no sequence of acts by anybody gets around the separation of duties (SD2, SD6, SD9)',
  { timeout: 300_000 },
  async () => {
    const reached = new Map<string, number>();
    const authors = ['laser-supervisor', 'lso', 'deputy-lso'] as const;
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...authors),
        fc.array(act, { minLength: 4, maxLength: 14 }),
        async (author, acts) => {
          await setAuthorMayApprove(false);
          let authorMayApprove = false;
          let now = await begin(author);
          // The author sends it, so that what follows is about check and signature.
          const first: Act = { kind: 'step', by: author, event: 'send-to-check', proven: true };
          for (const one of [first, ...acts]) {
            const after = await attempt(now, one);
            if (one.kind === 'settings') authorMayApprove = one.authorMayApprove;
            check({ before: now, after, one, authorMayApprove });
            now = after;
            reached.set(now.state, (reached.get(now.state) ?? 0) + 1);
          }
        },
      ),
      { numRuns: 250, seed: 20261201 },
    );
    // The sequences came far enough to mean something.
    for (const state of ['draft', 'in-check', 'checked', 'approved', 'withdrawn', 'discarded']) {
      expect(reached.get(state) ?? 0, state).toBeGreaterThan(0);
    }
  },
);
