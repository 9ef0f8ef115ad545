import { Dec, ONE, ZERO, dec, maxOf, minOf } from './decimal';

/** Gives the value of a name that occurs in an expression. */
export type Scope = (name: string) => Dec;

export type Expression = (scope: Scope) => Dec;

const TOKEN = /\s*(\d+\.?\d*(?:[eE][-+]?\d+)?|[A-Za-z_]\w*|\*\*|<=|>=|[-+*/()<>,])/y;

/**
 * Compiles one limit expression of the tables: numbers, names, + - * / **, comparisons, `or`,
 * `a if condition else b`, `min(…)` and `max(…)`.
 */
export function compileExpression(text: string): Expression {
  const parser = new Parser(tokenize(text), text);
  const expression = parser.conditional();
  parser.expectEnd();
  return expression;
}

function tokenize(text: string): string[] {
  const tokens: string[] = [];
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < text.trimEnd().length) {
    const match = TOKEN.exec(text);
    if (!match) throw new Error(`cannot read the expression ${text}`);
    tokens.push(match[1]!);
  }
  return tokens;
}

const truth = (value: boolean): Dec => (value ? ONE : ZERO);

const COMPARISONS: Record<string, (a: Dec, b: Dec) => boolean> = {
  '<=': (a, b) => a.lte(b),
  '>=': (a, b) => a.gte(b),
  '<': (a, b) => a.lt(b),
  '>': (a, b) => a.gt(b),
};

class Parser {
  private at = 0;

  constructor(
    private readonly tokens: readonly string[],
    private readonly text: string,
  ) {}

  expectEnd(): void {
    if (this.at < this.tokens.length) throw new Error(`trailing text in ${this.text}`);
  }

  conditional(): Expression {
    const yes = this.disjunction();
    if (!this.take('if')) return yes;
    const condition = this.disjunction();
    this.expect('else');
    const no = this.conditional();
    return (scope) => (condition(scope).isZero() ? no(scope) : yes(scope));
  }

  private disjunction(): Expression {
    let left = this.comparison();
    while (this.take('or')) {
      const a = left;
      const b = this.comparison();
      left = (scope) => (a(scope).isZero() ? b(scope) : ONE);
    }
    return left;
  }

  private comparison(): Expression {
    const left = this.sum();
    const compare = COMPARISONS[this.tokens[this.at] ?? ''];
    if (!compare) return left;
    this.at++;
    const right = this.sum();
    return (scope) => truth(compare(left(scope), right(scope)));
  }

  private sum(): Expression {
    let left = this.product();
    for (;;) {
      const a = left;
      if (this.take('+')) {
        const b = this.product();
        left = (scope) => a(scope).add(b(scope));
      } else if (this.take('-')) {
        const b = this.product();
        left = (scope) => a(scope).sub(b(scope));
      } else return left;
    }
  }

  private product(): Expression {
    let left = this.unary();
    for (;;) {
      const a = left;
      if (this.take('*')) {
        const b = this.unary();
        left = (scope) => a(scope).mul(b(scope));
      } else if (this.take('/')) {
        const b = this.unary();
        left = (scope) => a(scope).div(b(scope));
      } else return left;
    }
  }

  private unary(): Expression {
    if (this.take('-')) {
      const inner = this.unary();
      return (scope) => inner(scope).neg();
    }
    const base = this.atom();
    if (!this.take('**')) return base;
    const exponent = this.unary();
    return (scope) => base(scope).pow(exponent(scope));
  }

  private atom(): Expression {
    const token = this.tokens[this.at++];
    if (token === undefined) throw new Error(`${this.text} ends too early`);
    if (token === '(') {
      const inner = this.conditional();
      this.expect(')');
      return inner;
    }
    if (/^\d/.test(token)) {
      const value = dec(token);
      return () => value;
    }
    if (this.take('(')) return this.call(token);
    return (scope) => scope(token);
  }

  private call(name: string): Expression {
    const args: Expression[] = [this.conditional()];
    while (this.take(',')) args.push(this.conditional());
    this.expect(')');
    if (name !== 'min' && name !== 'max') throw new Error(`unknown function ${name}`);
    const pick = name === 'min' ? minOf : maxOf;
    return (scope) => pick(args.map((arg) => arg(scope)));
  }

  private take(token: string): boolean {
    if (this.tokens[this.at] !== token) return false;
    this.at++;
    return true;
  }

  private expect(token: string): void {
    if (!this.take(token)) throw new Error(`expected ${token} in ${this.text}`);
  }
}
