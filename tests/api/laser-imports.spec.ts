import type { LaserImport } from '@shared/model/laser-imports';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { register } from '../support/evaluation-steps';
import { aLaser } from '../support/laser-builders';
import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
let supervisor: TestClient;
let lso: TestClient;
beforeAll(async () => {
  app = await startTestApp();
  supervisor = await app.signIn('laser-supervisor');
  lso = await app.signIn('lso');
});
afterAll(() => app.close());

const HEADER =
  'tag,maker,model,serial,declared_class,area,mode,wavelength_nm,power_w,pulse_energy_j,pulse_duration_s,repetition_rate_hz,diameter_mm,diameter_convention,divergence_mrad,divergence_convention,divergence_angle,source,received_on';

/** Columns as in `HEADER`; a line of 532 nm unless told otherwise. */
function row(cells: Record<string, string | number> = {}, header = HEADER): string {
  const base: Record<string, string | number> = {
    maker: 'Quenlorn',
    model: 'QG-5',
    declared_class: '4',
    area: 'T-1',
    mode: 'cw',
    wavelength_nm: 532,
    power_w: 5,
    diameter_mm: 2.3,
    diameter_convention: '1/e2',
    divergence_mrad: 0.5,
    divergence_convention: '1/e2',
    divergence_angle: 'full',
    source: 'data-sheet',
    ...cells,
  };
  return header
    .split(',')
    .map((name) => `"${String(base[name] ?? '').replaceAll('"', '""')}"`)
    .join(',');
}

async function send(client: TestClient, text: string | Buffer): Promise<LaserImport> {
  const sent = await client
    .post('/api/laser-imports')
    .attach('file', Buffer.from(text), { filename: 'register.csv', contentType: 'text/csv' })
    .expect(202);
  return settled(client, sent.body.id);
}

