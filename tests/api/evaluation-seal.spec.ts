import BetterSqlite from 'better-sqlite3';
import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { acting, reading, SYSTEM } from '../../server/context/context';
import { evaluationSubject } from '../../server/features/evaluations/evaluation-life-cycle';
import { requireEvaluation } from '../../server/features/evaluations/evaluation-staleness-service';
import { evaluationView } from '../../server/features/evaluations/evaluation-view';
import {
  openForEvaluation,
  readEvaluation,
  register,
  signed,
  signInTeam,
  type Team,
} from '../support/evaluation-steps';
import { aLaser, anEmission, quantity } from '../support/laser-builders';
import { asBytes } from '../support/response-body';
import { startTestApp, type TestApp } from '../support/test-app';

let app: TestApp;
let team: Team;
let id: string;
let otherId: string;
/** Somebody who can write to the file itself. */
let attacker: BetterSqlite.Database;

beforeAll(async () => {
  app = await startTestApp();
  team = await signInTeam(app);
  id = await sealedEvaluation();
  otherId = await sealedEvaluation();
  attacker = new BetterSqlite(app.edges.db.file);
});
afterAll(async () => {
  attacker.close();
  await app.close();
});

async function sealedEvaluation(): Promise<string> {
  const emissions = [anEmission(), anEmission({ id: 'e2', wavelengthNm: quantity(1064) })];
  const laser = await register(team.supervisor, aLaser({ areaId: app.areaIds.own, emissions }));
  await openForEvaluation(team, laser.id);
  return (await signed(team, laser.id)).id;
}

/** Whether every signature verifies, read as the page reads it. */
async function verifies(): Promise<boolean> {
  const ctx = reading(app.edges, acting(SYSTEM, 'test'));
  const subject = await evaluationSubject(ctx, await requireEvaluation(ctx, id));
  const { signatures } = await evaluationView(ctx, subject);
  return signatures.length === 3 && signatures.every(({ verified }) => verified);
}

type Row = Record<string, unknown>;

function rowOf(table: string, key: string): Row {
  const column = table === 'evaluations' ? 'id' : 'evaluation_id';
  return attacker.prepare(`select * from ${table} where ${column} = ?`).get(key) as Row;
}

describe('against those who may use the product', () => {
  it('the database refuses every change of what is sealed', () => {
    const touch = (sql: string) => () => attacker.prepare(sql).run(id);
    expect(touch(`update evaluations set input = '{}' where id = ?`)).toThrow(/never changed/);
    expect(touch('update evaluations set results = results where id = ?')).toThrow(/never changed/);
    expect(touch('delete from evaluations where id = ?')).toThrow(/never deleted/);
    const signature = 'update evaluation_signatures set comment = null where evaluation_id = ?';
    expect(touch(signature)).toThrow(/never changed/);
    expect(touch('delete from evaluation_signatures where evaluation_id = ?')).toThrow(
      /never deleted/,
    );
    expect(touch(`update evaluation_seals set sha256 = '' where evaluation_id = ?`)).toThrow(
      /never/,
    );
    expect(touch('delete from evaluation_seals where evaluation_id = ?')).toThrow(/never deleted/);
  });

  it('gives the sealed text itself, and its hash is the one that is shown', async () => {
    const { sealSha256 } = await readEvaluation(team.lso, id);
    const path = `/api/evaluations/${id}/seal.json`;
    const { body, headers } = await team.lso.get(path).buffer(true).parse(asBytes).expect(200);
    const text = (body as Buffer).toString('utf8');
    expect(createHash('sha256').update(text).digest('hex')).toBe(sealSha256);
    expect(headers['content-disposition']).toMatch(
      /^attachment; filename="L-\d+-evaluation-1-seal/,
    );
    const sealed = JSON.parse(text);
    expect(sealed).toMatchObject({
      format: 'limen-evaluation-seal',
      content: { ruleSet: 'iec-60825-1-2014', edition: expect.stringMatching(/60825/) },
      laser: { areaCode: 'T-1' },
      signatures: [{ meaning: 'prepared' }, { meaning: 'reviewed' }, { meaning: 'approved' }],
    });
  });
});

