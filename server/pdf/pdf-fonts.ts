import { join } from 'node:path';

import { PACKAGE_ROOT } from '../config/package-root';
import { type FontMetrics, readFontMetrics } from './font-metrics';

const file = (name: string) => join(PACKAGE_ROOT, 'server', 'pdf', 'fonts', `${name}.ttf`);

/** The faces of a document. Each family has its four styles, as pdfmake asks for them. */
export const PDF_FONTS = {
  Sans: {
    normal: file('SourceSans3-Regular'),
    bold: file('SourceSans3-SemiBold'),
    italics: file('SourceSans3-Italic'),
    bolditalics: file('SourceSans3-SemiBold'),
  },
  Serif: {
    normal: file('SourceSerif4-Medium'),
    bold: file('SourceSerif4-Medium'),
    italics: file('SourceSerif4-Italic'),
    bolditalics: file('SourceSerif4-Italic'),
  },
};

const metricsOf = new Map<string, FontMetrics>();

/** Widths of one of the faces, read once. */
export function fontMetrics(face: string): FontMetrics {
  const known = metricsOf.get(face) ?? readFontMetrics(face);
  metricsOf.set(face, known);
  return known;
}
