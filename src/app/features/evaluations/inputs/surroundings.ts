import type { NonNullableFormBuilder } from '@angular/forms';
import type { Path } from '@shared/hazard/case';
import type { Scenario } from '@shared/model/evaluations';

import { type Typed, typed } from './typed-quantity';

/** What surrounds the beams of a situation: how long, which way, through what. */
export type Surroundings = Pick<
  Scenario,
  'eyeS' | 'skinS' | 'path' | 'aid' | 'attenuationPerKm' | 'growth' | 'onAxis' | 'atDistanceM'
>;

export type PathChoice = 'direct' | 'lens' | 'multimode' | 'single-mode' | 'diffuse';

export const PATH_CHOICES: readonly { value: PathChoice; words: string }[] = [
  { value: 'direct', words: 'Direct beam' },
  { value: 'lens', words: 'Through a lens' },
  { value: 'multimode', words: 'Open multimode fiber' },
  { value: 'single-mode', words: 'Open single-mode fiber' },
  { value: 'diffuse', words: 'Diffuse reflection' },
];

/** What stands in front of the eye, as people name it. */
export const AIDS = {
  none: undefined,
  'binoculars-7x50': { objectiveMm: 50, magnification: 7, transmission: 0.9 },
  'binoculars-8x30': { objectiveMm: 30, magnification: 8, transmission: 0.9 },
  'telescope-20x60': { objectiveMm: 60, magnification: 20, transmission: 0.9 },
} as const;
export type AidChoice = keyof typeof AIDS | 'other';

const EMPTY: Surroundings = { eyeS: 0.25, path: { kind: 'direct' } };

/** The form of the surroundings. Empty where the rule set's own model is meant. */
export function surroundingsForm(fb: NonNullableFormBuilder, from: Surroundings = EMPTY) {
  return fb.group({
    eyeS: fb.control<Typed>(typed(from.eyeS, 's')),
    skinS: fb.control<Typed>(typed(from.skinS, 's')),
    path: pathForm(fb, from.path as Path),
    aid: aidForm(fb, from.aid),
    attenuationPerKm: fb.control<Typed>(typed(from.attenuationPerKm, '1/km')),
    growth: [from.growth ?? ''],
    onAxis: [from.onAxis ?? ''],
    atDistanceM: fb.control<Typed>(typed(from.atDistanceM, 'm')),
  });
}
export type SurroundingsForm = ReturnType<typeof surroundingsForm>;

function pathForm(fb: NonNullableFormBuilder, path: Path) {
  const lens = path.kind === 'lens' ? path : undefined;
  const diffuse = path.kind === 'diffuse' ? path : undefined;
  const choice = pathChoice(path);
  return fb.group({
    kind: [choice],
    focalLengthMm: fb.control<Typed>(typed(lens?.focalLengthMm, 'mm')),
    diameterAtLensMm: fb.control<Typed>(typed(lens?.diameterAtLensMm, 'mm')),
    numericalAperture: fb.control(
      path.kind === 'fiber' && 'numericalAperture' in path ? path.numericalAperture : null,
    ),
    modeFieldDiameterUm: fb.control<Typed>(
      typed(
        path.kind === 'fiber' && 'modeFieldDiameterUm' in path
          ? path.modeFieldDiameterUm
          : undefined,
        'µm',
      ),
    ),
    reflectance: fb.control(diffuse?.reflectance ?? null),
    angleDeg: fb.control<Typed>(typed(diffuse?.angleDeg, '°')),
    spotMm: fb.control<Typed>(typed(diffuse?.spotMm, 'mm')),
  });
}

function aidForm(fb: NonNullableFormBuilder, aid: Surroundings['aid']) {
  return fb.group({
    choice: [aidChoice(aid)],
    objectiveMm: fb.control<Typed>(typed(aid?.objectiveMm, 'mm')),
    magnification: fb.control(aid?.magnification ?? null),
    transmission: fb.control(aid?.transmission ?? null),
  });
}

export function pathChoice(path: Path): PathChoice {
  if (path.kind !== 'fiber') return path.kind;
  return 'numericalAperture' in path ? 'multimode' : 'single-mode';
}

function aidChoice(aid: Surroundings['aid']): AidChoice {
  if (!aid) return 'none';
  const known = (Object.keys(AIDS) as (keyof typeof AIDS)[]).find((name) => {
    const preset = AIDS[name];
    return (
      preset?.objectiveMm === aid.objectiveMm &&
      preset.magnification === aid.magnification &&
      preset.transmission === aid.transmission
    );
  });
  return known ?? 'other';
}

/** The form's value in the contract's terms; what is missing is undefined, for the contract to name. */
export function readSurroundings(form: SurroundingsForm) {
  const { eyeS, skinS, path, aid, attenuationPerKm, growth, onAxis, atDistanceM } =
    form.getRawValue();
  return {
    eyeS: eyeS?.value,
    skinS: skinS?.value,
    path: readPath(path),
    aid: readAid(aid),
    attenuationPerKm: attenuationPerKm?.value,
    growth: growth || undefined,
    onAxis: onAxis || undefined,
    atDistanceM: atDistanceM?.value,
  };
}

type PathValue = ReturnType<SurroundingsForm['controls']['path']['getRawValue']>;
type AidValue = ReturnType<SurroundingsForm['controls']['aid']['getRawValue']>;

function readPath(path: PathValue) {
  switch (path.kind) {
    case 'direct':
      return { kind: 'direct' };
    case 'lens':
      return {
        kind: 'lens',
        focalLengthMm: path.focalLengthMm?.value,
        diameterAtLensMm: path.diameterAtLensMm?.value,
      };
    case 'multimode':
      return { kind: 'fiber', numericalAperture: path.numericalAperture ?? undefined };
    case 'single-mode':
      return { kind: 'fiber', modeFieldDiameterUm: path.modeFieldDiameterUm?.value };
    case 'diffuse':
      return {
        kind: 'diffuse',
        reflectance: path.reflectance ?? undefined,
        angleDeg: path.angleDeg?.value,
        spotMm: path.spotMm?.value,
      };
  }
}

function readAid(aid: AidValue) {
  if (aid.choice !== 'other') return AIDS[aid.choice];
  return {
    objectiveMm: aid.objectiveMm?.value,
    magnification: aid.magnification ?? undefined,
    transmission: aid.transmission ?? undefined,
  };
}
