import { PRINT_PALETTE } from '@shared/drawing/palettes';
import { type Drawing, svgOf } from '@shared/drawing/shapes';
import type {
  Content,
  CustomTableLayout,
  TableCell,
  TDocumentDefinitions,
} from 'pdfmake/interfaces';

export const INK = '#1c211d';
export const INK2 = '#4c554d';
export const STOP = '#9b1c1c';
const HAIR = '#c6cec3';

/** Points of a millimeter. */
export const MM = 72 / 25.4;

export const PAGE_MARGIN = 40;

/** Faces and sizes of every document of the product. */
export const DOCUMENT_STYLE: Pick<TDocumentDefinitions, 'defaultStyle' | 'styles'> = {
  defaultStyle: { font: 'Sans', fontSize: 9, lineHeight: 1.12, color: INK },
  styles: {
    title: { font: 'Serif', fontSize: 20, lineHeight: 1.05 },
    section: { font: 'Serif', fontSize: 12.5 },
    part: { font: 'Serif', fontSize: 10.5 },
    quiet: { color: INK2 },
    small: { fontSize: 8, color: INK2 },
    head: { fontSize: 8, bold: true, color: INK2 },
    strong: { bold: true },
    hero: { font: 'Serif', fontSize: 24, lineHeight: 1 },
    figure: { font: 'Serif', fontSize: 15, lineHeight: 1 },
    statement: { font: 'Serif', italics: true },
    hash: { fontSize: 7.5, color: INK2 },
  },
};

/** A ledger: a rule under the head, hairlines between rows, nothing at the sides. */
export const LEDGER: CustomTableLayout = {
  hLineWidth: (line, node) => {
    const heads = node.table.headerRows ?? 0;
    if (line === 0) return 0;
    return line === heads ? 0.7 : 0.4;
  },
  hLineColor: (line, node) => (line === (node.table.headerRows ?? 0) ? INK2 : HAIR),
  vLineWidth: () => 0,
  paddingLeft: (column) => (column === 0 ? 0 : 4),
  paddingRight: (column, node) => (column === (node.table.widths?.length ?? 0) - 1 ? 0 : 4),
  paddingTop: () => 1.6,
  paddingBottom: () => 1.6,
};

/** A section's title with an ink line below. */
export function sectionHead(text: string, note = ''): Content {
  return {
    margin: [0, 8, 0, 2],
    headlineLevel: 1,
    table: {
      widths: ['*', 'auto'],
      body: [
        [
          { text, style: 'section' },
          { text: note, style: 'small', alignment: 'right', margin: [0, 4, 0, 0] },
        ],
      ],
    },
    layout: {
      hLineWidth: (line) => (line === 1 ? 0.8 : 0),
      hLineColor: () => INK,
      vLineWidth: () => 0,
      paddingLeft: () => 0,
      paddingRight: () => 0,
      paddingTop: () => 0,
      paddingBottom: () => 2,
    },
  };
}

/** A heading at the foot of a page goes with what it heads. */
export const keepHeadings: TDocumentDefinitions['pageBreakBefore'] = (node) =>
  node.headlineLevel === 1 && (node.startPosition?.verticalRatio ?? 0) > 0.88;

/** A drawing for the page: its dots are short strokes, since PDF has no dash of length 0. */
export function drawingSvg(drawing: Drawing): string {
  return svgOf(drawing, PRINT_PALETTE, 'Sans').replaceAll(
    'stroke-dasharray="0 ',
    'stroke-dasharray="0.02 ',
  );
}

export interface LedgerColumn {
  readonly head: string;
  readonly width: number | 'auto' | '*';
  readonly align?: 'right';
}

/** A table with a head that is repeated on each page. */
export function ledger(
  columns: readonly LedgerColumn[],
  rows: readonly (readonly TableCell[])[],
): Content {
  const head: TableCell[] = columns.map(({ head: text, align }) => ({
    text,
    style: 'head',
    alignment: align ?? 'left',
  }));
  return {
    table: {
      headerRows: 1,
      dontBreakRows: true,
      widths: columns.map(({ width }) => width),
      body: [head, ...rows.map((row) => [...row])],
    },
    layout: LEDGER,
  };
}

/** Names on the left, what they are on the right. */
export function pairs(rows: readonly (readonly [name: string, value: Content])[]): Content {
  return {
    table: {
      widths: [112, '*'],
      body: rows.map(([name, value]) => [{ text: name, style: 'quiet' }, value as TableCell]),
    },
    layout: LEDGER,
  };
}

/** Sentences with a dash before each. */
export function sentences(texts: readonly string[], fontSize = 8): Content {
  return {
    stack: texts.map((text) => ({
      columns: [
        { text: '–', width: 8 },
        { text, width: '*' },
      ],
      margin: [0, 0.8, 0, 0.8],
    })),
    fontSize,
  };
}
