import type { EvaluationErrors, EvaluationResult } from './result';

/** What can be switched off for speed. */
export interface EvaluateOptions {
  /** Leaves out steps and candidates. */
  readonly bare?: boolean;
}

/**
 * Evaluates one case. Never throws: what is wrong with the case comes back as field errors.
 */
export declare function evaluate(
  input: unknown,
  options?: EvaluateOptions,
): EvaluationResult | EvaluationErrors;
