import type { EvaluationResult, SideResult, Step, Warning } from './result';
import type { RuleSetId } from './rule-sets';

/**
 * A result whose derivation is made when it is first read: most results are only looked at. To
 * whoever copies, compares or writes it, `steps` is a field like the others.
 */
export class DerivedResult implements EvaluationResult {
  declare id?: string;
  ruleSet: RuleSetId;
  edition: string;
  engineVersion: string;
  eye: SideResult;
  skin: SideResult;
  distances: EvaluationResult['distances'];
  declare steps: Step[];
  warnings: Warning[];
  cautions: readonly string[];
  readonly #derivation: () => Step[];
  #steps: Step[] | undefined;

  constructor(result: EvaluationResult, derivation: () => Step[]) {
    if (result.id !== undefined) this.id = result.id;
    this.ruleSet = result.ruleSet;
    this.edition = result.edition;
    this.engineVersion = result.engineVersion;
    this.eye = result.eye;
    this.skin = result.skin;
    this.distances = result.distances;
    this.#derivation = derivation;
    Object.defineProperty(this, 'steps', DerivedResult.STEPS);
    this.warnings = result.warnings;
    this.cautions = result.cautions;
  }

  /** One accessor for all results, so that making them stays cheap. */
  private static readonly STEPS: PropertyDescriptor & ThisType<DerivedResult> = {
    enumerable: true,
    configurable: true,
    get() {
      return (this.#steps ??= this.#derivation());
    },
  };
}