describe('against somebody who writes to the file', () => {
  beforeAll(() => {
    const triggers = attacker
      .prepare(
        `select name from sqlite_master where type = 'trigger' and tbl_name like 'evaluation%'`,
      )
      .pluck()
      .all() as string[];
    for (const name of triggers) attacker.exec(`drop trigger ${name}`);
    attacker.pragma('foreign_keys = off');
    attacker.pragma('ignore_check_constraints = on');
  });

  /** Changes one column, asks whether it still verifies, and puts it back. */
  async function survives(table: string, column: string, value: unknown): Promise<boolean> {
    const key = table === 'evaluations' ? 'id' : 'evaluation_id';
    const set = attacker.prepare(`update ${table} set ${column} = ? where ${key} = ?`);
    const before = rowOf(table, id)[column];
    set.run(value, id);
    try {
      return await verifies();
    } finally {
      set.run(before, id);
    }
  }

  const SEALED_COLUMNS = [
    'number',
    'author_id',
    'checker_id',
    'approver_id',
    'rule_set',
    'edition',
    'laser_inputs_hash',
    'engine_version',
    'eye_distance_m',
    'skin_distance_m',
    'optical_density',
    'sealed_at',
    'signed_at',
    'review_on',
    'supersedes_id',
  ];

  it.each(SEALED_COLUMNS)('a changed %s is found', async (column) => {
    expect(await verifies()).toBe(true);
    const before = rowOf('evaluations', id)[column];
    const people = [app.personIds.auditor, app.personIds.colleague];
    const other = column.endsWith('_id')
      ? people.find((person) => person !== before)
      : typeof before === 'number'
        ? before + 1
        : `${String(before ?? '')}0`;
    expect(await survives('evaluations', column, other)).toBe(false);
    expect(await verifies()).toBe(true);
  });

  it.each(['input', 'laser_inputs', 'results'])(
    'any one value changed in %s is found',
    async (column) => {
      const whole = JSON.parse(rowOf('evaluations', id)[column] as string) as unknown;
      const paths = leavesOf(whole);
      const step = Math.max(1, Math.floor(paths.length / 110));
      const chosen = paths.filter((_, index) => index % step === 0);
      const survived: string[] = [];
      for (const path of chosen) {
        const changed = JSON.stringify(withOther(whole, path));
        if (await survives('evaluations', column, changed)) survived.push(path.join('.'));
      }
      expect(chosen.length).toBeGreaterThan(20);
      expect(survived).toEqual([]);
    },
  );

  it.each([
    'id',
    'round',
    'meaning',
    'signer_id',
    'signer_name',
    'signer_role',
    'acting_for',
    'at',
    'zone',
    'statement',
    'comment',
    'proof',
    'content_sha256',
    'sha256',
  ])('a changed %s of a signature is found', async (column) => {
    const { id: signatureId, [column]: before } = rowOf('evaluation_signatures', id);
    const set = attacker.prepare(`update evaluation_signatures set ${column} = ? where rowid = ?`);
    const rowid = attacker
      .prepare('select rowid from evaluation_signatures where id = ?')
      .pluck()
      .get(signatureId);
    set.run(typeof before === 'number' ? before + 1 : `${String(before ?? '')}x`, rowid);
    expect(await verifies()).toBe(false);
    set.run(before, rowid);
    expect(await verifies()).toBe(true);
  });

  it('a seal that is changed, or changed with its hash made anew, is found and not given out', async () => {
    const { canonical_json: text } = rowOf('evaluation_seals', id) as { canonical_json: string };
    const forged = text.replace('"powerW":5', '"powerW":4');
    expect(forged).not.toBe(text);
    expect(await survives('evaluation_seals', 'canonical_json', forged)).toBe(false);
    expect(await survives('evaluation_seals', 'sha256', '0'.repeat(64))).toBe(false);
    expect(await survives('evaluation_seals', 'sealed_at', '2020-01-01T00:00:00.000Z')).toBe(false);
    const set = attacker.prepare(
      'update evaluation_seals set canonical_json = ?, sha256 = ? where evaluation_id = ?',
    );
    set.run(forged, createHash('sha256').update(forged).digest('hex'), id);
    expect(await verifies()).toBe(false);
    const refused = await team.lso.get(`/api/evaluations/${id}/seal.json`).expect(409);
    expect(refused.body.detail).toMatch(/does not verify/);
    set.run(text, createHash('sha256').update(text).digest('hex'), id);
    expect(await verifies()).toBe(true);
  });

  it('a signature copied from another evaluation is found', async () => {
    const foreign = rowOf('evaluation_signatures', otherId);
    const own = rowOf('evaluation_signatures', id);
    const names = Object.keys(foreign).filter((name) => name !== 'id' && name !== 'evaluation_id');
    const set = attacker.prepare(
      `update evaluation_signatures set ${names.map((name) => `${name} = ?`).join(', ')} where id = ?`,
    );
    set.run(...names.map((name) => foreign[name]), own.id);
    expect(await verifies()).toBe(false);
    set.run(...names.map((name) => own[name]), own.id);
    expect(await verifies()).toBe(true);
  });
});

type Path = readonly (string | number)[];

function leavesOf(value: unknown, path: Path = []): Path[] {
  if (typeof value !== 'object' || value === null) return [path];
  return Object.entries(value).flatMap(([key, item]) =>
    leavesOf(item, [...path, Array.isArray(value) ? Number(key) : key]),
  );
}

/** A copy with another value at the path. */
function withOther(whole: unknown, path: Path): unknown {
  const [key, ...rest] = path;
  if (key === undefined) {
    if (typeof whole === 'number') return whole === 0 ? 1 : whole * (1 + 1e-15) + Number.EPSILON;
    return typeof whole === 'boolean' ? !whole : `${String(whole)}.`;
  }
  const copy = (Array.isArray(whole) ? [...whole] : { ...(whole as object) }) as Record<
    string,
    unknown
  >;
  copy[key] = withOther(copy[key], rest);
  return copy;
}
