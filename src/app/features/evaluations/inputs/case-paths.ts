import type { FieldError } from '@shared/model/problem';

/** The engine's own places of what a situation calls otherwise. */
const PLACES: Readonly<Record<string, string>> = {
  'exposure.eyeS': 'eyeS',
  'exposure.skinS': 'skinS',
  'at.distanceM': 'atDistanceM',
  'air.attenuationPerKm': 'attenuationPerKm',
  'model.growth': 'growth',
  'model.onAxis': 'onAxis',
};

/** Errors of the engine at the fields of our forms. */
export function atOurFields(errors: readonly FieldError[]): FieldError[] {
  return errors.map((error) => {
    const path = error.path.replace(/^scenarios\[\d+\]\./, '');
    return { ...error, path: PLACES[path] ?? path };
  });
}

/** The sentence for each field that has an error. */
export function sentencesByPath(errors: readonly FieldError[]): ReadonlyMap<string, string> {
  return new Map(
    errors.map(({ path, message, allowed }) => [
      path,
      allowed ? `${message} Allowed: ${allowed}` : message,
    ]),
  );
}
