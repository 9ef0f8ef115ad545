import { fontMetrics, PDF_FONTS } from './pdf-fonts';

/** A piece of typeset mathematics: its size around the baseline, and how it is drawn in SVG. */
export interface MathBox {
  readonly width: number;
  readonly ascent: number;
  readonly descent: number;
  draw(x: number, baseline: number): string;
}

export type MathFace = 'upright' | 'italic';

const FACE = {
  upright: { file: PDF_FONTS.Serif.normal, style: '' },
  italic: { file: PDF_FONTS.Serif.italics, style: ' font-style="italic"' },
} as const;

/** Heights of the serif in shares of its size: capitals and figures, descenders, the fraction bar. */
const ASCENT = 0.7;
const DESCENT = 0.22;
const AXIS = 0.26;

const xml = (text: string) =>
  text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;');
const px = (value: number) => value.toFixed(2);

export function textBox(text: string, size: number, face: MathFace = 'upright'): MathBox {
  const { file, style } = FACE[face];
  return {
    width: fontMetrics(file).width(text) * size,
    ascent: ASCENT * size,
    descent: DESCENT * size,
    draw: (x, y) =>
      `<text x="${px(x)}" y="${px(y)}" font-family="Serif" font-size="${px(size)}"${style}>${xml(text)}</text>`,
  };
}

/** Boxes on one baseline with `gap` between them. */
export function rowBox(boxes: readonly MathBox[], gap = 0): MathBox {
  const width = boxes.reduce((sum, box) => sum + box.width, 0) + gap * (boxes.length - 1);
  return {
    width,
    ascent: Math.max(...boxes.map((box) => box.ascent)),
    descent: Math.max(...boxes.map((box) => box.descent)),
    draw: (x, y) => {
      let at = x;
      return boxes
        .map((box) => {
          const drawn = box.draw(at, y);
          at += box.width + gap;
          return drawn;
        })
        .join('');
    },
  };
}

/** A box moved up (positive) or down from the baseline. */
export function raisedBox(box: MathBox, by: number): MathBox {
  return {
    width: box.width,
    ascent: Math.max(0, box.ascent + by),
    descent: Math.max(0, box.descent - by),
    draw: (x, y) => box.draw(x, y - by),
  };
}

export function fractionBox(over: MathBox, under: MathBox, size: number): MathBox {
  const width = Math.max(over.width, under.width) + 0.3 * size;
  const gap = 0.18 * size;
  const axis = AXIS * size;
  return {
    width: width + 0.16 * size,
    ascent: axis + gap + over.descent + over.ascent,
    descent: under.ascent + under.descent + gap - axis,
    draw: (left, y) => {
      const x = left + 0.08 * size;
      return (
        over.draw(x + (width - over.width) / 2, y - axis - gap - over.descent) +
        under.draw(x + (width - under.width) / 2, y - axis + gap + under.ascent) +
        bar(x, y - axis, width, 0.05 * size)
      );
    },
  };
}

export function rootBox(of: MathBox, size: number): MathBox {
  const gap = 0.14 * size;
  const sign = 0.55 * size;
  const ascent = of.ascent + gap;
  return {
    width: of.width + sign + 0.15 * size,
    ascent: ascent + 0.08 * size,
    descent: of.descent,
    draw: (x, y) => {
      const bottom = y + of.descent;
      const top = y - ascent;
      const hook = bottom - 0.45 * (bottom - top);
      const points = [
        [x + 0.05 * size, hook],
        [x + 0.17 * size, hook - 0.06 * size],
        [x + 0.33 * size, bottom],
        [x + 0.5 * size, top],
        [x + sign + of.width + 0.08 * size, top],
      ];
      const path = points.map(([px0 = 0, py0 = 0]) => `${px(px0)} ${px(py0)}`).join(' L ');
      return (
        `<path d="M ${path}" fill="none" stroke="#1c211d" stroke-width="${px(0.05 * size)}"/>` +
        of.draw(x + sign, y)
      );
    },
  };
}

/** Parentheses as tall as what they hold; `ceiling` draws the brackets of "rounded up". */
export function fencedBox(of: MathBox, size: number, fence: 'round' | 'ceiling'): MathBox {
  const ascent = Math.max(of.ascent, ASCENT * size) + 0.06 * size;
  const descent = Math.max(of.descent, DESCENT * size) + 0.02 * size;
  const side = (fence === 'round' ? 0.36 : 0.4) * size;
  const draw = fence === 'round' ? roundFence : ceilingFence;
  return {
    width: of.width + 2 * side,
    ascent,
    descent,
    draw: (x, y) =>
      draw(x + side - 0.12 * size, y - ascent, y + descent, -0.16 * size) +
      of.draw(x + side, y) +
      draw(x + side + of.width + 0.12 * size, y - ascent, y + descent, 0.16 * size),
  };
}

function roundFence(x: number, top: number, bottom: number, bulge: number): string {
  const control = px(x + 1.5 * bulge);
  const depth = 0.3 * (bottom - top);
  return `<path d="M ${px(x)} ${px(top)} C ${control} ${px(top + depth)} ${control} ${px(bottom - depth)} ${px(x)} ${px(bottom)}" fill="none" stroke="#1c211d" stroke-width="0.55"/>`;
}

function ceilingFence(x: number, top: number, bottom: number, reach: number): string {
  const stem = x + reach;
  return `<path d="M ${px(x)} ${px(top)} L ${px(stem)} ${px(top)} L ${px(stem)} ${px(bottom)}" fill="none" stroke="#1c211d" stroke-width="0.55"/>`;
}

function bar(x: number, y: number, length: number, width: number): string {
  return `<path d="M ${px(x)} ${px(y)} L ${px(x + length)} ${px(y)}" fill="none" stroke="#1c211d" stroke-width="${px(width)}"/>`;
}
