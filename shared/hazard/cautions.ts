import type { RuleSet } from './rule-sets';

const ofRuleSets = new Map<RuleSet, readonly string[]>();

/** What every result carries. The list is shared by all results of a rule set. */
export function cautionsOf(ruleSet: RuleSet): readonly string[] {
  let cautions = ofRuleSets.get(ruleSet);
  if (cautions === undefined) {
    cautions = cautionsFor(ruleSet);
    ofRuleSets.set(ruleSet, cautions);
  }
  return cautions;
}

function cautionsFor({ edition, supersededBy }: RuleSet): readonly string[] {
  const standing =
    supersededBy === undefined
      ? 'whether it is the one that binds your site is for you to know'
      : 'a superseded edition, for reading and re-checking old evaluations';
  return [
    'An aid for trained people. Your laser safety officer, or the licensed person your law names, decides and signs.',
    `Local law and permit terms come first. Result made with ${edition}: ${standing}.`,
    'Valid from 180 nm to 1 mm; below 100 fs extrapolated. Bursts, extended sources, hot spots, multimode and non-Gaussian beams, filaments, scatter in air and optical aids need judgment. Wavelengths add only in the same tissue.',
    'As good as the inputs: label values are declared, not measured.',
    'An MPE is not a border between safe and hurt. Keep exposure as low as you can. People with light sensitivity, without a natural lens, infants, or on certain drugs need medical advice.',
    'Not for patients or cosmetic clients, light shows or audience scanning, aviation, military, space, range or weapon use; those have rules of their own.',
    'Lamps, LED and IPL follow other standards. This does not certify or classify a product.',
    'Eyewear is for accidental exposure, never for looking into the beam.',
    'Fire, explosion, electricity, skin sensitization and plume are judged separately.',
  ];
}
