import { formatWavelength, UNIT_SPACE } from '../model/quantity-format';
import { type Drawing, hatchPath, type Shape } from './shapes';

/** One wavelength, or a tuning range with its upper end. */
export interface SwatchLine {
  readonly wavelengthNm: number;
  readonly wavelengthToNm?: number | undefined;
}

const VISIBLE_FROM_NM = 400;
const VISIBLE_TO_NM = 700;
const ULTRAVIOLET = '#7a3fc4';
const INFRARED = '#b3202a';

/** By the engine's bands: 400 nm up to but not including 700 nm. */
export function isVisible(wavelengthNm: number): boolean {
  return wavelengthNm >= VISIBLE_FROM_NM && wavelengthNm < VISIBLE_TO_NM;
}

/** The color of a wavelength from 380 to 780 nm, dulled to sit on paper without glowing. */
export function visibleColor(wavelengthNm: number): `#${string}` {
  const fading =
    wavelengthNm < 420
      ? 0.35 + (0.65 * (wavelengthNm - 380)) / 40
      : wavelengthNm > 700
        ? 0.35 + (0.65 * (780 - wavelengthNm)) / 80
        : 1;
  const channels = hue(wavelengthNm).map((value) => {
    const dulled = Math.round(26 + 188 * (Math.max(0, value) * Math.max(0, fading)) ** 0.85);
    return dulled.toString(16).padStart(2, '0');
  });
  return `#${channels.join('')}`;
}

function hue(nm: number): readonly [red: number, green: number, blue: number] {
  if (nm < 440) return [(440 - nm) / 60, 0, 1];
  if (nm < 490) return [0, (nm - 440) / 50, 1];
  if (nm < 510) return [0, 1, (510 - nm) / 20];
  if (nm < 580) return [(nm - 510) / 70, 1, 0];
  if (nm < 645) return [1, (645 - nm) / 65, 0];
  return [1, 0, 0];
}

/** The chip of one line: its color, or a hatch whose direction and edge tell the band. */
export function lineSwatch(line: SwatchLine, height: number, chipWidth?: number): Drawing {
  const { wavelengthNm, wavelengthToNm } = line;
  const isTunable = wavelengthToNm !== undefined && wavelengthToNm > wavelengthNm;
  const width = Math.round(chipWidth ?? 1.4 * height * (isTunable ? 1.7 : 1));
  const box = { x: 0, y: 0, width, height };
  const inside = isTunable
    ? [...rangeShapes(wavelengthNm, wavelengthToNm, box), ...doubleArrow(box)]
    : bandShapes(wavelengthNm, box);
  const frame: Shape = {
    kind: 'rect',
    x: 0.5,
    y: 0.5,
    width: width - 1,
    height: height - 1,
    stroke: 'ink2',
    strokeWidth: 1,
  };
  return { width, height, shapes: [{ kind: 'rect', ...box, fill: 'sheet' }, ...inside, frame] };
}

interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

function bandShapes(nm: number, box: Box, withEdge = true): Shape[] {
  if (isVisible(nm)) return [{ kind: 'rect', ...box, fill: visibleColor(nm) }];
  const isUltraviolet = nm < VISIBLE_FROM_NM;
  const scale = Math.min(1.6, Math.max(0.85, box.height / 16));
  const hatch: Shape = {
    kind: 'path',
    d: hatchPath(box, hatchPeriod(nm) * scale, isUltraviolet),
    stroke: 'ink2',
    strokeWidth: 1,
  };
  if (!withEdge) return [hatch];
  const edge = box.height < 16 ? 3 : 4;
  return [
    hatch,
    {
      kind: 'rect',
      x: isUltraviolet ? box.x + box.width - edge : box.x,
      y: box.y,
      width: edge,
      height: box.height,
      fill: isUltraviolet ? ULTRAVIOLET : INFRARED,
    },
  ];
}

function hatchPeriod(nm: number): number {
  if (nm < 280) return 3;
  if (nm < 315) return 4;
  if (nm < VISIBLE_FROM_NM) return 5;
  if (nm < 1400) return 3.6;
  return nm < 3000 ? 5 : 6.5;
}

