import { readFileSync } from 'node:fs';

/** Advance widths of a TrueType font, in shares of the font size. */
export interface FontMetrics {
  width(text: string): number;
}

/** Reads the advance widths of a TrueType file (tables head, hhea, hmtx and cmap format 4). */
export function readFontMetrics(file: string): FontMetrics {
  const bytes = readFileSync(file);
  const unitsPerEm = bytes.readUInt16BE(tableAt(bytes, 'head') + 18);
  const longMetrics = bytes.readUInt16BE(tableAt(bytes, 'hhea') + 34);
  const hmtx = tableAt(bytes, 'hmtx');
  const glyphOf = glyphLookup(bytes);
  const advance = (codePoint: number) =>
    bytes.readUInt16BE(hmtx + 4 * Math.min(glyphOf(codePoint), longMetrics - 1)) / unitsPerEm;
  return {
    width: (text) =>
      [...text].reduce((sum, character) => sum + advance(character.codePointAt(0) ?? 0), 0),
  };
}

function tableAt(bytes: Buffer, tag: string): number {
  const tables = bytes.readUInt16BE(4);
  for (let entry = 12; entry < 12 + 16 * tables; entry += 16) {
    if (bytes.toString('latin1', entry, entry + 4) === tag) return bytes.readUInt32BE(entry + 8);
  }
  throw new Error(`The font has no table "${tag}".`);
}

/** Glyph of a code point by the font's segment table (cmap format 4); 0 where it has none. */
function glyphLookup(bytes: Buffer): (codePoint: number) => number {
  const segments = segmentTableAt(bytes);
  const doubled = bytes.readUInt16BE(segments + 6);
  const ends = segments + 14;
  const starts = ends + doubled + 2;
  const deltas = starts + doubled;
  const offsets = deltas + doubled;
  return (codePoint) => {
    for (let at = 0; at < doubled; at += 2) {
      if (codePoint > bytes.readUInt16BE(ends + at)) continue;
      const start = bytes.readUInt16BE(starts + at);
      if (codePoint < start) return 0;
      const delta = bytes.readUInt16BE(deltas + at);
      const offset = bytes.readUInt16BE(offsets + at);
      if (offset === 0) return (codePoint + delta) & 0xffff;
      const glyph = bytes.readUInt16BE(offsets + at + offset + 2 * (codePoint - start));
      return glyph === 0 ? 0 : (glyph + delta) & 0xffff;
    }
    return 0;
  };
}

function segmentTableAt(bytes: Buffer): number {
  const cmap = tableAt(bytes, 'cmap');
  const encodings = bytes.readUInt16BE(cmap + 2);
  for (let index = 0; index < encodings; index += 1) {
    const table = cmap + bytes.readUInt32BE(cmap + 4 + 8 * index + 4);
    if (bytes.readUInt16BE(table) === 4) return table;
  }
  throw new Error('The font has no character table of format 4.');
}
