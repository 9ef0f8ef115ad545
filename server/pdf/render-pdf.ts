import pdfmake from 'pdfmake';
import type { TDocumentDefinitions } from 'pdfmake/interfaces';

import { PDF_FONTS } from './pdf-fonts';

const OWN_FILES = new Set(Object.values(PDF_FONTS).flatMap((family) => Object.values(family)));

/** pdfmake keeps its settings in one object; these hold for every document of the server. */
pdfmake.setFonts(PDF_FONTS);
pdfmake.setUrlAccessPolicy(() => false);
pdfmake.setLocalAccessPolicy((path) => OWN_FILES.has(path));

/** Renders a document tree. Reads its own fonts and nothing else, neither files nor addresses. */
export async function renderPdf(document: TDocumentDefinitions): Promise<Buffer> {
  return pdfmake.createPdf(document).getBuffer();
}
