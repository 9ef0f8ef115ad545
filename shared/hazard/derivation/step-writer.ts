import type { Side, Step } from '../result';
import { SOURCES, type SourceKey } from '../sources';

/** One step before its numbers are put in. */
export interface StepDraft {
  readonly symbol: string;
  readonly what: string;
  readonly formula: string;
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

/** The number behind a symbol, and how it is printed once it has been. */
interface KnownNumber {
  readonly value: number;
  text: string | undefined;
}

/**
 * Collects the steps of one side of one beam. It knows the numbers behind the symbols, so that only
 * the formula is written and the substituted form follows.
 */
export class StepWriter {
  private readonly numbers = new Map<string, KnownNumber>();

  constructor(
    private readonly steps: Step[],
    private readonly subject: StepSubject,
  ) {}

  /** Makes the number behind a symbol known that is given or was derived elsewhere. */
  know(symbol: string, value: number): void {
    if (this.numbers.get(symbol)?.value !== value) {
      this.numbers.set(symbol, { value, text: undefined });
    }
  }

  /** Writes a step; its symbol is known from here on. The same step is not repeated. */
  write(draft: StepDraft): void {
    if (this.numbers.get(draft.symbol)?.value === draft.value) return;
    this.add(draft, this.substitute(draft.formula));
    this.know(draft.symbol, draft.value);
  }

  /** The same where the number comes from quadrature or root finding: no formula yields it. */
  writeNumeric(draft: StepDraft): void {
    this.add(draft, `${draft.value}`);
    this.know(draft.symbol, draft.value);
  }

  private add(
    { symbol, what, formula, value, unit, source }: StepDraft,
    substituted: string,
  ): void {
    const { side, beam } = this.subject;
    const { cite } = SOURCES[source];
    const step: Step = { symbol, what, formula, substituted, value, unit, source: cite, side };
    if (beam !== undefined) step.beam = beam;
    this.steps.push(step);
  }

  private substitute(formula: string): string {
    let substituted = '';
    for (const { text, isName } of piecesOf(formula)) {
      const known = isName ? this.numbers.get(text) : undefined;
      substituted += known === undefined ? text : printed(known);
    }
    return substituted;
  }
}

function printed(known: KnownNumber): string {
  known.text ??= known.value < 0 ? `(${known.value})` : `${known.value}`;
  return known.text;
}

interface FormulaPiece {
  readonly text: string;
  readonly isName: boolean;
}

const pieces = new Map<string, readonly FormulaPiece[]>();

/** The formula cut into names and what stands between them; there are few formulas. */
function piecesOf(formula: string): readonly FormulaPiece[] {
  let known = pieces.get(formula);
  if (known === undefined) {
    const texts = formula.match(/\d+\.?\d*(?:e[+-]?\d+)?|[A-Za-z]\w*|[^\dA-Za-z]+/g) ?? [];
    known = texts.map((text) => ({ text, isName: /^[A-Za-z]/.test(text) }));
    pieces.set(formula, known);
  }
  return known;
}
