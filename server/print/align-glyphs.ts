/**
 * Makes the outlines of a TrueType font start at even places.
 *
 * A subset of a font is written with the short form of the `loca` table where it can be, and that form counts
 * in pairs of bytes (OpenType specification, `loca`). The subsetter does not pad outlines of odd length, so
 * with a font that has some, every letter after the first of them is drawn from the wrong place or not at all.
 * Padded beforehand, no outline is odd any more.
 */

interface Table {
  /** Where the table's entry stands in the directory. */
  entryAt: number;
  offset: number;
  length: number;
}

/** A copy of the font file with padded outlines; a font that needs none comes back as it is. */
export function alignGlyphs(file: Uint8Array): Uint8Array {
  const view = new DataView(file.buffer, file.byteOffset, file.byteLength);
  const head = findTable(view, 'head');
  const loca = findTable(view, 'loca');
  const glyf = findTable(view, 'glyf');
  // Only the long form (1) can point at odd places.
  if (!head || !loca || !glyf || view.getInt16(head.offset + 50) !== 1) return file;

  const starts: number[] = [];
  for (let at = 0; at < loca.length; at += 4) starts.push(view.getUint32(loca.offset + at));
  const padded = starts.map(() => 0);
  for (let glyph = 1; glyph < starts.length; glyph += 1) {
    const length = (starts[glyph] ?? 0) - (starts[glyph - 1] ?? 0);
    padded[glyph] = (padded[glyph - 1] ?? 0) + roundUp(length);
  }
  const glyfLength = padded.at(-1) ?? 0;
  if (glyfLength === starts.at(-1)) return file;

  // The new tables follow the old file; the directory is told where they are.
  const glyfOffset = roundUp(file.length);
  const locaOffset = glyfOffset + glyfLength;
  const aligned = new Uint8Array(locaOffset + loca.length);
  const alignedView = new DataView(aligned.buffer);
  aligned.set(file);
  starts.forEach((start, glyph) => {
    const end = starts[glyph + 1];
    const place = padded[glyph] ?? 0;
    alignedView.setUint32(locaOffset + glyph * 4, place);
    if (end === undefined) return;
    aligned.set(file.subarray(glyf.offset + start, glyf.offset + end), glyfOffset + place);
  });
  moveTable(alignedView, glyf, glyfOffset, glyfLength);
  moveTable(alignedView, loca, locaOffset, loca.length);
  return aligned;
}

function roundUp(length: number): number {
  return Math.ceil(length / 4) * 4;
}

function findTable(view: DataView, tag: string): Table | null {
  const count = view.getUint16(4);
  for (let index = 0; index < count; index += 1) {
    const entryAt = 12 + index * 16;
    const letters = [0, 1, 2, 3].map((at) => String.fromCharCode(view.getUint8(entryAt + at)));
    if (letters.join('') === tag) {
      return { entryAt, offset: view.getUint32(entryAt + 8), length: view.getUint32(entryAt + 12) };
    }
  }
  return null;
}

function moveTable(view: DataView, table: Table, offset: number, length: number): void {
  view.setUint32(table.entryAt + 8, offset);
  view.setUint32(table.entryAt + 12, length);
}
