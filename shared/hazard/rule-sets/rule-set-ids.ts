import { RULE_SETS, type RuleSetId } from './index';

/** The ids of the one list, in its order: current editions first. */
export const RULE_SET_IDS: readonly RuleSetId[] = RULE_SETS.map((ruleSet) => ruleSet.id);

export type { RuleSetId };
