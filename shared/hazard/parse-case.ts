import type { HazardCase } from './case';
import { checkBeams } from './parse/check-beams';
import { checkPath } from './parse/check-path';
import { checkAid, checkAir, checkAt, checkExposure, checkModel } from './parse/check-parts';
import { FieldCheck } from './parse/field-check';
import type { FieldError } from './result';
import { RULE_SETS, ruleSetById } from './rule-sets';

/** A case that can be evaluated, or what is wrong with it. */
export type ParsedCase =
  | { readonly ok: true; readonly case: HazardCase }
  | { readonly ok: false; readonly id?: string; readonly errors: FieldError[] };

const FIELDS = new Set([
  'id',
  'ruleSet',
  'beams',
  'exposure',
  'path',
  'aid',
  'air',
  'model',
  'at',
  'uncertainty',
]);

/** Checks a case of any origin. Every error names its field and what may stand there. */
export function parseCase(input: unknown): ParsedCase {
  const check = new FieldCheck([]);
  try {
    checkCase(check, input);
  } catch {
    // Why: reading an exotic object (a proxy, a getter that throws) may fail at any field.
    check.fail('', 'The case cannot be read.', 'plain JSON');
  }
  const { errors } = check;
  if (errors.length === 0) return { ok: true, case: input as HazardCase };
  const id = caseId(input);
  return id === undefined ? { ok: false, errors } : { ok: false, id, errors };
}

function checkCase(check: FieldCheck, input: unknown): void {
  const fields = check.object(input, FIELDS) as Partial<Record<keyof HazardCase, unknown>>;
  if (fields === undefined) return;
  const { id, ruleSet, beams, exposure, path, aid, air, model, at } = fields;
  if (id !== undefined) check.text(id, 'id');
  if (ruleSetById(ruleSet) === undefined) {
    check.choice(
      ruleSet,
      'ruleSet',
      RULE_SETS.map((known) => known.id),
    );
  }
  if ('uncertainty' in fields) {
    check.fail('uncertainty', 'Uncertainty is not evaluated by this version.', 'leave it out');
  }
  checkBeams(check, beams, checkPath(check.within('path'), path));
  if (exposure !== undefined || !hasOnlySinglePulses(beams)) {
    checkExposure(check.within('exposure'), exposure);
  }
  if (aid !== undefined) checkAid(check.within('aid'), aid);
  if (air !== undefined) checkAir(check.within('air'), air);
  if (model !== undefined) checkModel(check.within('model'), model);
  if (at !== undefined) checkAt(check.within('at'), at);
}

function hasOnlySinglePulses(beams: unknown): boolean {
  if (!Array.isArray(beams) || beams.length === 0) return false;
  return (beams as { emission?: { mode?: unknown } }[]).every(
    (beam) => beam?.emission?.mode === 'single',
  );
}

function caseId(input: unknown): string | undefined {
  try {
    const id = (input as { id?: unknown } | null | undefined)?.id;
    return typeof id === 'string' ? id : undefined;
  } catch {
    // Why: the same exotic objects as above.
    return undefined;
  }
}
