import type { Evaluation, ResultChange } from '@shared/model/evaluations';
import type { Reach } from '@shared/model/lasers';
import * as z from 'zod';

type ReachFigures = Pick<Reach, 'eyeDistanceM' | 'skinDistanceM' | 'aidedDistanceM'>;

/** The distances inside a situation's sealed result; the rest of it is not needed here. */
const distancesSchema = z.object({
  eye: z.object({ hazardDistanceM: z.number(), aidedHazardDistanceM: z.number().optional() }),
  skin: z.object({ hazardDistanceM: z.number() }),
});

const WHATS = {
  eyeDistanceM: 'Eye hazard distance',
  skinDistanceM: 'Skin hazard distance',
  aidedDistanceM: 'Eye hazard distance with optical aid',
} as const satisfies Record<keyof ReachFigures, string>;

/**
 * The reach with today's inputs: each situation's sealed distances with what the server found
 * changed, the farthest of all situations. Undefined when a distance cannot be told.
 */
export function todaysReach(evaluation: Evaluation): ReachFigures | undefined {
  const names = new Set([
    ...evaluation.input.scenarios.map(({ name }) => name),
    ...evaluation.whatChanged.map(({ scenario }) => scenario),
  ]);
  const situations = [...names].map((name) => situationToday(evaluation, name));
  const eye = farthest(situations.map(({ eyeDistanceM }) => eyeDistanceM));
  const skin = farthest(situations.map(({ skinDistanceM }) => skinDistanceM));
  if (eye === undefined || skin === undefined) return undefined;
  const aidedDistanceM = farthest(situations.map((figures) => figures.aidedDistanceM));
  return { eyeDistanceM: eye, skinDistanceM: skin, aidedDistanceM };
}

function situationToday(evaluation: Evaluation, name: string) {
  const { scenarios } = evaluation.input;
  const id = scenarios.find((scenario) => scenario.name === name)?.id;
  const result = evaluation.results.find(({ scenarioId }) => scenarioId === id)?.result;
  const sealed = distancesSchema.safeParse(result).data;
  const changes = evaluation.whatChanged.filter(({ scenario }) => scenario === name);
  return {
    eyeDistanceM: changed(changes, WHATS.eyeDistanceM, sealed?.eye.hazardDistanceM),
    skinDistanceM: changed(changes, WHATS.skinDistanceM, sealed?.skin.hazardDistanceM),
    aidedDistanceM: changed(changes, WHATS.aidedDistanceM, sealed?.eye.aidedHazardDistanceM),
  };
}

function changed(
  changes: readonly ResultChange[],
  what: string,
  sealed: number | undefined,
): number | undefined {
  const change = changes.find((one) => one.what === what);
  return change ? (change.today ?? undefined) : sealed;
}

function farthest(distances: readonly (number | undefined)[]): number | undefined {
  const known = distances.filter((distance) => distance !== undefined);
  return known.length ? Math.max(...known) : undefined;
}
