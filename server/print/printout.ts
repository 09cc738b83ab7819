/**
 * A document of sheets with one margin, one footer and page numbers. Measures are points from the upper left
 * corner, as a designer counts them; the PDF counts from the lower left.
 */
import { PDFDocument } from 'pdf-lib';
import type { PDFImage, PDFPage } from 'pdf-lib';
import { fitText } from './fit-text.ts';
import type { Ink } from './inks.ts';
import { inks } from './inks.ts';
import type { PaperName } from './paper-sizes.ts';
import { paperSizes } from './paper-sizes.ts';
import type { Typeface, Weight } from './typeface.ts';
import { embedTypefaces, missingSign } from './typeface.ts';

export interface TextStyle {
  size: number;
  weight?: Weight;
  ink?: Ink;
  /** Where `x` is: the left edge (usual), the middle or the right edge of the text. */
  align?: 'left' | 'middle' | 'right';
}

export interface Footer {
  left: string;
  /** Between the left words and the page number; may be empty. */
  middle?: string;
}

const margins = { side: 42, top: 40, bottom: 56 };

export class Printout {
  readonly width: number;
  readonly height: number;
  readonly left = margins.side;
  readonly top = margins.top;
  /** Right edge of what may be printed on. */
  readonly right: number;
  /** Lower edge above the footer. */
  readonly bottom: number;
  readonly #document: PDFDocument;
  readonly #faces: Record<Weight, Typeface>;
  readonly #footer: Footer | null;
  #page: PDFPage;
  readonly #pagesWithMissing = new Set<PDFPage>();

  private constructor(
    document: PDFDocument,
    faces: Record<Weight, Typeface>,
    size: { width: number; height: number },
    footer: Footer | null,
  ) {
    this.#document = document;
    this.#faces = faces;
    this.#footer = footer;
    this.width = size.width;
    this.height = size.height;
    this.right = size.width - margins.side;
    this.bottom = size.height - margins.bottom;
    this.#page = document.addPage([size.width, size.height]);
  }

  /** Begins a document with its first sheet. */
  static async begin(options: {
    paper: PaperName;
    title: string;
    footer?: Footer;
  }): Promise<Printout> {
    // Without the library's own dates the same list gives the same bytes.
    const document = await PDFDocument.create({ updateMetadata: false });
    document.setTitle(options.title, { showInWindowTitleBar: true });
    document.setLanguage('en');
    document.setCreator('Slackwater');
    document.setProducer('Slackwater');
    const faces = await embedTypefaces(document);
    return new Printout(document, faces, paperSizes[options.paper], options.footer ?? null);
  }

  get innerWidth(): number {
    return this.right - this.left;
  }

  get pageCount(): number {
    return this.#document.getPageCount();
  }

  face(weight: Weight = 'regular'): Typeface {
    return this.#faces[weight];
  }

  addPage(): void {
    this.#page = this.#document.addPage([this.width, this.height]);
  }

  /** Writes one line with its base line at `y`; with `width` it is cut with an ellipsis. */
  write(text: string, x: number, y: number, style: TextStyle, width?: number): void {
    const face = this.face(style.weight);
    const words = width === undefined ? face.clean(text) : fitText(face, text, style.size, width);
    if (words === '') return;
    if (words.includes(missingSign)) this.#pagesWithMissing.add(this.#page);
    const align = style.align ?? 'left';
    const length = align === 'left' ? 0 : face.measure(words, style.size);
    this.#page.drawText(words, {
      x: x - (align === 'middle' ? length / 2 : length),
      y: this.height - y,
      size: style.size,
      font: face.font,
      color: inks[style.ink ?? 'slate'],
    });
  }

  /** Writes lines below each other, the first with its base line at `y`; gives the base line after the last. */
  writeLines(
    lines: readonly string[],
    x: number,
    y: number,
    style: TextStyle,
    lineHeight: number,
  ): number {
    lines.forEach((line, index) => this.write(line, x, y + index * lineHeight, style));
    return y + lines.length * lineHeight;
  }

  rule(x1: number, y: number, x2: number, options: { ink?: Ink; thickness?: number } = {}): void {
    this.line({ x: x1, y }, { x: x2, y }, options);
  }

  line(
    from: { x: number; y: number },
    to: { x: number; y: number },
    options: { ink?: Ink; thickness?: number; dashes?: number[] } = {},
  ): void {
    this.#page.drawLine({
      start: { x: from.x, y: this.height - from.y },
      end: { x: to.x, y: this.height - to.y },
      thickness: options.thickness ?? 0.5,
      color: inks[options.ink ?? 'hairline'],
      ...(options.dashes ? { dashArray: options.dashes } : {}),
    });
  }

  /** A rectangle from its upper left corner, filled, outlined, or both. */
  box(
    x: number,
    y: number,
    width: number,
    height: number,
    options: { fill?: Ink; border?: Ink; thickness?: number },
  ): void {
    this.#page.drawRectangle({
      x,
      y: this.height - y - height,
      width,
      height,
      ...(options.fill ? { color: inks[options.fill] } : {}),
      ...(options.border
        ? { borderColor: inks[options.border], borderWidth: options.thickness ?? 0.75 }
        : {}),
    });
  }

  /** A shape of horizontal and vertical edges, as an SVG path in points from `x`, `y`. */
  shape(path: string, x: number, y: number, ink: Ink = 'slate'): void {
    this.#page.drawSvgPath(path, { x, y: this.height - y, color: inks[ink], borderWidth: 0 });
  }

  /** A picture fitted into a frame from its upper left corner. */
  picture(image: PDFImage, x: number, y: number, width: number, height: number): void {
    const scale = Math.min(width / image.width, height / image.height);
    const size = { width: image.width * scale, height: image.height * scale };
    this.#page.drawImage(image, { x, y: this.height - y - size.height, ...size });
    this.box(x, y, size.width, size.height, { border: 'hairline', thickness: 0.5 });
  }

  /** A JPEG made ready for `picture`; null when the bytes are not one. */
  async findImage(bytes: Uint8Array): Promise<PDFImage | null> {
    try {
      return await this.#document.embedJpg(bytes);
    } catch {
      // A list without one picture is still a list; a list that cannot be printed is not.
      return null;
    }
  }

  /** Puts the footers on and gives the file. */
  async finish(): Promise<Uint8Array> {
    const pages = this.#document.getPages();
    if (this.#footer) {
      const footer = this.#footer;
      pages.forEach((page, index) => {
        this.#page = page;
        this.#writeFooter(footer, `Page ${index + 1} of ${pages.length}`);
      });
    }
    return this.#document.save();
  }

  #writeFooter(footer: Footer, pageWords: string): void {
    const y = this.height - margins.bottom + 26;
    this.rule(this.left, y - 12, this.right);
    const style: TextStyle = { size: 7.5, ink: 'quiet' };
    const pageWidth = this.face().measure(pageWords, style.size);
    this.write(footer.left, this.left, y, style, this.innerWidth - pageWidth - 24);
    this.write(pageWords, this.right, y, { ...style, align: 'right' });
    const second = [
      footer.middle ?? '',
      this.#pagesWithMissing.has(this.#page)
        ? `${missingSign} stands for a character that this page cannot print.`
        : '',
    ];
    this.write(second.filter(Boolean).join('  '), this.left, y + 10, style, this.innerWidth);
  }
}
