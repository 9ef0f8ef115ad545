import { LASER_CLASSES } from '@shared/model/lasers';

import type { LaserSearch } from './laser-queries';

/** Class words that nobody would mean as anything else; "4" alone may be part of a model. */
const CLASS_WORDS = new Map(
  LASER_CLASSES.filter((word) => word.length > 1).map((word) => [word.toUpperCase(), word]),
);
const ALL_CLASSES = new Map(LASER_CLASSES.map((word) => [word.toUpperCase(), word]));
/** Said before what is meant; finds nothing by itself. */
const FILLERS: ReadonlySet<string> = new Set(['class', 'room', 'area', 'laser', 'nm']);

const NM_PER_UNIT: Readonly<Record<string, number>> = { nm: 1, um: 1000, µm: 1000, μm: 1000 };

/** Reads "532 nm 3B B-204": words in any order. */
export function readSearch(text: string): LaserSearch {
  const bands: { fromNm: number; toNm: number }[] = [];
  const wavelength = /(\d+(?:\.\d+)?)(?:\s*[-–]\s*(\d+(?:\.\d+)?))?\s*(nm|[uµμ]m)(?=\s|$)/gi;
  const rest = text.replace(wavelength, (_, from: string, to: string | undefined, unit: string) => {
    bands.push(bandOf(from, to, NM_PER_UNIT[unit.toLowerCase()] ?? 1));
    return ' ';
  });
  const classes: string[] = [];
  const words: string[] = [];
  const tokens = rest.split(/\s+/).filter(Boolean);
  tokens.forEach((token, index) => {
    const afterClass = tokens[index - 1]?.toLowerCase() === 'class';
    const found = (afterClass ? ALL_CLASSES : CLASS_WORDS).get(token.toUpperCase());
    if (found) classes.push(found);
    else if (!FILLERS.has(token.toLowerCase())) words.push(token);
  });
  return { bands, classes, words };
}

/** "532" means 531.5 up to 532.5; "632.8" means 632.75 up to 632.85. */
function bandOf(
  from: string,
  to: string | undefined,
  scale: number,
): { fromNm: number; toNm: number } {
  const halfStep = (digits: string) => 0.5 * 10 ** -(digits.split('.')[1]?.length ?? 0);
  const last = to ?? from;
  return {
    fromNm: (Number(from) - halfStep(from)) * scale,
    toNm: (Number(last) + halfStep(last)) * scale,
  };
}
