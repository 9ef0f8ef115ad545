import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { evaluateScenarios } from '@shared/model/evaluation-case';
import { type Evaluation, evaluationSchema, type LaserInputs } from '@shared/model/evaluations';
import type { Emission } from '@shared/model/lasers';
import { describe, expect, it } from 'vitest';

import { evaluationDocument, evaluationReport } from './evaluation-report';

const PRINTED = {
  site: { siteName: 'Halvermere Institute', zone: 'Europe/Berlin', emergencyPhone: '555-0142' },
  printedAt: '2026-12-01T15:00:00.000Z',
};

function line(id: string, wavelengthNm: number, powerW: number): Emission {
  const labeled = (value: number) => ({ value, source: 'label' as const });
  return {
    id,
    wavelengthNm: labeled(wavelengthNm),
    mode: 'cw',
    powerW: labeled(powerW),
    delivery: 'beam',
    diameterMm: { value: 0.9, text: '0.9 mm', source: 'measured' },
    diameterConvention: 'fwhm',
    divergenceMrad: labeled(0.5),
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    profile: 'gaussian',
  };
}

function anEvaluation(
  changes: Partial<Evaluation> = {},
  emissions = [line('a', 532, 5)],
): Evaluation {
  const laserInputs: LaserInputs = { emissions, emissionSets: [], wallDistanceM: 11 };
  const input: Evaluation['input'] = {
    ruleSet: 'iec-60825-1-2014',
    scenarios: [
      {
        id: 's1',
        activity: 'operation',
        name: 'Direct beam',
        emissionIds: emissions.map(({ id }) => id),
        atWavelengthNm: {},
        eyeS: 0.25,
        skinS: 10,
        exposureReason: 'Visible, unintended viewing.',
        path: { kind: 'direct' },
      },
    ],
    notCovered: [{ activity: 'service', reason: 'Done by the maker.' }],
    assumptions: ['The shutter stays closed while people enter.'],
  };
  const results = JSON.parse(JSON.stringify(evaluateScenarios(laserInputs, input))) as never;
  return evaluationSchema.parse({
    id: 'ev_1',
    version: 4,
    number: 2,
    laser: { id: 'l1', tag: 'L-02', maker: 'Quenlorn', model: 'QG-5', areaCode: 'A-101' },
    state: 'approved',
    author: { id: 'p18', name: 'Aiko Tanabeshi' },
    input,
    laserInputs,
    laserInputsHash: 'h',
    laserInputsHashNow: 'h',
    engineVersion: '1.0.0',
    results,
    createdAt: '2026-11-27T08:00:00.000Z',
    updatedAt: '2026-11-30T14:05:00.000Z',
    staleReasons: [],
    whatChanged: [],
    inputsChanged: [],
    signatures: [
      {
        id: 'sg1',
        meaning: 'approved',
        signerId: 'p01',
        signerName: 'Ilse Brandmoor',
        signerRole: 'Laser safety officer',
        at: '2026-11-30T14:05:00.000Z',
        zone: 'Europe/Berlin',
        statement: 'I approve evaluation 2 of laser L-02.',
        comment: 'Read with care.',
        proof: 'password',
        sha256: 'ab'.repeat(32),
        verified: true,
      },
    ],
    sealSha256: 'cd'.repeat(32),
    statement: '',
    offered: [],
    mayEdit: false,
    ...changes,
  });
}

async function printed(evaluation: Evaluation): Promise<{ bytes: Buffer; pages: string[] }> {
  const bytes = await evaluationReport({ evaluation, ...PRINTED });
  const folder = mkdtempSync(join(tmpdir(), 'report-'));
  try {
    const file = join(folder, 'report.pdf');
    writeFileSync(file, bytes);
    const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
    return { bytes, pages: text.replaceAll('\u202f', ' ').split('\f').slice(0, -1) };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

describe('printed evaluation', () => {
  it('carries the signature with name, time and zone, meaning, statement, comment and hashes', async () => {
    const { pages } = await printed(anEvaluation());
    const text = pages.join('\n');
    expect(text).toContain('Approved by Ilse Brandmoor, Laser safety officer');
    expect(text).toContain('30 Nov 2026, 15:05 Europe/Berlin');
    expect(text).toContain('I approve evaluation 2 of laser L-02.');
    expect(text).toContain('“Read with care.”');
    expect(text).toContain('ab'.repeat(32));
    expect(text).toContain('cd'.repeat(32));
  });

  it('says rule set, durations, provenance, conversions and assumptions', async () => {
    const text = (await printed(anEvaluation())).pages.join('\n');
    expect(text).toContain('IEC 60825-1:2014');
    expect(text).toContain('eye 0.25 s, skin 10 s');
    expect(text).toContain('5 W (label)');
    expect(text).toContain('0.9 mm at half maximum (measured)');
    expect(text).toMatch(/0\.9 mm .*1\.529 mm at 1\/e²/);
    expect(text).toContain('The shutter stays closed while people enter.');
    expect(text).toContain('Service not evaluated');
  });

  it('rounds to the safe side: limit down, distance and density up', async () => {
    const text = (await printed(anEvaluation())).pages.join('\n');
    // 18 t^0.75 over 0.25 s is 25.4558 W/m².
    expect(text).toContain('25.4 W/m²');
    expect(text).not.toContain('25.5 W/m²');
  });

  it('numbers its pages, two before the annex with the derivation', async () => {
    const six = [457.9, 476.5, 488, 496.5, 501.7, 514.5].map((nm, i) => line(`l${i}`, nm, 1));
    for (const evaluation of [anEvaluation(), anEvaluation({}, six)]) {
      const { pages } = await printed(evaluation);
      pages.forEach((page, index) => {
        expect(page).toContain(`Page ${index + 1} of ${pages.length}`);
      });
      expect(pages.findIndex((page) => page.includes('Annex 1'))).toBe(2);
    }
  });

  it.each([
    ['draft', 'DRAFT'],
    ['in-check', 'DRAFT'],
    ['checked', 'DRAFT'],
    ['stale', 'OUTDATED'],
    ['superseded', 'SUPERSEDED'],
    ['withdrawn', 'WITHDRAWN'],
    ['discarded', 'DISCARDED'],
    ['approved', undefined],
  ] as const)('lays over every page of a %s evaluation: %s', (state, mark) => {
    const evaluation = anEvaluation({ state });
    const { watermark } = evaluationDocument({ evaluation, ...PRINTED });
    expect(watermark).toEqual(mark && expect.objectContaining({ text: mark }));
  });

  it('says in words why it is outdated and what got worse', async () => {
    const { pages } = await printed(
      anEvaluation({
        state: 'stale',
        staleReasons: ['The power of 532 nm changed.'],
        whatChanged: [
          {
            scenario: 'Direct beam',
            what: 'Eye hazard distance',
            unit: 'm',
            sealed: 1400,
            today: 1634.4,
            direction: 'worse',
          },
        ],
      }),
    );
    expect(pages[0]).toContain('The power of 532 nm changed.');
    expect(pages[0]).toMatch(/Eye hazard distance\s+1\.40 km\s+1\.64 km\s+worse/);
  });

  it('has nothing that runs or reaches out', async () => {
    const { bytes } = await printed(anEvaluation());
    const raw = bytes.toString('latin1');
    for (const name of ['/JavaScript', '/JS', '/Launch', '/URI', '/EmbeddedFile', '/OpenAction']) {
      expect(raw).not.toContain(name);
    }
  });
});
