import type { Evaluation } from '@shared/model/evaluations';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import {
  draft,
  inputOf,
  openForEvaluation,
  PASSWORD,
  readEvaluation,
  readLaser,
  register,
  signed,
  signInTeam,
  stepEvaluation,
  stepLaser,
  type Team,
} from '../support/evaluation-steps';
import { aLaser, anEmission, quantity } from '../support/laser-builders';
import { startTestApp, type TestApp } from '../support/test-app';

let app: TestApp;
let team: Team;
beforeAll(async () => {
  app = await startTestApp();
  team = await signInTeam(app);
});
afterAll(() => app.close());

async function newLaser(more: Parameters<typeof aLaser>[0] = {}): Promise<string> {
  const laser = await register(team.supervisor, aLaser({ areaId: app.areaIds.own, ...more }));
  return laser.id;
}

/** A laser under evaluation, of the supervisor's own area. */
async function openLaser(more: Parameters<typeof aLaser>[0] = {}): Promise<string> {
  const id = await newLaser(more);
  await openForEvaluation(team, id);
  return id;
}

describe('the main job: from a data sheet to a sealed evaluation', () => {
  it('goes through check and signature, and the laser follows', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    const sent = await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    expect(sent.state).toBe('in-check');
    expect(sent.signatures.map(({ meaning }) => meaning)).toEqual(['prepared']);
    const password = PASSWORD;
    const checked = await stepEvaluation(team.lso, id, { event: 'confirm', password });
    expect(checked).toMatchObject({ state: 'checked', checker: { id: app.personIds.lso } });
    const sealed = await stepEvaluation(team.lso, id, { event: 'sign', password });

    expect(sealed.state).toBe('approved');
    expect(sealed.sealSha256).toMatch(/^[0-9a-f]{64}$/);
    expect(sealed.reviewOn).toBe('2028-12-01');
    expect(sealed.signatures.map(({ meaning, verified }) => [meaning, verified])).toEqual([
      ['prepared', true],
      ['reviewed', true],
      ['approved', true],
    ]);
    const signature = sealed.signatures[2];
    expect(signature).toMatchObject({
      signerName: 'The lso',
      signerRole: 'Laser safety officer',
      proof: 'password',
      zone: 'UTC',
      at: '2026-12-01T09:00:00.000Z',
    });
    expect(signature?.statement).toMatch(/^I approve evaluation 1 of laser L-\d+, made with IEC/);

    const laser = await readLaser(team.lso, laserId);
    expect(laser.state).toBe('evaluated');
    expect(laser.reach).toMatchObject({ evaluationId: id, state: 'approved' });
    expect(laser.reach?.eyeDistanceM).toBeGreaterThan(100);
    expect(laser.reach?.lines).toHaveLength(1);
  });

  it('a laser whose evaluation was signed before it was opened is evaluated at once', async () => {
    const laserId = await newLaser();
    await signed(team, laserId);
    expect((await readLaser(team.lso, laserId)).state).toBe('received');
    expect((await openForEvaluation(team, laserId)).state).toBe('evaluated');
  });

  it('computes on the server what is saved, whatever was sent', async () => {
    const laserId = await openLaser();
    const evaluation = await draft(team, laserId);
    const { results } = evaluation as Evaluation & {
      results: { result: { eye: { perBeam: { mpe: { irradianceWPerM2: number } }[] } } }[];
    };
    // Case A of the engine's contract: 532 nm at 0.25 s, 25.455844 W/m².
    const [first] = results;
    expect(first?.result.eye.perBeam[0]?.mpe.irradianceWPerM2).toBeCloseTo(25.455844, 5);
    const path = `/api/evaluations/${evaluation.id}`;
    const extra = { ...evaluation.input, results: [] };
    await team.supervisor.put(path, extra, evaluation.version).expect(400);
  });
});

