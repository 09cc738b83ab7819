/**
 * Papers as one PDF to take away: each page is its picture, with the words that were read laid invisibly over
 * it, so that a search in any PDF reader finds them (text rendering mode 3 of ISO 32000-1, 9.3.6).
 */
import {
  beginText,
  endText,
  PDFDocument,
  type PDFPage,
  setCharacterSqueeze,
  setFontAndSize,
  setTextMatrix,
  setTextRenderingMode,
  showText,
  TextRenderingMode,
} from 'pdf-lib';
import type { Word } from '../contract/readings.ts';
import { fitText } from './fit-text.ts';
import { inks } from './inks.ts';
import { type PaperName, paperSizes } from './paper-sizes.ts';
import { embedTypefaces, type Typeface, type Weight } from './typeface.ts';

export interface CopiedPage {
  /** JPEG of the upright page. */
  picture: Uint8Array;
  lines: readonly { words: readonly Word[] }[];
}

export interface CopiedPaper {
  /** One line for the index, such as "No. 12 · Will · Quill & Sedge, 26 March 2015". */
  name: string;
  pages: readonly CopiedPage[];
}

const margin = 42;
const lineHeight = 15;

/** With more than one paper an index with page numbers comes first. */
export async function printSearchableCopy(copy: {
  title: string;
  paper: PaperName;
  papers: readonly CopiedPaper[];
}): Promise<Uint8Array> {
  const document = await PDFDocument.create({ updateMetadata: false });
  document.setTitle(copy.title, { showInWindowTitleBar: true });
  document.setLanguage('en');
  document.setCreator('Slackwater');
  document.setProducer('Slackwater');
  const faces = await embedTypefaces(document);
  const { width, height } = paperSizes[copy.paper];
  const perSheet = Math.floor((height - 2 * margin - 40) / lineHeight);
  const indexSheets = copy.papers.length > 1 ? Math.ceil(copy.papers.length / perSheet) : 0;
  let firstPage = indexSheets + 1;
  const entries = copy.papers.map(({ name, pages }) => {
    const entry = { name, page: firstPage };
    firstPage += pages.length;
    return entry;
  });
  for (let sheet = 0; sheet < indexSheets; sheet += 1) {
    const page = document.addPage([width, height]);
    const shown = entries.slice(sheet * perSheet, (sheet + 1) * perSheet);
    writeIndex(page, sheet === 0 ? copy.title : '', shown, faces);
  }
  for (const { pages } of copy.papers) {
    for (const page of pages) await addPicturePage(document, page, copy.paper, faces.regular);
  }
  return document.save();
}

function writeIndex(
  page: PDFPage,
  title: string,
  entries: readonly { name: string; page: number }[],
  faces: Record<Weight, Typeface>,
): void {
  const { width, height } = page.getSize();
  let y = height - margin - 12;
  if (title) {
    const words = fitText(faces.strong, title, 15, width - 2 * margin);
    page.drawText(words, { x: margin, y, size: 15, font: faces.strong.font, color: inks.slate });
  }
  y -= 28;
  for (const entry of entries) {
    const size = 9.5;
    const font = faces.regular.font;
    const words = fitText(faces.regular, entry.name, size, width - 2 * margin - 40);
    const number = String(entry.page);
    page.drawText(words, { x: margin, y, size, font, color: inks.slate });
    const x = width - margin - faces.regular.measure(number, size);
    page.drawText(number, { x, y, size, font, color: inks.quiet });
    y -= lineHeight;
  }
}

async function addPicturePage(
  document: PDFDocument,
  { picture, lines }: CopiedPage,
  paper: PaperName,
  face: Typeface,
): Promise<void> {
  const image = await document.embedJpg(picture);
  const sheet = paperSizes[paper];
  const isWide = image.width > image.height;
  const room = isWide ? { width: sheet.height, height: sheet.width } : sheet;
  const scale = Math.min(room.width / image.width, room.height / image.height);
  const size = { width: image.width * scale, height: image.height * scale };
  const page = document.addPage([size.width, size.height]);
  page.drawImage(image, { x: 0, y: 0, ...size });
  const fontKey = page.node.newFontDictionary(face.font.name, face.font.ref);
  page.pushOperators(beginText(), setTextRenderingMode(TextRenderingMode.Invisible));
  for (const { text, box } of lines.flatMap(({ words }) => words)) {
    const clean = face.clean(text);
    const height = box.h * size.height;
    if (clean === '' || height <= 0 || box.w <= 0) continue;
    const natural = face.measure(clean, height);
    // A trailing space keeps words apart in readers that join by position.
    page.pushOperators(
      setFontAndSize(fontKey, height),
      setCharacterSqueeze(natural > 0 ? (100 * box.w * size.width) / natural : 100),
      setTextMatrix(1, 0, 0, 1, box.x * size.width, (1 - box.y - box.h) * size.height),
      showText(face.font.encodeText(`${clean} `)),
    );
  }
  page.pushOperators(endText());
}
