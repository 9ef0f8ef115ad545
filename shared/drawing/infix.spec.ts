import { describe, expect, it } from 'vitest';

import { type MathNode, parseInfix } from './infix';

/** The tree in brackets, so that a test reads as the mathematics. */
function bracketed(node: MathNode | undefined): string {
  if (!node) return 'not mathematics';
  switch (node.kind) {
    case 'number':
      return node.text;
    case 'symbol':
      return node.sub ? `${node.base}[${node.sub}]` : node.base;
    case 'negative':
      return `-${bracketed(node.of)}`;
    case 'binary':
      return `{${bracketed(node.left)}${node.operator}${bracketed(node.right)}}`;
    case 'call':
      return `${node.name}(${node.args.map(bracketed).join(';')})`;
    case 'group':
      return `(${bracketed(node.of)})`;
  }
}

const READ: readonly (readonly [text: string, tree: string])[] = [
  ['18*C_A*t^0.75', '{{18*C[A]}*{t^0.75}}'],
  ['18*1*0.25^0.75', '{{18*1}*{0.25^0.75}}'],
  ['0.02*C7*C5', '{{0.02*C[7]}*C[5]}'],
  ['a - b - c', '{{a-b}-c}'],
  ['a/b/c', '{{a/b}/c}'],
  ['a^b^c', '{a^{b^c}}'],
  ['10^-0.25', '{10^-0.25}'],
  ['-a^2', '-{a^2}'],
  ['2*-3', '{2*-3}'],
  ['5e-7*t', '{5e-7*t}'],
  ['5e-7', '5e-7'],
  ['sqrt(d^2 + phi^2*r^2)', 'sqrt({{d^2}+{{φ^2}*{r^2}}})'],
  ['min(alpha_max, max(alpha, 1.5))', 'min(α[max];max(α;1.5))'],
  ['(a + b)*c', '{({a+b})*c}'],
  ['E_r = 4*Phi/pi', '{E[r]={{4*Φ}/π}}'],
];

describe('infix mathematics', () => {
  it.each(READ)('reads %s as %s', (text, tree) => {
    expect(bracketed(parseInfix(text))).toBe(tree);
  });

  it.each(['', 'a +', '(a', 'a)', 'a b', '2a', 'f(', 'f()', '1 % 2', 'λ₀ ~ 3'])(
    'leaves %j to be shown as written',
    (text) => {
      expect(parseInfix(text)).toBeUndefined();
    },
  );
});