describe('guards', () => {
  it('send to check names everything that is missing at once', async () => {
    const laserId = await openLaser({
      emissions: [anEmission(), anEmission({ id: 'e2', wavelengthNm: quantity(1064) })],
      emissionSets: [{ name: 'both', emissionIds: ['e1', 'e2'] }],
    });
    const { body } = await team.supervisor.post('/api/evaluations', { laserId }).expect(201);
    const path = `/api/evaluations/${body.id}`;
    const [first] = body.input.scenarios;
    const input = { ...body.input, scenarios: [{ ...first, emissionIds: ['e1'] }] };
    const saved = await team.supervisor.put(path, input, body.version).expect(200);
    const refused = await team.supervisor
      .post(`${path}/transitions`, { event: 'send-to-check' }, saved.body.version)
      .expect(409);
    expect(refused.body).toMatchObject({ name: 'guard-failed' });
    expect(refused.body.reasons).toEqual([
      'No situation covers 1064 nm.',
      'No situation covers the set "both".',
      'Evaluate alignment, or say why it is not evaluated.',
      'Evaluate maintenance, or say why it is not evaluated.',
      'Evaluate service, or say why it is not evaluated.',
    ]);
    const offered = saved.body.offered.find(
      (one: { event: string }) => one.event === 'send-to-check',
    );
    expect(offered.reasons).toEqual(refused.body.reasons);
  });

  it('an author neither checks nor signs, whatever the role (SD2)', async () => {
    const laserId = await openLaser();
    const { body } = await team.lso.post('/api/evaluations', { laserId }).expect(201);
    const notCovered = ['maintenance', 'service'].map((activity) => ({
      activity,
      reason: 'Maker.',
    }));
    const path = `/api/evaluations/${body.id}`;
    await team.lso.put(path, { ...body.input, notCovered }, body.version).expect(200);
    await stepEvaluation(team.lso, body.id, { event: 'send-to-check' });
    const step = { event: 'confirm', password: PASSWORD };
    const refused = await stepEvaluation(team.lso, body.id, step, 409);
    expect(refused).toMatchObject({ reasons: ['The author does not check their own evaluation.'] });
    await stepEvaluation(team.deputy, body.id, step);
    const sign = { event: 'sign', password: PASSWORD };
    expect(await stepEvaluation(team.lso, body.id, sign, 409)).toMatchObject({
      reasons: ['The author does not sign their own evaluation.'],
    });
    expect(await stepEvaluation(team.deputy, body.id, sign, 409)).toMatchObject({
      reasons: [expect.stringMatching(/Delegations are not recorded here/)],
    });
    const other = await app.signIn('second-lso');
    expect((await stepEvaluation(other, body.id, sign)).state).toBe('approved');
  });

  it('nobody signs without the password, and a wrong one signs nothing', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    expect(await stepEvaluation(team.lso, id, { event: 'confirm' }, 409)).toMatchObject({
      reasons: ['Prove your presence: enter your password.'],
    });
    const wrong = { event: 'confirm', password: 'not my password' };
    expect(await stepEvaluation(team.lso, id, wrong, 403)).toMatchObject({ name: 'proof-failed' });
    expect((await readEvaluation(team.lso, id)).state).toBe('in-check');
  });

  it('a supervisor cannot check or sign, an operator cannot even begin', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    await stepEvaluation(team.supervisor, id, { event: 'confirm', password: PASSWORD }, 403);
    const operator = await app.signIn('operator');
    await operator.post('/api/evaluations', { laserId }).expect(403);
    expect((await readEvaluation(operator, id)).offered).toEqual([]);
    await stepEvaluation(operator, id, { event: 'confirm', password: PASSWORD }, 403);
  });

  it('a changed draft takes its signatures back', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    await stepEvaluation(team.lso, id, { event: 'confirm', password: PASSWORD });
    const checked = await readEvaluation(team.supervisor, id);
    const input = { ...checked.input, note: 'One more word.' };
    const saved = await team.supervisor.put(`/api/evaluations/${id}`, input, checked.version);
    expect(saved.body).toMatchObject({ state: 'draft', signatures: [] });
    expect(saved.body.checker).toBeUndefined();
    const late = { event: 'sign', password: PASSWORD };
    await stepEvaluation(team.lso, id, late, 409);
  });

  it('only the author changes it, and only from the version that is stored', async () => {
    const laserId = await openLaser();
    const { id, input, version } = await draft(team, laserId);
    const path = `/api/evaluations/${id}`;
    await team.lso.put(path, input, version).expect(403);
    await team.supervisor.put(path, input).expect(428);
    const stale = await team.supervisor.put(path, input, version - 1).expect(412);
    expect(stale.body.currentVersion).toBe(version);
    await team.supervisor.post('/api/evaluations', { laserId }).expect(409);
  });

  it('a return keeps its reason until the author has changed the draft', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    await stepEvaluation(team.deputy, id, { event: 'return' }, 409);
    const reason = 'The divergence is not that of the data sheet.';
    const returned = await stepEvaluation(team.deputy, id, { event: 'return', reason });
    expect(returned).toMatchObject({ state: 'draft', returnComment: reason });
    const today = await team.supervisor.get('/api/today').expect(200);
    expect(today.body.items).toContainEqual(
      expect.objectContaining({ kind: 'returned', recordId: id }),
    );
    const mine = await team.supervisor.get('/api/evaluations?waiting=me').expect(200);
    expect(mine.body.rows.map((row: { id: string }) => row.id)).toContain(id);
  });
});