/** The visible part of a range as its spectrum, the rest hatched, in proportion. */
function rangeShapes(fromNm: number, toNm: number, box: Box): Shape[] {
  const x = (nm: number) => box.x + (box.width * (nm - fromNm)) / (toNm - fromNm);
  const part = (from: number, to: number): Box => ({ ...box, x: x(from), width: x(to) - x(from) });
  const visibleFrom = Math.max(fromNm, VISIBLE_FROM_NM);
  const visibleTo = Math.min(toNm, VISIBLE_TO_NM);
  const shapes: Shape[] = [];
  if (fromNm < VISIBLE_FROM_NM) {
    shapes.push(...bandShapes(fromNm, part(fromNm, Math.min(toNm, VISIBLE_FROM_NM))));
  }
  if (visibleFrom < visibleTo) {
    const { x: left, width } = part(visibleFrom, visibleTo);
    const stripes = Math.max(1, Math.ceil(width));
    for (let index = 0; index < stripes; index++) {
      const nm = visibleFrom + ((visibleTo - visibleFrom) * (index + 0.5)) / stripes;
      const step = width / stripes;
      // Half a pixel of overlap, so that no seam shows.
      shapes.push({
        kind: 'rect',
        ...box,
        x: left + index * step,
        width: step + 0.5,
        fill: visibleColor(nm),
      });
    }
  }
  if (toNm > VISIBLE_TO_NM) {
    shapes.push(...bandShapes(toNm, part(Math.max(fromNm, VISIBLE_TO_NM), toNm)));
  }
  return shapes;
}

function doubleArrow({ width, height }: Box): Shape[] {
  const y = height / 2;
  const half = Math.min(width * 0.27, 9);
  const head = Math.min(3, height * 0.2);
  const [from, to] = [width / 2 - half, width / 2 + half];
  const d =
    `M${from} ${y}L${to} ${y}` +
    `M${from + head} ${y - head}L${from} ${y}L${from + head} ${y + head}` +
    `M${to - head} ${y - head}L${to} ${y}L${to - head} ${y + head}`;
  return [
    { kind: 'path', d, stroke: '#ffffff', strokeWidth: 3.4, roundCap: true },
    { kind: 'path', d, stroke: '#1c211d', strokeWidth: 1.4, roundCap: true },
  ];
}

/** The numbers beside the chips: "1064, 532 nm", "690–1040 nm", "457.9–514.5 nm" for a set. */
export function linesText(lines: readonly SwatchLine[], together = false): string {
  if (together && lines.length > 2) {
    const sorted = lines.map((line) => line.wavelengthNm).sort((a, b) => a - b);
    return rangeText(sorted[0] ?? 0, sorted.at(-1) ?? 0);
  }
  const shown = lines.length > 6 ? lines.slice(0, 3) : lines;
  const more = lines.length - shown.length;
  const texts = shown.map(({ wavelengthNm, wavelengthToNm }) =>
    wavelengthToNm === undefined
      ? wavelengthText(wavelengthNm)
      : rangeText(wavelengthNm, wavelengthToNm),
  );
  const units = texts.map((text) => text.split(UNIT_SPACE).at(-1));
  const sameUnit = units.every((unit) => unit === units[0]);
  const joined = sameUnit
    ? texts.map((text) => text.split(UNIT_SPACE)[0]).join(', ') + UNIT_SPACE + (units[0] ?? '')
    : texts.join(', ');
  return more > 0 ? `${joined} + ${more}` : joined;
}

function wavelengthText(nm: number): string {
  return formatWavelength(nm).text;
}

function rangeText(fromNm: number, toNm: number): string {
  const from = formatWavelength(fromNm);
  const to = formatWavelength(toNm);
  return from.unit === to.unit ? `${from.number}–${to.text}` : `${from.text}–${to.text}`;
}

/** A line in words: "532 nanometers, visible green". */
export function spokenLine({ wavelengthNm, wavelengthToNm }: SwatchLine): string {
  const number = (nm: number) => {
    const { number: value, unit } = formatWavelength(nm);
    return `${value} ${unit === 'nm' ? 'nanometers' : 'micrometers'}`;
  };
  if (wavelengthToNm === undefined) return `${number(wavelengthNm)}, ${bandWord(wavelengthNm)}`;
  const [low, high] = [bandWord(wavelengthNm), bandWord(wavelengthToNm)];
  const band = low === high ? low : `${low} to ${high}`;
  return `tunable from ${number(wavelengthNm)} to ${number(wavelengthToNm)}, ${band}`;
}

function bandWord(nm: number): string {
  if (nm < VISIBLE_FROM_NM) return 'ultraviolet';
  if (nm >= VISIBLE_TO_NM) return 'infrared';
  if (nm < 450) return 'visible violet';
  if (nm < 495) return 'visible blue';
  if (nm < 570) return 'visible green';
  if (nm < 590) return 'visible yellow';
  return nm < 620 ? 'visible orange' : 'visible red';
}
