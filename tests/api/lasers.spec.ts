import type { Laser, LaserPage, LaserRow } from '@shared/model/lasers';
import { LASER_SORTS } from '@shared/model/lasers';
import { NOT_RECORDED_GUARDS } from '@shared/workflow/laser-life-cycle';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { transact } from '../../server/context/transact';
import { acting, SYSTEM } from '../../server/context/context';
import { moveLaser } from '../../server/features/lasers/laser-transition-service';
import { requireLaser } from '../../server/features/lasers/laser-standing-service';
import {
  inputOf,
  openForEvaluation,
  PASSWORD,
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

function ownLaser(more: Parameters<typeof aLaser>[0] = {}): Promise<Laser> {
  return register(team.supervisor, aLaser({ areaId: app.areaIds.own, ...more }));
}

const REASON = 'In use since 2021 under the former register.';
const WAIVER = { untilOn: '2027-10-01', missing: ['Area permits are not recorded here.'] };

describe('entering the register', () => {
  it('gives the next free tag, the first version and one audit entry with the whole record', async () => {
    const laser = await ownLaser();
    const next = await ownLaser();
    expect(Number(next.tag.slice(2))).toBe(Number(laser.tag.slice(2)) + 1);
    expect(laser).toMatchObject({ version: 1, state: 'received', area: { code: 'T-1' } });
    const history = await team.supervisor.get(`/api/lasers/${laser.id}/history`).expect(200);
    expect(history.body.rows).toHaveLength(1);
    expect(history.body.rows[0]).toMatchObject({ action: 'register', toState: 'received' });
    const fields = history.body.rows[0].changes.map((change: { field: string }) => change.field);
    expect(fields).toEqual(expect.arrayContaining(['maker', 'emissions', 'areaId']));
  });

  it('refuses a tag that is taken, an unknown area, a foreign area', async () => {
    const { tag } = await ownLaser();
    const input = aLaser({ areaId: app.areaIds.own });
    const taken = await team.supervisor.post('/api/lasers', { ...input, tag }).expect(409);
    expect(taken.body.errors[0].path).toBe('tag');
    const unknown = { ...input, areaId: 'nowhere' };
    const none = await team.supervisor.post('/api/lasers', unknown).expect(400);
    expect(none.body.errors[0].path).toBe('areaId');
    const foreign = { ...input, areaId: app.areaIds.far };
    const refused = await team.supervisor.post('/api/lasers', foreign).expect(400);
    expect(refused.body.errors[0].message).toMatch(/do not supervise T-3/);
  });

  it('lets everybody declare a laser found, with a description', async () => {
    const operator = await app.signIn('operator');
    const input = aLaser({ areaId: app.areaIds.own });
    const silent = await operator.post('/api/lasers/found', input).expect(400);
    expect(silent.body.errors[0].path).toBe('note');
    const note = 'Green pointer in a drawer of the teaching lab.';
    const { body } = await operator.post('/api/lasers/found', { ...input, note }).expect(201);
    expect(body).toMatchObject({ state: 'received', attention: ['Quarantine'] });
    await operator.post('/api/lasers', input).expect(403);
  });

  it('leaves the verified class to the LSO', async () => {
    const input = aLaser({ areaId: app.areaIds.own, verifiedClass: '3B' });
    const refused = await team.supervisor.post('/api/lasers', input).expect(400);
    expect(refused.body.errors[0]).toMatchObject({ path: 'verifiedClass' });
    const laser = await ownLaser();
    const changed = { ...inputOf(laser), verifiedClass: '4' };
    await team.supervisor.put(`/api/lasers/${laser.id}`, changed, laser.version).expect(400);
    await team.deputy.put(`/api/lasers/${laser.id}`, changed, laser.version).expect(400);
    const { body } = await team.lso
      .put(`/api/lasers/${laser.id}`, changed, laser.version)
      .expect(200);
    // Who leaves it as it is may still change the rest.
    const noted = { ...inputOf(body), note: 'Seen.' };
    await team.supervisor.put(`/api/lasers/${laser.id}`, noted, body.version).expect(200);
  });

  it('warns of the same serial in any spelling', async () => {
    const { id } = await ownLaser({ serial: 'SN 0042-A' });
    const query = 'serial=sn0042a&maker=quenlorn';
    const { body } = await team.supervisor.get(`/api/lasers/duplicates?${query}`).expect(200);
    expect(body.lasers.map((laser: { id: string }) => laser.id)).toEqual([id]);
    const except = `/api/lasers/duplicates?${query}&exceptId=${id}`;
    expect((await team.supervisor.get(except).expect(200)).body.lasers).toEqual([]);
  });

  it('takes back what it gave: a form that is sent again changes nothing', async () => {
    const laser = await ownLaser({ serial: 'R-1', note: 'Keep.' });
    const path = `/api/lasers/${laser.id}`;
    const { body } = await team.supervisor.put(path, inputOf(laser), laser.version).expect(200);
    expect(inputOf(body)).toEqual(inputOf(laser));
    const history = await team.supervisor.get(`${path}/history`).expect(200);
    expect(history.body.rows[0]).toMatchObject({ action: 'laser.update', changes: [] });
  });

  it('keeps where the laser was', async () => {
    const laser = await register(team.lso, aLaser({ areaId: app.areaIds.own }));
    app.clock.advance({ minutes: 1 });
    const moved = { ...inputOf(laser), areaId: app.areaIds.near };
    const { body } = await team.lso
      .put(`/api/lasers/${laser.id}`, moved, laser.version)
      .expect(200);
    expect(body.places.map((place: { area: { code: string } }) => place.area.code)).toEqual([
      'T-2',
      'T-1',
    ]);
  });
});

describe('the life cycle', () => {
  it('refuses to submit an incomplete record, naming everything that is missing', async () => {
    const emissions = [anEmission({ powerW: undefined, diameterMm: undefined })];
    const laser = await ownLaser({ declaredClass: undefined, emissions });
    const refused = await stepLaser(team.supervisor, laser.id, { event: 'submit-record' }, 409);
    expect(refused).toMatchObject({
      reasons: [
        'Enter the class that the maker declares.',
        '532 nm: For this mode the power is missing.',
        '532 nm: The beam diameter is missing.',
      ],
    });
    const offered = laser.offered.find(({ event }) => event === 'submit-record');
    expect(offered?.reasons).toHaveLength(3);
  });

  it('goes through check, evaluation and take-over into use', async () => {
    const laser = await ownLaser();
    await stepLaser(team.supervisor, laser.id, { event: 'open-evaluation' }, 409);
    await stepLaser(team.supervisor, laser.id, { event: 'submit-record' });
    const unverified = await stepLaser(team.lso, laser.id, { event: 'open-evaluation' }, 409);
    expect(unverified).toMatchObject({ reasons: ['Set the class that you have verified.'] });
    await stepLaser(team.supervisor, laser.id, { event: 'open-evaluation' }, 403);
    const returned = await stepLaser(team.lso, laser.id, { event: 'return', reason: REASON });
    expect(returned.state).toBe('received');
    await openForEvaluation(team, laser.id);
    await signed(team, laser.id);
    const ready = await stepLaser(team.supervisor, laser.id, { event: 'declare-ready' }, 409);
    expect(ready).toMatchObject({ reasons: [NOT_RECORDED_GUARDS['controls-ticked']] });
    const used = await stepLaser(team.lso, laser.id, {
      event: 'take-over',
      reason: REASON,
      waiver: WAIVER,
    });
    expect(used).toMatchObject({
      state: 'in-use',
      waiver: { untilOn: '2027-10-01', ended: false, grantedBy: { name: 'The lso' } },
    });
  });

  it.each([
    ['no waiver', { reason: REASON }, /Give a waiver/],
    ['no reason', { waiver: WAIVER }, /Give the reason/],
    [
      'a waiver of yesterday',
      { reason: REASON, waiver: { ...WAIVER, untilOn: '2026-11-30' } },
      /after today/,
    ],
    [
      'a waiver of two years',
      { reason: REASON, waiver: { ...WAIVER, untilOn: '2028-12-01' } },
      /12 months/,
    ],
  ])('refuses a take-over with %s', async (_, step, reason) => {
    const { id } = await ownLaser();
    const refused = await stepLaser(team.lso, id, { event: 'take-over', ...step }, 409);
    expect((refused as unknown as { reasons: string[] }).reasons).toContainEqual(
      expect.stringMatching(reason),
    );
  });

  it('a guard that rests on later records is met by a waiver that names it, and by nothing else', async () => {
    const { id } = await ownLaser({ keyLocation: 'Cabinet' });
    const words = NOT_RECORDED_GUARDS['loan-form']!;
    await stepLaser(team.lso, id, { event: 'take-over', reason: REASON, waiver: WAIVER });
    const refused = await stepLaser(team.supervisor, id, { event: 'lend' }, 409);
    expect(refused).toMatchObject({ reasons: [words] });
    const other = await ownLaser({ keyLocation: 'Cabinet' });
    const waiver = { ...WAIVER, missing: [words] };
    await stepLaser(team.lso, other.id, { event: 'take-over', reason: REASON, waiver });
    expect((await stepLaser(team.supervisor, other.id, { event: 'lend' })).state).toBe('on-loan');
  });

  it('a waiver past its date blocks the laser at the next job', async () => {
    const { id } = await ownLaser();
    const waiver = { ...WAIVER, untilOn: '2026-12-10' };
    const used = await stepLaser(team.lso, id, { event: 'take-over', reason: REASON, waiver });
    expect(used.attention).toEqual(['Not evaluated', 'Waiver ends 10 December 2026']);
    app.clock.advance({ days: 9 });
    await app.product.jobs.tick();
    team = await signInTeam(app);
    expect((await readLaser(team.lso, id)).state).toBe('in-use');
    app.clock.advance({ days: 1 });
    await app.product.jobs.tick();
    team = await signInTeam(app);
    const blocked = await readLaser(team.lso, id);
    expect(blocked).toMatchObject({
      state: 'blocked',
      block: { by: null },
      waiver: { ended: true },
    });
    const release = { event: 'release', reason: 'The records are complete.' };
    const refused = (await stepLaser(team.lso, id, release, 409)) as unknown as {
      reasons: string[];
    };
    expect(refused.reasons).toContainEqual(expect.stringMatching(/^The waiver has ended/));
    const again = await stepLaser(team.lso, id, { event: 're-evaluate', reason: 'Short.' }, 400);
    expect(again).toMatchObject({ name: 'invalid-input' });
    const step = { event: 're-evaluate', reason: 'An evaluation is needed.' };
    expect((await stepLaser(team.lso, id, step)).block).toBeUndefined();
  });

  it('past its review date an evaluation is stale, and without a waiver the laser is blocked', async () => {
    const { id } = await ownLaser();
    await openForEvaluation(team, id);
    const evaluation = await signed(team, id);
    const missing = Object.values(NOT_RECORDED_GUARDS);
    const waiver = { untilOn: '2027-10-01', missing };
    await stepLaser(team.lso, id, { event: 'take-over', reason: REASON, waiver });
    // The jobs of a year in one step: first the waiver ends, then the review falls due.
    app.clock.advance({ days: 760 });
    await app.product.jobs.tick();
    team = await signInTeam(app);
    const aged = (await team.lso.get(`/api/evaluations/${evaluation.id}`).expect(200)).body;
    expect(aged).toMatchObject({
      state: 'stale',
      staleReasons: [expect.stringMatching(/review date/)],
    });
    expect(await readLaser(team.lso, id)).toMatchObject({ state: 'blocked' });
    const confirm = { event: 'confirm-unchanged', password: PASSWORD };
    expect((await stepEvaluation(team.lso, evaluation.id, confirm)).state).toBe('approved');
  });

  it('nobody releases a laser that they supervise (SD5), and blocking needs a reason', async () => {
    const input = aLaser({ areaId: app.areaIds.near, supervisorId: app.personIds.lso });
    const laser = await register(team.lso, input);
    await stepLaser(team.lso, laser.id, {
      event: 'take-over',
      reason: REASON,
      waiver: { ...WAIVER, untilOn: '2029-02-01' },
    });
    await stepLaser(team.deputy, laser.id, { event: 'block' }, 409);
    await stepLaser(team.deputy, laser.id, { event: 'block', reason: 'Stop work in the room.' });
    const release = { event: 'release', reason: 'The cause is closed.' };
    const refused = (await stepLaser(team.lso, laser.id, release, 409)) as unknown as {
      reasons: string[];
    };
    expect(refused.reasons).toContain('You supervise this laser: somebody else releases it.');
  });

  it('hands a laser over: the receiving supervisor accepts, the approval is void', async () => {
    const { id } = await ownLaser({ keyLocation: 'Cabinet' });
    const outsider = await app.signIn('outsider');
    const step = { event: 'transfer', areaId: app.areaIds.far, reason: 'The group has ended.' };
    await stepLaser(
      team.supervisor,
      id,
      { event: 'transfer', reason: 'x'.repeat(10), areaId: app.areaIds.own },
      409,
    );
    expect((await stepLaser(team.supervisor, id, step)).state).toBe('transferring');
    await stepLaser(team.supervisor, id, { event: 'accept-in-house' }, 403);
    const accepted = await stepLaser(outsider, id, { event: 'accept-in-house' });
    expect(accepted).toMatchObject({ state: 'registered', area: { code: 'T-3' } });
    await team.supervisor.get(`/api/lasers/${id}`).expect(404);
  });

  it('clears a disposal that another person asked for', async () => {
    const laser = await ownLaser();
    const nothing = await stepLaser(team.lso, laser.id, { event: 'clear-disposal' }, 409);
    expect(nothing).toMatchObject({
      reasons: expect.arrayContaining(['Nobody has asked for the disposal in the record.']),
    });
    const disposal = {
      method: 'Crushed.',
      disabled: true,
      cordRemoved: true,
      hazardousPartsRemoved: false,
    };
    const path = `/api/lasers/${laser.id}`;
    const asked = await team.supervisor.put(path, { ...inputOf(laser), disposal }, laser.version);
    const partly = await stepLaser(team.lso, laser.id, { event: 'clear-disposal' }, 409);
    expect(partly).toMatchObject({ reasons: ['Record that hazardous parts are removed.'] });
    const whole = { ...disposal, hazardousPartsRemoved: true };
    await team.supervisor
      .put(path, { ...inputOf(asked.body), disposal: whole }, asked.body.version)
      .expect(200);
    const gone = await stepLaser(team.lso, laser.id, {
      event: 'clear-disposal',
      reason: 'Seen.' + '.'.repeat(9),
    });
    expect(gone).toMatchObject({ state: 'disposed', offered: [], mayEdit: false });
    await team.lso.put(path, inputOf(gone), gone.version).expect(409);
    const listed = await team.lso.get(`/api/lasers?q=${gone.tag}`).expect(200);
    expect(listed.body.total).toBe(0);
    expect((await team.lso.get(`/api/lasers?state=disposed`).expect(200)).body.total).toBe(1);
  });

  it('the system alone takes its own steps', async () => {
    const { id } = await ownLaser();
    await stepLaser(team.lso, id, {
      event: 'take-over',
      reason: REASON,
      waiver: { ...WAIVER, untilOn: '2029-02-01' },
    });
    await stepLaser(team.lso, id, { event: 'service-starts' }, 403);
    const act = transact(app.edges, acting(SYSTEM, 'test'), async (ctx) =>
      moveLaser(ctx, await requireLaser(ctx, id), {
        event: 'service-starts',
        input: {},
        bySystem: true,
      }),
    );
    await expect(act).rejects.toThrow(NOT_RECORDED_GUARDS['service-permit-in-force']);
  });
});

describe('scope', () => {
  it('shows a supervisor the department, an operator too, and nobody the rest', async () => {
    const far = await register(team.lso, aLaser({ areaId: app.areaIds.far, tag: 'FAR-1' }));
    const near = await register(team.lso, aLaser({ areaId: app.areaIds.near, tag: 'NEAR-1' }));
    await team.supervisor.get(`/api/lasers/${far.id}`).expect(404);
    const seen = await team.supervisor.get(`/api/lasers/${near.id}`).expect(200);
    expect(seen.body).toMatchObject({ mayEdit: false, mayEvaluate: false, offered: [] });
    await team.supervisor.put(`/api/lasers/${near.id}`, inputOf(near), near.version).expect(403);
    for (const client of [team.supervisor, await app.signIn('operator')]) {
      const { body } = await client.get('/api/lasers?limit=200').expect(200);
      const tags = body.rows.map((row: LaserRow) => row.tag);
      expect(tags).toContain('NEAR-1');
      expect(tags).not.toContain('FAR-1');
      expect(body.counts.all).toBe(body.total);
    }
  });
});

describe('the list', () => {
  beforeAll(async () => {
    const lines = [405, 532, 633, 780, 1064].map((nm) => [
      anEmission({ wavelengthNm: quantity(nm) }),
    ]);
    for (let index = 0; index < 40; index += 1) {
      const tunable = anEmission({ wavelengthNm: quantity(690), wavelengthToNm: quantity(1040) });
      await app.as('lso', async (ctx) => {
        const { storeLaser } = await import('../../server/features/lasers/laser-service');
        await storeLaser(
          ctx,
          aLaser({
            tag: `S-${index}`,
            maker: ['Brindlewick', 'oakhollin', 'Ysbreck'][index % 3]!,
            serial: `ser/${1000 + index}`,
            areaId: [app.areaIds.own, app.areaIds.near, app.areaIds.far][index % 3],
            declaredClass: (['3B', '4', '2', 'IIIa'] as const)[index % 4],
            emissions: index % 8 === 7 ? [tunable] : lines[index % 5],
          }),
          'register',
        );
      });
    }
  });

  async function pages(query: string): Promise<{ tags: string[]; total: number }> {
    const tags: string[] = [];
    let after = '';
    let total = 0;
    do {
      const { body } = await team.lso.get(`/api/lasers?limit=7&${query}${after}`).expect(200);
      const page = body as LaserPage;
      tags.push(...page.rows.map((row) => row.tag));
      total = page.total;
      after = page.next === null ? '' : `&after=${page.next}`;
    } while (after);
    return { tags, total };
  }

  it.each(LASER_SORTS.flatMap((sort) => [[sort, 'asc'] as const, [sort, 'desc'] as const]))(
    'pages by %s %s give every laser once',
    async (sort, order) => {
      const { tags, total } = await pages(`sort=${sort}&order=${order}`);
      expect(tags).toHaveLength(total);
      expect(new Set(tags).size).toBe(total);
    },
  );

  it('sorts tags as people count, and wavelengths by the shortest', async () => {
    const { tags } = await pages('sort=tag&q=ser');
    expect(tags.slice(0, 12)).toEqual(Array.from({ length: 12 }, (_, index) => `S-${index}`));
    const { body } = await team.lso.get('/api/lasers?sort=wavelength&q=ser&limit=200').expect(200);
    const shortest = body.rows.map((row: LaserRow) => row.lines[0]?.wavelengthNm);
    expect(shortest).toEqual([...shortest].sort((a: number, b: number) => a - b));
  });

  it('a page after the page before neither repeats nor skips when lasers come in between', async () => {
    const first = await team.lso.get('/api/lasers?sort=tag&limit=10&q=ser').expect(200);
    await register(team.lso, aLaser({ tag: 'S-0a', serial: 'ser/new', areaId: app.areaIds.own }));
    const path = `/api/lasers?sort=tag&limit=10&q=ser&after=${first.body.next}`;
    const second = await team.lso.get(path).expect(200);
    expect(second.body.rows[0].tag).toBe('S-10');
  });

  it.each([
    ['532 nm', (row: LaserRow) => row.lines.some((line) => line.wavelengthNm === 532)],
    ['800 nm', (row: LaserRow) => row.lines.some((line) => line.wavelengthToNm === 1040)],
    ['3B', (row: LaserRow) => row.declaredClass === '3B'],
    ['405 nm 3B T-1', (row: LaserRow) => row.area?.code === 'T-1' && row.declaredClass === '3B'],
    ['oakh', (row: LaserRow) => row.maker === 'oakhollin'],
    ['ser/1005', (row: LaserRow) => row.serial === 'ser/1005'],
    [
      'OAKHOLLIN T-2 class 4',
      (row: LaserRow) => row.maker === 'oakhollin' && row.declaredClass === '4',
    ],
  ])('finds "%s"', async (text, matches) => {
    const { body } = await team.lso.get(`/api/lasers?limit=200&q=${encodeURIComponent(text)}`);
    expect(body.rows.length).toBeGreaterThan(0);
    expect(body.rows.every(matches)).toBe(true);
  });

  it.each(['"', '*', '" OR 1', 'a AND', 'NEAR(', '%', '\\', '🙂', '-', "'; drop table lasers"])(
    'takes %s as words',
    async (text) => {
      await team.lso.get(`/api/lasers?q=${encodeURIComponent(text)}`).expect(200);
    },
  );

  it('filters by what the address says, and counts over all', async () => {
    const far = `/api/lasers?areaId=${app.areaIds.far}&fromNm=1000&toNm=1100&class=4`;
    const { body } = await team.lso.get(far).expect(200);
    expect(body.rows.every((row: LaserRow) => row.area?.code === 'T-3')).toBe(true);
    const blocked = await team.lso.get('/api/lasers?attention=blocked&limit=200').expect(200);
    expect(blocked.body.total).toBe(blocked.body.counts.blocked);
    const stale = await team.lso.get('/api/lasers?attention=stale&limit=200').expect(200);
    expect(stale.body.total).toBe(stale.body.counts.stale);
    const any = await team.lso.get('/api/lasers?attention=any&limit=200').expect(200);
    expect(any.body.total).toBe(any.body.counts.attention);
    const none = await team.lso.get('/api/lasers?attention=not-evaluated&limit=200').expect(200);
    expect(none.body.total).toBe(none.body.counts.notEvaluated);
    await team.lso.get('/api/lasers?sort=nonsense').expect(400);
    await team.lso.get('/api/lasers?after=%25%25').expect(400);
  });

  it('exports the filtered list, one row a line, safe for a spreadsheet', async () => {
    const evil = '=HYPERLINK("http://x")';
    const emissions = [anEmission(), anEmission({ id: 'e2', powerW: quantity(0.1 + 0.2) })];
    await register(
      team.lso,
      aLaser({ tag: 'CSV-1', areaId: app.areaIds.own, model: evil, emissions }),
    );
    const { text, headers } = await team.lso.get('/api/lasers.csv?q=CSV-1').expect(200);
    expect(headers['content-disposition']).toMatch(/attachment/);
    expect(text.startsWith('tag,maker,model,serial')).toBe(true);
    const rows = parse(text, { columns: true }) as Record<string, string>[];
    expect(rows).toHaveLength(2);
    expect(rows[0]).toMatchObject({ model: `'${evil}`, rule_set: '', eye_hazard_distance_m: '' });
    expect(Number(rows[1]?.power_w)).toBe(0.1 + 0.2);
  });
});
