import type { Side, Step } from '../result';
import { SOURCES, type SourceKey } from '../sources';

/** One step before its numbers are put in. */
export interface StepDraft {
  readonly symbol: string;
  readonly what: string;
  readonly formula: string;
  /** Where the number comes from quadrature or root finding, so that no formula yields it. */
  readonly isNumeric?: boolean;
  readonly value: number;
  readonly unit: string;
  readonly source: SourceKey;
}

/** Whom the steps are about. */
export interface StepSubject {
  readonly side: Side;
  /** Index of the beam; without it the step is about all beams. */
  readonly beam?: number;
}

/**
 * Collects the steps of one side of one beam. It knows the numbers behind the symbols, so that only
 * the formula is written and the substituted form follows.
 */
export class StepWriter {
  private readonly numbers = new Map<string, number>();

  constructor(
    private readonly steps: Step[],
    private readonly subject: StepSubject,
  ) {}

  /** Makes the number behind a symbol known that is given or was derived elsewhere. */
  know(symbol: string, value: number): void {
    this.numbers.set(symbol, value);
  }

  /** Writes a step; its symbol is known from here on. The same step is not repeated. */
  write({ symbol, what, formula, isNumeric = false, value, unit, source }: StepDraft): void {
    if (this.numbers.get(symbol) === value) return;
    this.steps.push({
      symbol,
      what,
      formula,
      substituted: isNumeric ? `${value}` : this.substitute(formula),
      value,
      unit,
      source: SOURCES[source].cite,
      ...this.subject,
    });
    this.numbers.set(symbol, value);
  }

  private substitute(formula: string): string {
    let substituted = '';
    for (const { text, isName } of piecesOf(formula)) {
      const value = isName ? this.numbers.get(text) : undefined;
      if (value === undefined) substituted += text;
      else substituted += value < 0 ? `(${value})` : value;
    }
    return substituted;
  }
}

interface FormulaPiece {
  readonly text: string;
  readonly isName: boolean;
}

const known = new Map<string, readonly FormulaPiece[]>();

/** The formula cut into names and what stands between them; there are few formulas. */
function piecesOf(formula: string): readonly FormulaPiece[] {
  let pieces = known.get(formula);
  if (pieces === undefined) {
    const texts = formula.match(/\d+\.?\d*(?:e[+-]?\d+)?|[A-Za-z]\w*|[^\dA-Za-z]+/g) ?? [];
    pieces = texts.map((text) => ({ text, isName: /^[A-Za-z]/.test(text) }));
    known.set(formula, pieces);
  }
  return pieces;
}