async function settled(client: TestClient, id: string): Promise<LaserImport> {
  for (;;) {
    const { body } = await client.get(`/api/laser-imports/${id}`).expect(200);
    if (body.status !== 'checking' && body.status !== 'saving') return body;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

async function countLasers(): Promise<number> {
  return (await lso.get('/api/lasers?limit=1').expect(200)).body.counts.all;
}

describe('the dry run', () => {
  it('understands units in cells, and says nothing is stored yet', async () => {
    const before = await countLasers();
    const text = [
      HEADER,
      row({ serial: 'U-1', power_w: '5 mW' }),
      row({
        serial: 'U-2',
        wavelength_nm: '1.064 µm',
        mode: 'pulsed',
        power_w: '',
        pulse_energy_j: '450 mJ',
        pulse_duration_s: '6 ns',
        repetition_rate_hz: '10 Hz',
      }),
      row({ serial: 'U-3', diameter_mm: '0.8 mm', divergence_mrad: '1.5 mrad' }),
    ].join('\n');
    const checked = await send(supervisor, text);
    expect(checked).toMatchObject({
      status: 'checked',
      rowsTotal: 3,
      rowsDone: 3,
      rowsGood: 3,
      lasers: 3,
      errors: [],
      errorCount: 0,
    });
    expect(await countLasers()).toBe(before);
    await supervisor.post(`/api/laser-imports/${checked.id}/save`).expect(202);
    const saved = await settled(supervisor, checked.id);
    expect(saved.status).toBe('saved');
    expect(await countLasers()).toBe(before + 3);
    const { body } = await lso.get('/api/lasers?q=U-2').expect(200);
    const laser = (await lso.get(`/api/lasers/${body.rows[0].id}`).expect(200)).body;
    const [line] = laser.emissions;
    expect(line).toMatchObject({
      mode: 'repetitive',
      wavelengthNm: { value: 1064, text: '1.064 µm', source: 'data-sheet' },
      pulseEnergyJ: { value: 0.45, text: '450 mJ' },
      pulseDurationS: { value: 6e-9 },
    });
    expect(laser.state).toBe('received');
  });

  it.each([
    ['power_w', '10W@10kHz', /unit/],
    ['power_w', '5 nm', /length/],
    ['power_w', '-5', /above 0/],
    ['wavelength_nm', '1,064', /two ways/],
    ['wavelength_nm', 'IR', /not a number/],
    ['wavelength_nm', '100', /180/],
    ['declared_class', 'IIIb/4', /none of the words/],
    ['mode', 'sometimes', /none of the words/],
    ['received_on', '03/04/25', /no year of four digits/],
    ['received_on', '03/04/2025', /more than one way/],
    ['received_on', 'May 12', /no year/],
    ['received_on', '2025-02-30', /no day/],
    ['diameter_convention', '', /convention/],
    ['divergence_angle', '', /full or the half/],
    ['source', '', /come from/],
    ['area', 'Z-999', /no area/],
    ['area', '', /area/],
    ['area', 'T-3', /do not supervise/],
    ['maker', '', /maker/],
  ])('refuses %s = "%s" at its row and column', async (column, given, message) => {
    const bad = row({ [column]: given });
    const checked = await send(supervisor, [HEADER, row({ serial: 'ok-1' }), bad].join('\n'));
    expect(checked.errors, JSON.stringify(checked.errors)).toContainEqual(
      expect.objectContaining({ row: 3, column, message: expect.stringMatching(message) }),
    );
    expect(checked).toMatchObject({ status: 'checked', rowsTotal: 2, rowsGood: 1 });
    const refused = await supervisor.post(`/api/laser-imports/${checked.id}/save`).expect(409);
    expect(refused.body.detail).toMatch(/errors/);
  });

  it('refuses a bare number where the header names no unit', async () => {
    const header = HEADER.replace('power_w', 'power');
    const text = [header, row({ power: '5 W' }, header), row({ power: '5' }, header)].join('\n');
    const checked = await send(supervisor, text);
    expect(checked.errors).toEqual([
      expect.objectContaining({
        row: 3,
        column: 'power_w',
        message: expect.stringMatching(/no unit/),
      }),
    ]);
  });

  it('takes several rows of one tag as the lines of one laser, and says where they differ', async () => {
    const first = row({ tag: 'M-1', serial: 'M1' });
    const second = row({ tag: 'M-1', serial: 'M1', wavelength_nm: 1064 });
    const good = await send(supervisor, [HEADER, first, second].join('\n'));
    expect(good).toMatchObject({ lasers: 1, rowsGood: 2, errorCount: 0 });
    const other = row({ tag: 'M-1', serial: 'M1', wavelength_nm: 355, model: 'QG-6' });
    const bad = await send(supervisor, [HEADER, first, other].join('\n'));
    expect(bad.errors).toEqual([
      expect.objectContaining({
        row: 3,
        column: 'model',
        message: 'Row 2 of the same laser says "QG-5".',
      }),
    ]);
  });

  it('reports duplicates in the file and in the register', async () => {
    await register(supervisor, aLaser({ areaId: app.areaIds.own, tag: 'D-1', serial: 'SN 77-1' }));
    const text = [
      HEADER,
      row({ tag: 'D-1' }),
      row({ tag: 'D-2', serial: 'sn771' }),
      row({ tag: 'D-3', serial: 'X-1' }),
      row({ tag: 'D-4', serial: 'x1' }),
    ].join('\n');
    const checked = await send(supervisor, text);
    expect(checked.errors.map((error) => [error.row, error.column])).toEqual([
      [2, 'tag'],
      [3, 'serial'],
      [5, 'serial'],
    ]);
  });

  it('reads semicolons, a byte order mark and quoted line ends', async () => {
    const text = `\uFEFFmaker;model;area;note\r\nQuenlorn;"QG;5";T-1;"two\r\nlines"\r\n`;
    const checked = await send(supervisor, text);
    expect(checked).toMatchObject({ rowsTotal: 1, lasers: 1, errorCount: 0 });
  });

  it.each([
    ['an unknown column', `maker,model,colour\nA,B,red`, /not known/],
    ['a missing column', `maker,area\nA,T-1`, /missing/],
    ['no rows', `maker,model\n`, /no laser/],
    ['nothing', ` \n`, /empty/],
    ['an open quote', `maker,model\n"A,B`, /not CSV/],
    ['another encoding', Buffer.from([0x6d, 0x2c, 0x6e, 0x0a, 0xe4, 0x2c, 0x42]), /UTF-8/],
    ['2,001 rows', `maker,model\n${'A,B\n'.repeat(2001)}`, /2001 rows/],
  ])('refuses a file with %s', async (_, text, message) => {
    const checked = await send(supervisor, text);
    expect(checked.errorCount).toBeGreaterThan(0);
    expect(checked.errors[0]?.message).toMatch(message);
    expect(checked.errors[0]?.row).toBe(1);
  });

  it('is for whoever registers lasers; another person cannot see it', async () => {
    const checked = await send(supervisor, [HEADER, row()].join('\n'));
    await lso.get(`/api/laser-imports/${checked.id}`).expect(404);
    const operator = await app.signIn('operator');
    await operator.get('/api/laser-imports/template.csv').expect(403);
    const canceled = await supervisor.delete(`/api/laser-imports/${checked.id}`).expect(204);
    expect(canceled.body).toEqual({});
    await supervisor.post(`/api/laser-imports/${checked.id}/save`).expect(409);
  });

  it('takes its own template, once the area exists', async () => {
    const { text } = await lso.get('/api/laser-imports/template.csv').expect(200);
    expect(text).not.toMatch(/[=@]/);
    const mine = text.replaceAll('B-204', 'T-1');
    const checked = await send(supervisor, mine);
    expect(checked).toMatchObject({ lasers: 2, errorCount: 0, warnings: [] });
  });
});

describe('saving', () => {
  it('keeps nothing when one row is refused at the end', async () => {
    const text = [HEADER, row({ tag: 'N-1' }), row({ tag: 'N-2' })].join('\n');
    const checked = await send(supervisor, text);
    // Meanwhile somebody takes the second tag.
    await register(supervisor, aLaser({ areaId: app.areaIds.own, tag: 'N-2' }));
    const before = await countLasers();
    await supervisor.post(`/api/laser-imports/${checked.id}/save`).expect(202);
    const failed = await settled(supervisor, checked.id);
    expect(failed).toMatchObject({
      status: 'failed',
      errors: [{ row: 3, column: 'tag', message: 'The tag N-2 is taken by another laser.' }],
    });
    expect(await countLasers()).toBe(before);
  });

  it(
    'takes 2,000 rows, shows its progress, and the register answers meanwhile',
    { timeout: 300_000 },
    async () => {
      const before = await countLasers();
      const rows = Array.from({ length: 2000 }, (_, index) =>
        row({ tag: `B-${index}`, serial: `B${index}`, wavelength_nm: 400 + (index % 600) }),
      );
      const checked = await send(supervisor, [HEADER, ...rows].join('\n'));
      expect(checked).toMatchObject({ rowsGood: 2000, lasers: 2000, errorCount: 0 });
      await supervisor.post(`/api/laser-imports/${checked.id}/save`).expect(202);
      const seen: number[] = [];
      for (;;) {
        const { body } = await supervisor.get(`/api/laser-imports/${checked.id}`).expect(200);
        seen.push(body.rowsDone);
        if (body.status !== 'saving') break;
      }
      expect(seen.some((done) => done > 0 && done < 2000)).toBe(true);
      expect((await settled(supervisor, checked.id)).status).toBe('saved');
      expect(await countLasers()).toBe(before + 2000);
      const found = await lso.get('/api/lasers?q=B-1999').expect(200);
      expect(found.body.total).toBe(1);
      const verified = await lso.get('/api/audit-trail/verification').expect(200);
      expect(verified.body.intact).toBe(true);
    },
  );

  it('can be canceled while it saves: nothing is kept', async () => {
    const before = await countLasers();
    const rows = Array.from({ length: 600 }, (_, index) => row({ tag: `C-${index}` }));
    const checked = await send(supervisor, [HEADER, ...rows].join('\n'));
    await supervisor.post(`/api/laser-imports/${checked.id}/save`).expect(202);
    await supervisor.delete(`/api/laser-imports/${checked.id}`).expect(204);
    expect((await settled(supervisor, checked.id)).status).toBe('canceled');
    expect(await countLasers()).toBe(before);
  });

  it('what is exported can be read again', async () => {
    const { text } = await lso.get('/api/lasers.csv?q=U-1').expect(200);
    const [exported] = parse(text, { columns: true }) as Record<string, string>[];
    expect(exported).toMatchObject({ serial: 'U-1', power_w: '0.005', wavelength_nm: '532' });
    const checked = await send(lso, text);
    // Only that it is on record already stands in its way.
    expect(checked.errors.map(({ column }) => column)).toEqual(['tag', 'serial']);
  });
});
