/** Plain infix mathematics as a tree, from which page and PDF are typeset. */
export type MathNode =
  | { readonly kind: 'number'; readonly text: string }
  | { readonly kind: 'symbol'; readonly base: string; readonly sub?: string | undefined }
  | { readonly kind: 'negative'; readonly of: MathNode }
  | {
      readonly kind: 'binary';
      readonly operator: '+' | '-' | '*' | '/' | '^' | '=';
      readonly left: MathNode;
      readonly right: MathNode;
    }
  | { readonly kind: 'call'; readonly name: string; readonly args: readonly MathNode[] }
  /** Parentheses as written; a typesetter leaves them out where its layout already groups. */
  | { readonly kind: 'group'; readonly of: MathNode };

type Operator = Extract<MathNode, { kind: 'binary' }>['operator'];

const TOKEN =
  /\s*(\d+(?:\.\d*)?(?:[eE][+-]?\d+)?|\.\d+(?:[eE][+-]?\d+)?|[\p{L}][\p{L}\d_]*|[-+*/^(),=])/uy;

const GREEK: Readonly<Record<string, string>> = {
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
  delta: 'δ',
  Delta: 'Δ',
  epsilon: 'ε',
  eta: 'η',
  theta: 'θ',
  lambda: 'λ',
  mu: 'μ',
  nu: 'ν',
  pi: 'π',
  rho: 'ρ',
  Sigma: 'Σ',
  sigma: 'σ',
  tau: 'τ',
  phi: 'φ',
  Phi: 'Φ',
  psi: 'ψ',
  omega: 'ω',
  Omega: 'Ω',
};

/**
 * Reads plain infix mathematics: `18*C_A*t^0.75`, `sqrt(d^2 + phi^2*r^2)`.
 * @returns the tree; undefined when the text is not of that form, so that it is shown as written
 */
export function parseInfix(text: string): MathNode | undefined {
  const tokens = tokensOf(text);
  if (!tokens) return undefined;
  const reader = new InfixReader(tokens);
  const node = reader.equation();
  return reader.isAtEnd ? node : undefined;
}

/** `alpha_max` as its printed parts: α with the index max; `C4` as C with the index 4. */
export function symbolParts(name: string): { base: string; sub?: string | undefined } {
  const [base = '', ...rest] = name.replace(/^([A-Za-z])(\d+)$/, '$1_$2').split('_');
  const sub = rest.map((part) => GREEK[part] ?? part).join(' ');
  return { base: GREEK[base] ?? base, sub: sub || undefined };
}

function tokensOf(text: string): string[] | undefined {
  const tokens: string[] = [];
  const source = text.trimEnd();
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < source.length) {
    const match = TOKEN.exec(source);
    if (!match?.[1]) return undefined;
    tokens.push(match[1]);
  }
  return tokens.length > 0 ? tokens : undefined;
}

/** Recursive descent; every method gives undefined where the text is not of the form. */
class InfixReader {
  private position = 0;

  constructor(private readonly tokens: readonly string[]) {}

  get isAtEnd(): boolean {
    return this.position === this.tokens.length;
  }

  equation(): MathNode | undefined {
    return this.chain(['='], () => this.sum());
  }

  private sum(): MathNode | undefined {
    return this.chain(['+', '-'], () => this.product());
  }

  private product(): MathNode | undefined {
    return this.chain(['*', '/'], () => this.signed());
  }

  private signed(): MathNode | undefined {
    if (!this.take('-')) return this.power();
    const of = this.signed();
    return of && { kind: 'negative', of };
  }

  /** `a^b^c` is `a^(b^c)`; an exponent may have a sign of its own. */
  private power(): MathNode | undefined {
    const left = this.atom();
    if (!left || !this.take('^')) return left;
    const right = this.signed();
    return right && { kind: 'binary', operator: '^', left, right };
  }

  private atom(): MathNode | undefined {
    const token = this.tokens[this.position];
    if (token === undefined) return undefined;
    this.position += 1;
    if (token === '(') return this.closed(this.sum());
    if (/^[\d.]/.test(token)) return { kind: 'number', text: token };
    if (!/^\p{L}/u.test(token)) return undefined;
    return this.take('(') ? this.call(token) : { kind: 'symbol', ...symbolParts(token) };
  }

  private closed(of: MathNode | undefined): MathNode | undefined {
    return of && this.take(')') ? { kind: 'group', of } : undefined;
  }

  private call(name: string): MathNode | undefined {
    const args: MathNode[] = [];
    do {
      const argument = this.sum();
      if (!argument) return undefined;
      args.push(argument);
    } while (this.take(','));
    return this.take(')') ? { kind: 'call', name, args } : undefined;
  }

  private chain(
    operators: readonly Operator[],
    operand: () => MathNode | undefined,
  ): MathNode | undefined {
    let left = operand();
    while (left) {
      const operator = operators.find((candidate) => this.take(candidate));
      if (!operator) return left;
      const right = operand();
      left = right && { kind: 'binary', operator, left, right };
    }
    return undefined;
  }

  private take(token: string): boolean {
    if (this.tokens[this.position] !== token) return false;
    this.position += 1;
    return true;
  }
}
