import type { HazardCase } from './case';
import { checkBeams, type CaseContext } from './parse/check-beams';
import {
  checkAt,
  checkAid,
  checkAir,
  checkExposure,
  checkModel,
  checkPath,
} from './parse/check-parts';
import { FieldCheck } from './parse/field-check';
import type { FieldError } from './result';
import { RULE_SETS, ruleSetById } from './rule-sets';

/** A case that can be evaluated, or what is wrong with it. */
export type ParsedCase =
  | { readonly ok: true; readonly case: HazardCase }
  | { readonly ok: false; readonly id?: string; readonly errors: FieldError[] };

const FIELDS = ['id', 'ruleSet', 'beams', 'exposure', 'path', 'aid', 'air', 'model', 'at'] as const;

/** Checks a case of any origin. Every error names its field and what may stand there. */
export function parseCase(input: unknown): ParsedCase {
  const check = new FieldCheck();
  try {
    checkCase(check, input);
  } catch {
    // Why: reading an exotic object (a proxy, a getter that throws) may fail at any field.
    check.fail('', 'The case cannot be read.', 'plain JSON');
  }
  if (check.errors.length === 0) return { ok: true, case: input as HazardCase };
  const id = caseId(input);
  return id === undefined
    ? { ok: false, errors: check.errors }
    : { ok: false, id, errors: check.errors };
}

function checkCase(check: FieldCheck, input: unknown): void {
  const fields = check.object(input, '', FIELDS, ['uncertainty']);
  if (fields === undefined) return;
  if (fields['id'] !== undefined) check.text(fields['id'], 'id');
  if (ruleSetById(fields['ruleSet']) === undefined) {
    const ids = RULE_SETS.map((ruleSet) => ruleSet.id);
    check.choice(fields['ruleSet'], 'ruleSet', ids, 'There is no such rule set');
  }
  if (fields['uncertainty'] !== undefined) {
    check.fail('uncertainty', 'Uncertainty is not evaluated by this version.', 'leave it out');
  }
  const context: CaseContext = checkPath(check, fields['path']);
  checkBeams(check, fields['beams'], context);
  checkExposure(check, fields['exposure'], hasOnlySinglePulses(fields['beams']));
  if (fields['aid'] !== undefined) checkAid(check, fields['aid']);
  if (fields['air'] !== undefined) checkAir(check, fields['air']);
  if (fields['model'] !== undefined) checkModel(check, fields['model']);
  if (fields['at'] !== undefined) checkAt(check, fields['at']);
}

function hasOnlySinglePulses(beams: unknown): boolean {
  if (!Array.isArray(beams) || beams.length === 0) return false;
  for (const beam of beams) {
    if ((beam as { emission?: { mode?: unknown } } | null)?.emission?.mode !== 'single')
      return false;
  }
  return true;
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
