import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluate } from '../hazard/evaluate';
import { beamOf, diffractionLimitMrad } from './emission-beam';
import type { Emission, Quantity } from './lasers';

const q = (value: number): Quantity => ({ value, source: 'data-sheet' });

function emission(more: Partial<Emission> = {}): Emission {
  return {
    id: 'e1',
    wavelengthNm: q(532),
    mode: 'cw',
    powerW: q(5),
    delivery: 'beam',
    diameterMm: q(2.3),
    diameterConvention: '1/e2',
    divergenceMrad: q(0.5),
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    profile: 'gaussian',
    ...more,
  };
}

function beam(more: Partial<Emission> = {}, ...rest: [number?, Parameters<typeof beamOf>[2]?]) {
  const found = beamOf(emission(more), ...rest);
  if (!found.ok) throw new Error(JSON.stringify(found.errors));
  return found;
}

function errors(more: Partial<Emission>, ...rest: [number?, Parameters<typeof beamOf>[2]?]) {
  const found = beamOf(emission(more), ...rest);
  return found.ok ? [] : found.errors.map(({ path }) => path);
}

describe('widths', () => {
  it('at 1/e² are taken as they are, without a word', () => {
    const { beam: taken, conversions, assumptions } = beam();
    expect(taken).toEqual({
      wavelengthNm: 532,
      emission: { mode: 'cw', powerW: 5 },
      width: '1/e2',
      profile: 'gaussian',
      diameterMm: 2.3,
      divergenceMrad: 0.5,
    });
    expect([...conversions, ...assumptions]).toEqual([]);
  });

  // A Gaussian's 1/e² width is √(2/ln 2) = 1.699 of its FWHM and √2 of its 1/e width (definition).
  it('at half maximum and at 1/e come to 1/e², and the conversion is told', () => {
    const found = beam({ diameterConvention: 'fwhm', divergenceConvention: '1/e' });
    expect(found.beam.diameterMm).toBeCloseTo(2.3 * 1.6986436, 6);
    expect(found.beam.divergenceMrad).toBeCloseTo(0.5 * Math.SQRT2, 12);
    expect(found.conversions).toEqual([
      'Diameter: 2.3 mm at half maximum (FWHM) is 3.907 mm at 1/e² (Gaussian, times 1.699).',
      'Divergence: 0.5 mrad at 1/e is 0.7071 mrad at 1/e² (Gaussian, times 1.414).',
    ]);
  });

  it('half angles become full ones before the convention is looked at', () => {
    const found = beam({ divergenceAngle: 'half', divergenceConvention: 'fwhm' });
    expect(found.beam.divergenceMrad).toBeCloseTo(1.6986436, 6);
    expect(found.conversions).toHaveLength(2);
  });

  it('a top-hat has one width, whatever the convention says', () => {
    const found = beam({ profile: 'top-hat', diameterConvention: 'fwhm' });
    expect(found.beam).toMatchObject({ profile: 'top-hat', diameterMm: 2.3 });
  });

  it('of an ellipse keep their axes', () => {
    const found = beam({ diameterYMm: q(1), divergenceYMrad: q(1.1), diameterConvention: 'fwhm' });
    expect(found.beam.divergenceMrad).toEqual([0.5, 1.1]);
    expect(found.beam.diameterMm).toEqual([
      expect.closeTo(3.90688, 5),
      expect.closeTo(1.698644, 5),
    ]);
  });
});

describe('an unknown divergence', () => {
  it('is the smallest that the diameter allows, 4λ/(πd), and said so', () => {
    const found = beam({ divergenceMrad: undefined, diameterMm: q(1.2), wavelengthNm: q(800) });
    expect(found.beam.divergenceMrad).toBeCloseTo((1e3 * 4 * 800e-6) / (Math.PI * 1.2), 12);
    expect(found.assumptions).toEqual([
      'The divergence is unknown: evaluated with 0.8488 mrad, the smallest that a beam of this diameter can have.',
    ]);
  });

  it('reaches at least as far as any divergence above the diffraction limit', () => {
    const reachM = (more: Partial<Emission>) => {
      const result = evaluate(
        { ruleSet: 'iec-60825-1-2014', beams: [beam(more).beam], exposure: { eyeS: 10 } },
        { bare: true },
      );
      return 'errors' in result ? NaN : result.eye.hazardDistanceM;
    };
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 20, noNaN: true }),
        fc.double({ min: 1, max: 50, noNaN: true }),
        fc.integer({ min: 400, max: 1399 }),
        (mm, times, nm) => {
          const wavelengthNm = q(nm);
          const diameterMm = q(mm);
          const known = q(diffractionLimitMrad(nm, mm) * times);
          const unknown = reachM({ wavelengthNm, diameterMm, divergenceMrad: undefined });
          const reach = reachM({ wavelengthNm, diameterMm, divergenceMrad: known });
          expect(unknown).toBeGreaterThanOrEqual(reach * (1 - 1e-9));
        },
      ),
      { numRuns: 60 },
    );
  });
});

