/** Rule sets by id, current editions first. Superseded ones are for reading and re-checking old evaluations. */
export const RULE_SET_IDS = [
  'icnirp-2013',
  'eu-2006-25',
  'iec-60825-1-2014',
  'ansi-z136.1-2014',
  'ansi-z136.1-2007',
  'ansi-z136.1-1993',
] as const;

export type RuleSetId = (typeof RULE_SET_IDS)[number];