describe('what the sealed rests on changes', () => {
  it('makes it stale in the same save, with what got worse, and takes the laser out of use', async () => {
    const laserId = await openLaser();
    const { id } = await signed(team, laserId);
    await takeOver(laserId);
    const laser = await readLaser(team.supervisor, laserId);
    expect(laser.state).toBe('in-use');
    const line = { ...laser.emissions[0]!, powerW: quantity(10) };
    const added = anEmission({ id: 'e2', label: 'doubled', wavelengthNm: quantity(266) });
    const input = { ...inputOf(laser), emissions: [line, added] };
    const saved = await team.supervisor.put(`/api/lasers/${laserId}`, input, laser.version);
    expect(saved.body).toMatchObject({ state: 'change-open' });
    expect(saved.body.attention[0]).toBe('Evaluation stale');
    expect(saved.body.reach.state).toBe('stale');

    const stale = await readEvaluation(team.lso, id);
    expect(stale.state).toBe('stale');
    expect(stale.staleReasons).toContain('532 nm: power: 5 W (data sheet) → 10 W (data sheet).');
    expect(stale.inputsChanged.map(({ field }) => field)).toEqual([
      '532 nm: power',
      'doubled, 266 nm',
    ]);
    expect(stale.whatChanged[0]?.direction).toBe('new');
    expect(stale.whatChanged).toContainEqual(
      expect.objectContaining({ what: 'Eye hazard distance', direction: 'worse' }),
    );
    expect(stale.signatures.every(({ verified }) => verified)).toBe(true);
    const confirm = { event: 'confirm-unchanged', password: PASSWORD };
    expect(await stepEvaluation(team.lso, id, confirm, 409)).toMatchObject({
      reasons: [expect.stringMatching(/inputs have changed/)],
    });
  });

  it('a wall that moves is an input as well', async () => {
    const laserId = await openLaser();
    const { id } = await signed(team, laserId);
    const area = (await team.lso.get(`/api/areas/${app.areaIds.own}`).expect(200)).body;
    const { code, name, building, room, department, supervisorId } = area;
    const input = { code, name, building, room, department, supervisorId, wallDistanceM: 12 };
    await team.lso.put(`/api/areas/${area.id}`, input, area.version).expect(200);
    const stale = await readEvaluation(team.lso, id);
    expect(stale).toMatchObject({
      state: 'stale',
      inputsChanged: [{ field: 'Distance to the wall', sealed: '10 m', today: '12 m' }],
      whatChanged: [],
    });
    const back = { ...input, wallDistanceM: 10 };
    await team.lso.put(`/api/areas/${area.id}`, back, area.version + 1).expect(200);
    app.clock.advance({ days: 31 });
    const confirm = { event: 'confirm-unchanged', password: PASSWORD };
    const lso = await app.signIn('lso');
    const confirmed = await stepEvaluation(lso, id, confirm);
    expect(confirmed).toMatchObject({ state: 'approved', reviewOn: '2029-01-01' });
    expect(confirmed.signatures.map(({ meaning, verified }) => [meaning, verified])).toEqual([
      ['prepared', true],
      ['reviewed', true],
      ['approved', true],
      ['confirmed-unchanged', true],
    ]);
    team = await signInTeam(app);
  });

  it('typing the same number in another unit changes nothing', async () => {
    const laserId = await openLaser();
    const { id } = await signed(team, laserId);
    const laser = await readLaser(team.supervisor, laserId);
    const line = { ...laser.emissions[0]!, powerW: quantity(5, { text: '5000 mW' }) };
    const input = { ...inputOf(laser), emissions: [line] };
    await team.supervisor.put(`/api/lasers/${laserId}`, input, laser.version).expect(200);
    expect((await readEvaluation(team.lso, id)).state).toBe('approved');
  });

  it('one in check is a draft again, and takes over the new lines', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    const laser = await readLaser(team.supervisor, laserId);
    const added = anEmission({ id: 'e2', wavelengthNm: quantity(1064) });
    const input = { ...inputOf(laser), emissions: [...laser.emissions, added] };
    await team.supervisor.put(`/api/lasers/${laserId}`, input, laser.version).expect(200);
    const again = await readEvaluation(team.supervisor, id);
    expect(again).toMatchObject({ state: 'draft', returnComment: expect.stringMatching(/inputs/) });
    const path = `/api/evaluations/${id}/refresh-inputs`;
    const refreshed = await team.supervisor.post(path, {}, again.version).expect(200);
    expect(refreshed.body.laserInputs.emissions).toHaveLength(2);
    expect(refreshed.body.input.scenarios[0].emissionIds).toEqual(['e1', 'e2']);
    expect(refreshed.body.laserInputsHash).toBe(refreshed.body.laserInputsHashNow);
  });
});

