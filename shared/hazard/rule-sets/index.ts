import { ANSI_Z136_1_1993 } from './ansi-z136.1-1993';
import { ANSI_Z136_1_2007 } from './ansi-z136.1-2007';
import { ANSI_Z136_1_2014 } from './ansi-z136.1-2014';
import { EU_2006_25 } from './eu-2006-25';
import { ICNIRP_2013 } from './icnirp-2013';
import { IEC_60825_1_2014 } from './iec-60825-1-2014';
import type { RuleSet } from './rule-set';

/**
 * The one list: every edition that the engine knows, current ones first. Superseded editions are
 * for reading and re-checking old evaluations.
 */
export const RULE_SETS = [
  ICNIRP_2013,
  EU_2006_25,
  IEC_60825_1_2014,
  ANSI_Z136_1_2014,
  ANSI_Z136_1_2007,
  ANSI_Z136_1_1993,
] as const satisfies readonly RuleSet[];

/** The id of a rule set: one document in one edition. */
export type RuleSetId = (typeof RULE_SETS)[number]['id'];

const BY_ID: ReadonlyMap<string, RuleSet> = new Map(
  RULE_SETS.map((ruleSet) => [ruleSet.id, ruleSet]),
);

/** The rule set with this id, if there is one. */
export function ruleSetById(id: RuleSetId): RuleSet;
export function ruleSetById(id: unknown): RuleSet | undefined;
export function ruleSetById(id: unknown): RuleSet | undefined {
  return typeof id === 'string' ? BY_ID.get(id) : undefined;
}

export type { RuleSet };
