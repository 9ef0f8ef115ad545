import { type MathNode, parseInfix, symbolParts } from '@shared/drawing/infix';
import {
  fencedBox,
  fractionBox,
  type MathBox,
  raisedBox,
  rootBox,
  rowBox,
  textBox,
} from './math-box';

type Binary = Extract<MathNode, { kind: 'binary' }>;
type Call = Extract<MathNode, { kind: 'call' }>;

/** Where a piece stands: indices and exponents are smaller and keep fractions on one line. */
interface Style {
  readonly size: number;
  readonly inline: boolean;
}

export interface TypesetFormula {
  readonly svg: string;
  readonly width: number;
  readonly height: number;
}

/** Below this share of its size a formula is not readable on paper. */
const SMALLEST = 0.72;

/**
 * Typesets plain infix mathematics as vectors.
 * @param size of the letters, pt
 * @param maxWidth of the column, pt; a wider formula is set smaller
 * @returns undefined when the text is not mathematics or cannot be made to fit: it is then printed as written
 */
export function formulaSvg(
  text: string,
  size: number,
  maxWidth: number,
): TypesetFormula | undefined {
  const tree = parseInfix(text);
  if (!tree) return undefined;
  const box = layout(tree, { size, inline: false });
  const scale = Math.min(1, maxWidth / box.width);
  if (scale < SMALLEST) return undefined;
  const height = box.ascent + box.descent + 0.3 * size;
  const svg =
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${box.width.toFixed(2)} ${height.toFixed(2)}" fill="#1c211d">` +
    `${box.draw(0, box.ascent + 0.15 * size)}</svg>`;
  return { svg, width: box.width * scale, height: height * scale };
}

function layout(node: MathNode, style: Style): MathBox {
  switch (node.kind) {
    case 'number':
      return numberBox(node.text, style);
    case 'symbol':
      return symbolBox(node.base, node.sub, style);
    case 'negative':
      return rowBox([textBox('−', style.size), layout(node.of, style)]);
    case 'group':
      return fencedBox(layout(node.of, style), style.size, 'round');
    case 'call':
      return callBox(node, style);
    case 'binary':
      return binaryBox(node, style);
  }
}

/** `5e-7` is printed 5 × 10⁻⁷. */
function numberBox(text: string, style: Style): MathBox {
  const [mantissa = '', exponent] = shortNumber(text).split('e');
  const digits = textBox(mantissa, style.size);
  if (exponent === undefined) return digits;
  const power = powerBox(
    textBox('10', style.size),
    textBox(exponent.replace('-', '−').replace('+', ''), 0.7 * style.size),
    style.size,
  );
  if (mantissa === '1') return power;
  return rowBox([digits, textBox('×', style.size), power], 0.14 * style.size);
}

/** At most ten significant digits: what a person can retype. */
export function shortNumber(text: string): string {
  const value = Number(text);
  if (text.replace(/e.*$/i, '').replace(/\D/g, '').length <= 10) return text.toLowerCase();
  return String(Number(value.toPrecision(10)));
}

function symbolBox(base: string, sub: string | undefined, style: Style): MathBox {
  const letter = textBox(base, style.size, [...base].length === 1 ? 'italic' : 'upright');
  if (!sub) return letter;
  return rowBox([letter, raisedBox(textBox(sub, 0.7 * style.size), -0.2 * style.size)]);
}

function powerBox(base: MathBox, exponent: MathBox, size: number): MathBox {
  const lift = Math.max(0.36 * size, base.ascent - 0.6 * exponent.ascent);
  return rowBox([base, raisedBox(exponent, lift)]);
}

function binaryBox(node: Binary, style: Style): MathBox {
  const { size } = style;
  if (node.operator === '/' && !style.inline) {
    const inner = { size: 0.92 * size, inline: false };
    return fractionBox(layout(bare(node.left), inner), layout(bare(node.right), inner), size);
  }
  if (node.operator === '^') {
    const exponent = layout(bare(node.right), { size: 0.7 * size, inline: true });
    return powerBox(baseBox(node.left, style), exponent, size);
  }
  const signs = { '*': '·', '/': '/', '+': '+', '-': '−', '=': '=' };
  const gap = (node.operator === '*' || node.operator === '/' ? 0.12 : 0.24) * size;
  return rowBox(
    [layout(node.left, style), textBox(signs[node.operator], size), layout(node.right, style)],
    gap,
  );
}

/** A base that is itself a power of ten needs its parentheses. */
function baseBox(node: MathNode, style: Style): MathBox {
  const box = layout(node, style);
  const isScientific = node.kind === 'number' && shortNumber(node.text).includes('e');
  return isScientific ? fencedBox(box, style.size, 'round') : box;
}

const KNOWN_FUNCTION = /^(exp|log|log10|min|max)$/;
const FUNCTION_NAMES: Readonly<Record<string, string>> = { log: 'ln', log10: 'log' };

function callBox(node: Call, style: Style): MathBox {
  const { size } = style;
  if (node.name === 'sqrt' && node.args.length === 1) {
    return rootBox(layout(bare(node.args[0] as MathNode), style), size);
  }
  const args = rowBox(
    node.args.flatMap((argument, index) => {
      const box = layout(argument, style);
      return index === 0 ? [box] : [textBox(',', size), box];
    }),
    0.1 * size,
  );
  if (node.name === 'ceil') return fencedBox(args, size, 'ceiling');
  return rowBox([callNameBox(node.name, style), fencedBox(args, size, 'round')], 0.06 * size);
}

function callNameBox(name: string, style: Style): MathBox {
  if (!KNOWN_FUNCTION.test(name)) {
    const { base, sub } = symbolParts(name);
    return symbolBox(base, sub, style);
  }
  const word = textBox(FUNCTION_NAMES[name] ?? name, style.size);
  if (name !== 'log10') return word;
  return rowBox([word, raisedBox(textBox('10', 0.7 * style.size), -0.2 * style.size)]);
}

/** Without the parentheses that bar, root or exponent make needless. */
function bare(node: MathNode): MathNode {
  return node.kind === 'group' ? bare(node.of) : node;
}