describe('newer versions and errors', () => {
  it('the newer signature supersedes the older', async () => {
    const laserId = await openLaser();
    const first = await signed(team, laserId);
    const second = await signed(team, laserId);
    expect(second).toMatchObject({ number: 2, supersedesId: first.id });
    const old = await readEvaluation(team.lso, first.id);
    expect(old).toMatchObject({ state: 'superseded', supersededById: second.id, offered: [] });
    expect(old.signatures.every(({ verified }) => verified)).toBe(true);
  });

  it('a withdrawn evaluation blocks its laser until a newer one is signed', async () => {
    const laserId = await openLaser();
    const { id } = await signed(team, laserId);
    await takeOver(laserId);
    const reason = 'The divergence was that of another model.';
    await stepEvaluation(team.lso, id, { event: 'withdraw', reason }, 409);
    const step = { event: 'withdraw', reason, password: PASSWORD };
    const gone = await stepEvaluation(team.lso, id, step);
    expect(gone.signatures.at(-1)).toMatchObject({ meaning: 'withdrawn', verified: true });
    const blocked = await readLaser(team.lso, laserId);
    expect(blocked).toMatchObject({ state: 'blocked', block: { by: null } });
    expect(blocked.reach).toBeUndefined();
    const release = { event: 'release', reason: 'A new evaluation is in force.' };
    expect(await stepLaser(team.lso, laserId, release, 409)).toMatchObject({
      reasons: [
        'A newer evaluation is not signed.',
        'No signed evaluation with the present inputs is on record.',
      ],
    });
    await signed(team, laserId);
    expect((await stepLaser(team.lso, laserId, release)).state).toBe('in-use');
  });

  it('of 50 signatures at once exactly one is made', async () => {
    const laserId = await openLaser();
    const { id } = await draft(team, laserId);
    await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
    await stepEvaluation(team.lso, id, { event: 'confirm', password: PASSWORD });
    const { version } = await readEvaluation(team.lso, id);
    const path = `/api/evaluations/${id}/transitions`;
    const step = { event: 'sign', password: PASSWORD };
    const acts = Array.from({ length: 50 }, () => team.lso.post(path, step, version));
    const statuses = (await Promise.all(acts)).map(({ status }) => status);
    expect(statuses.filter((status) => status === 200)).toHaveLength(1);
    // Refused: the version moved on, or the limit of passwords was reached and the session ended.
    expect(statuses.filter((status) => ![200, 401, 403, 409, 412, 429].includes(status))).toEqual(
      [],
    );
    const sealed = await readEvaluation(team.deputy, id);
    expect(sealed.signatures.filter(({ meaning }) => meaning === 'approved')).toHaveLength(1);
    app.clock.advance({ minutes: 20 });
    team = await signInTeam(app);
  });
});

/** In use by the LSO's dated waiver, as a laser of a former register. */
async function takeOver(laserId: string): Promise<void> {
  const waiver = { untilOn: '2027-10-01', missing: ['Area permits are not recorded here.'] };
  const reason = 'In use since 2021 under the former register.';
  await stepLaser(team.lso, laserId, { event: 'take-over', reason, waiver });
}