describe('pulses', () => {
  const pulse = {
    pulseDurationS: q(35e-15),
    repetitionRateHz: q(1000),
    powerW: undefined,
  } as const;

  it('take mean power and rate in place of the energy', () => {
    const found = beam({ mode: 'mode-locked', ...pulse, powerW: q(5) });
    expect(found.beam.emission).toEqual({
      mode: 'repetitive',
      pulseEnergyJ: 0.005,
      pulseDurationS: 35e-15,
      repetitionRateHz: 1000,
    });
    expect(found.conversions).toEqual(['Pulse energy 5 mJ: the mean power 5 W divided by 1 kHz.']);
  });

  it('take the higher of two figures that differ, and say so', () => {
    const found = beam({ mode: 'repetitive', ...pulse, powerW: q(6.5), pulseEnergyJ: q(5e-3) });
    expect(found.beam.emission).toMatchObject({ pulseEnergyJ: 0.0065 });
    expect(found.assumptions).toEqual([
      'The figures give pulse energies from 5 mJ to 6.5 mJ; the highest is evaluated.',
    ]);
  });

  it('take peak power and duration', () => {
    const found = beam({
      mode: 'repetitive',
      powerW: undefined,
      peakPowerW: q(4),
      pulseDurationS: q(300e-9),
      repetitionRateHz: q(100e3),
    });
    expect(found.beam.emission).toMatchObject({ pulseEnergyJ: expect.closeTo(1.2e-6, 15) });
  });

  it('in bursts share the mean power among all pulses', () => {
    const found = beam({
      mode: 'burst',
      powerW: q(4),
      pulseDurationS: q(300e-15),
      pulsesPerBurst: q(10),
      intraBurstRateHz: q(50e6),
      burstRateHz: q(100e3),
    });
    expect(found.beam.emission).toMatchObject({ mode: 'burst', pulseEnergyJ: 4e-6 });
  });

  it('of a modulated line are not credited without duration and rate', () => {
    const found = beam({ mode: 'modulated', powerW: q(1), peakPowerW: q(3) });
    expect(found.beam.emission).toEqual({ mode: 'cw', powerW: 3 });
    expect(found.assumptions[0]).toMatch(/not credited: evaluated as continuous at 3 W/);
    const pulsed = beam({
      mode: 'modulated',
      powerW: undefined,
      peakPowerW: q(3),
      pulseDurationS: q(1e-3),
      repetitionRateHz: q(100),
    });
    expect(pulsed.beam.emission).toMatchObject({ mode: 'repetitive', pulseEnergyJ: 0.003 });
  });

  it('of a scanned beam are evaluated as if it stood still', () => {
    expect(beam({ scan: '200 Hz over 20 mrad' }).assumptions[0]).toMatch(/scan is not credited/);
  });

  it('evaluate the maximum and only mention what is usual', () => {
    const found = beam({ operatingPowerW: q(3.5) });
    expect(found.beam.emission).toEqual({ mode: 'cw', powerW: 5 });
    expect(found.assumptions).toEqual([
      'The maximum of 5 W is evaluated; it is usually set to 3.5 W.',
    ]);
  });
});

describe('fibers', () => {
  const bare = { diameterMm: undefined, divergenceMrad: undefined } as const;

  it('give the path, and need no diameter', () => {
    const multi = beam({ delivery: 'multimode-fiber', numericalAperture: q(0.22), ...bare });
    expect(multi.fiber).toEqual({ kind: 'fiber', numericalAperture: 0.22 });
    const single = beam({ delivery: 'single-mode-fiber', modeFieldDiameterUm: q(5.6), ...bare });
    expect(single.fiber).toEqual({ kind: 'fiber', modeFieldDiameterUm: 5.6 });
  });

  it('without their figures are refused, with what is allowed', () => {
    expect(errors({ delivery: 'multimode-fiber', ...bare })).toEqual(['numericalAperture']);
    expect(errors({ delivery: 'single-mode-fiber', ...bare })).toEqual(['modeFieldDiameterUm']);
    const impossible = { delivery: 'multimode-fiber', numericalAperture: q(1.2), ...bare } as const;
    expect(errors(impossible)).toEqual(['numericalAperture']);
  });

  it('are left out when the situation has a path of its own', () => {
    const path = { kind: 'diffuse', reflectance: 0.8, angleDeg: 0 } as const;
    const found = beam({ delivery: 'multimode-fiber', ...bare }, undefined, path);
    expect(found.fiber).toBeUndefined();
  });
});

describe('tunable lines', () => {
  const range = { wavelengthNm: q(690), wavelengthToNm: q(1040) } as const;

  it('need a wavelength inside the range, and say that others are not covered', () => {
    expect(errors(range)).toEqual(['atWavelengthNm']);
    expect(errors(range, 689)).toEqual(['atWavelengthNm']);
    expect(errors(range, 1040.1)).toEqual(['atWavelengthNm']);
    const found = beam(range, 800);
    expect(found.beam.wavelengthNm).toBe(800);
    expect(found.assumptions).toEqual([
      'Evaluated at 800 nm of 690–1040 nm; other wavelengths are not covered here.',
    ]);
    expect(errors({ ...range, wavelengthToNm: q(600) }, 650)).toEqual(['wavelengthToNm']);
  });
});

describe('what is missing', () => {
  it.each([
    ['cw', ['powerW']],
    ['single', ['pulseDurationS', 'pulseEnergyJ']],
    ['repetitive', ['pulseDurationS', 'repetitionRateHz', 'pulseEnergyJ']],
    ['mode-locked', ['pulseDurationS', 'repetitionRateHz', 'pulseEnergyJ']],
    [
      'burst',
      ['pulseDurationS', 'pulsesPerBurst', 'intraBurstRateHz', 'burstRateHz', 'pulseEnergyJ'],
    ],
    ['modulated', ['peakPowerW']],
  ] as const)('of a %s line is all named at once', (mode, fields) => {
    expect(errors({ mode, powerW: undefined })).toEqual(fields);
  });

  it('a diameter is needed, and what may stand there is said', () => {
    const found = beamOf(emission({ diameterMm: undefined }));
    expect(found).toMatchObject({
      ok: false,
      errors: [{ path: 'diameterMm', allowed: expect.stringMatching(/above 0 mm/) }],
    });
  });
});
