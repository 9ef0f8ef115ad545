import type { NonNullableFormBuilder } from '@angular/forms';
import type { Beam, HazardCase, PerAxis } from '@shared/hazard/case';
import type { RuleSetId } from '@shared/hazard/rule-sets';

import { filled } from '../../../core/forms/filled';
import { readSurroundings, type Surroundings, surroundingsForm } from '../inputs/surroundings';
import { type Typed, typed } from '../inputs/typed-quantity';

/** What the free bench begins with. */
export const FIRST_CASE: HazardCase = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 532,
      emission: { mode: 'cw', powerW: 0.005 },
      diameterMm: 1,
      divergenceMrad: 1,
      width: '1/e2',
      profile: 'gaussian',
    },
  ],
  exposure: { eyeS: 0.25, skinS: 10 },
  path: { kind: 'direct' },
};

export function beamForm(fb: NonNullableFormBuilder, beam: Beam) {
  const { mode, ...figures } = beam.emission;
  const emission: Readonly<Partial<Record<EmissionField, number>>> = figures;
  const given = (field: EmissionField, unit: string) => typed(emission[field], unit);
  return fb.group({
    label: [beam.label ?? ''],
    wavelengthNm: fb.control<Typed>(typed(beam.wavelengthNm, 'nm')),
    mode: [mode],
    powerW: fb.control<Typed>(given('powerW', 'W')),
    pulseEnergyJ: fb.control<Typed>(given('pulseEnergyJ', 'J')),
    pulseDurationS: fb.control<Typed>(given('pulseDurationS', 's')),
    repetitionRateHz: fb.control<Typed>(given('repetitionRateHz', 'Hz')),
    pulsesPerBurst: fb.control(emission.pulsesPerBurst ?? null),
    intraBurstRateHz: fb.control<Typed>(given('intraBurstRateHz', 'Hz')),
    burstRateHz: fb.control<Typed>(given('burstRateHz', 'Hz')),
    diameterMm: fb.control<Typed>(typed(axis(beam.diameterMm, 0), 'mm')),
    diameterYMm: fb.control<Typed>(typed(axis(beam.diameterMm, 1), 'mm')),
    divergenceMrad: fb.control<Typed>(typed(axis(beam.divergenceMrad, 0), 'mrad')),
    divergenceYMrad: fb.control<Typed>(typed(axis(beam.divergenceMrad, 1), 'mrad')),
    width: [beam.width ?? '1/e2'],
    profile: [beam.profile ?? 'gaussian'],
    sourceMrad: fb.control<Typed>(typed(axis(beam.sourceMrad, 0), 'mrad')),
    sourceYMrad: fb.control<Typed>(typed(axis(beam.sourceMrad, 1), 'mrad')),
    waistDistanceM: fb.control<Typed>(typed(beam.waistDistanceM, 'm')),
    m2: fb.control(beam.m2 ?? null),
  });
}
export type BeamForm = ReturnType<typeof beamForm>;

type EmissionField =
  | 'powerW'
  | 'pulseEnergyJ'
  | 'pulseDurationS'
  | 'repetitionRateHz'
  | 'pulsesPerBurst'
  | 'intraBurstRateHz'
  | 'burstRateHz';

export function caseForm(fb: NonNullableFormBuilder, hazardCase: HazardCase) {
  const { exposure, path, aid, air, model, at } = hazardCase;
  return fb.group({
    id: [hazardCase.id ?? ''],
    ruleSet: [hazardCase.ruleSet as RuleSetId],
    beams: fb.array(hazardCase.beams.map((beam) => beamForm(fb, beam))),
    surroundings: surroundingsForm(fb, {
      eyeS: exposure?.eyeS ?? 0.25,
      skinS: exposure?.skinS,
      path: (path ?? { kind: 'direct' }) as Surroundings['path'],
      aid,
      attenuationPerKm: air?.attenuationPerKm,
      growth: model?.growth,
      onAxis: model?.onAxis,
      atDistanceM: at?.distanceM,
    }),
  });
}
export type CaseForm = ReturnType<typeof caseForm>;

/** The form as the engine takes it; what is missing is left out, for the engine to name. */
export function readCase(form: CaseForm): unknown {
  const { id, ruleSet } = form.getRawValue();
  const around = readSurroundings(form.controls.surroundings);
  const { growth, onAxis } = around;
  return filled({
    id,
    ruleSet,
    beams: form.controls.beams.controls.map(readBeam),
    exposure: { eyeS: around.eyeS, skinS: around.skinS },
    path: around.path,
    aid: around.aid,
    air: { attenuationPerKm: around.attenuationPerKm },
    model: growth || onAxis ? { growth, onAxis } : undefined,
    at: { distanceM: around.atDistanceM },
  });
}

function readBeam(form: BeamForm) {
  const beam = form.getRawValue();
  return {
    label: beam.label.trim(),
    wavelengthNm: beam.wavelengthNm?.value,
    emission: readEmission(beam),
    diameterMm: perAxis(beam.diameterMm, beam.diameterYMm),
    divergenceMrad: perAxis(beam.divergenceMrad, beam.divergenceYMrad),
    width: beam.width,
    profile: beam.profile,
    sourceMrad: perAxis(beam.sourceMrad, beam.sourceYMrad),
    waistDistanceM: beam.waistDistanceM?.value,
    m2: beam.m2,
  };
}

function readEmission(beam: ReturnType<BeamForm['getRawValue']>) {
  const pulse = {
    pulseEnergyJ: beam.pulseEnergyJ?.value,
    pulseDurationS: beam.pulseDurationS?.value,
  };
  switch (beam.mode) {
    case 'cw':
      return { mode: 'cw', powerW: beam.powerW?.value };
    case 'single':
      return { mode: 'single', ...pulse };
    case 'repetitive':
      return { mode: 'repetitive', ...pulse, repetitionRateHz: beam.repetitionRateHz?.value };
    case 'burst':
      return {
        mode: 'burst',
        ...pulse,
        pulsesPerBurst: beam.pulsesPerBurst,
        intraBurstRateHz: beam.intraBurstRateHz?.value,
        burstRateHz: beam.burstRateHz?.value,
      };
  }
}

function perAxis(x: Typed, y: Typed): number | [number, number] | undefined {
  if (!x) return undefined;
  return y ? [x.value, y.value] : x.value;
}

function axis(value: PerAxis | undefined, index: 0 | 1): number | undefined {
  if (value === undefined) return undefined;
  if (typeof value === 'number') return index === 0 ? value : undefined;
  return value[index];
}
