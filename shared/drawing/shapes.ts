/** A color by its role, so that screen, print and one-ink paper each bring their own. */
export type ColorRole =
  'ink' | 'ink2' | 'ink3' | 'hair' | 'rule' | 'sheet' | 'spruce' | 'eye' | 'skin' | 'aid' | 'stop';

/** A role, or a wavelength's own color as #rrggbb. */
export type Color = ColorRole | `#${string}`;

export type Palette = Readonly<Record<ColorRole, string>>;

interface Stroke {
  readonly stroke?: Color;
  readonly strokeWidth?: number;
  readonly dash?: readonly number[];
  readonly roundCap?: boolean;
  readonly opacity?: number;
}

export interface RectShape extends Stroke {
  readonly kind: 'rect';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly fill?: Color;
}

export interface PathShape extends Stroke {
  readonly kind: 'path';
  readonly d: string;
  readonly fill?: Color;
}

export interface CircleShape extends Stroke {
  readonly kind: 'circle';
  readonly x: number;
  readonly y: number;
  readonly radius: number;
  readonly fill?: Color;
}

export interface TextPart {
  readonly text: string;
  readonly fill: Color;
  readonly bold?: boolean;
}

export interface TextShape {
  readonly kind: 'text';
  readonly x: number;
  readonly y: number;
  readonly size: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly parts: readonly TextPart[];
  /** Width of an outline in the ground's color that keeps words readable over lines. */
  readonly halo?: number;
}

export type Shape = RectShape | PathShape | CircleShape | TextShape;

export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly Shape[];
}

/** Two decimals are finer than any screen or printer shows. */
export function coordinate(value: number): number {
  return Math.round(value * 100) / 100;
}

export function linePath(x1: number, y1: number, x2: number, y2: number): string {
  return `M${coordinate(x1)} ${coordinate(y1)}L${coordinate(x2)} ${coordinate(y2)}`;
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/**
 * Lines at 45 degrees that fill a box, cut at its edges: no pattern element is needed, so screen
 * and PDF draw the same. Neighboring boxes continue each other's lines.
 */
export function hatchPath(box: Box, period: number, rising = true): string {
  const step = period * Math.SQRT2;
  const bottom = box.y + box.height;
  const right = box.x + box.width;
  // Rising lines keep x + y, falling lines keep x - y.
  const first = rising ? box.x + box.y : box.x - bottom;
  const last = rising ? right + bottom : right - box.y;
  let path = '';
  for (let c = Math.ceil(first / step) * step; c < last; c += step) {
    const from = Math.max(box.x, rising ? c - bottom : c + box.y);
    const to = Math.min(right, rising ? c - box.y : c + bottom);
    if (to - from > 0.05) {
      const y = (x: number) => (rising ? c - x : x - c);
      path += linePath(from, y(from), to, y(to));
    }
  }
  return path;
}

/** Width of a text in the product's sans, near enough to place it. */
export function textWidth(text: string, size: number): number {
  return [...text].length * size * 0.53;
}

/** A drawing as an SVG document with literal colors, for the PDF. */
export function svgOf(drawing: Drawing, palette: Palette, fontFamily: string): string {
  const { width, height, shapes } = drawing;
  const body = shapes.map((shape) => elementOf(shape, palette, fontFamily)).join('');
  const size = `width="${coordinate(width)}" height="${coordinate(height)}"`;
  const box = `viewBox="0 0 ${coordinate(width)} ${coordinate(height)}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" ${size} ${box}>${body}</svg>`;
}

function elementOf(shape: Shape, palette: Palette, fontFamily: string): string {
  switch (shape.kind) {
    case 'rect': {
      const { x, y, width, height } = shape;
      return `<rect ${attributes({ x, y, width, height })}${paint(shape, palette)}/>`;
    }
    case 'circle':
      return `<circle ${attributes({ cx: shape.x, cy: shape.y, r: shape.radius })}${paint(shape, palette)}/>`;
    case 'path':
      return `<path d="${shape.d}"${paint(shape, palette)}/>`;
    case 'text':
      return textElement(shape, palette, fontFamily);
  }
}

/** Without a halo: the PDF's SVG draws strokes over fills, which would thin the letters. */
function textElement(shape: TextShape, palette: Palette, fontFamily: string): string {
  const { x, y, size, anchor, parts } = shape;
  const spans = parts
    .map(({ text, fill, bold }) => {
      const weight = bold ? ' font-weight="bold"' : '';
      return `<tspan fill="${colorOf(fill, palette)}"${weight}>${escapeXml(text)}</tspan>`;
    })
    .join('');
  const font = `font-family="${escapeXml(fontFamily)}" font-size="${coordinate(size)}"`;
  return `<text ${attributes({ x, y })} ${font} text-anchor="${anchor}">${spans}</text>`;
}

function paint(shape: Exclude<Shape, TextShape>, palette: Palette): string {
  const fill = shape.fill ? colorOf(shape.fill, palette) : 'none';
  const stroke = shape.stroke
    ? ` stroke="${colorOf(shape.stroke, palette)}" stroke-width="${coordinate(shape.strokeWidth ?? 1)}"`
    : '';
  const dash = shape.dash ? ` stroke-dasharray="${shape.dash.map(coordinate).join(' ')}"` : '';
  const cap = shape.roundCap ? ' stroke-linecap="round"' : '';
  const opacity = shape.opacity === undefined ? '' : ` opacity="${shape.opacity}"`;
  return ` fill="${fill}"${stroke}${dash}${cap}${opacity}`;
}

function colorOf(color: Color, palette: Palette): string {
  return color.startsWith('#') ? color : palette[color as ColorRole];
}

function attributes(values: Readonly<Record<string, number>>): string {
  return Object.entries(values)
    .map(([name, value]) => `${name}="${coordinate(value)}"`)
    .join(' ');
}

function escapeXml(text: string): string {
  return text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;');
}
