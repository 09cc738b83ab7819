/** Fax-coded data of a PDF in a TIFF envelope, so that the picture decoder can read it. */

export interface FaxParameters {
  /** PDF's `K`: below 0 two-dimensional (Group 4), 0 one-dimensional, above 0 mixed. */
  k: number;
  columns: number;
  rows: number;
  /** True when the PDF shows the coder's black runs as white (`BlackIs1` without an inverting `Decode`). */
  inverted: boolean;
}

/** A one-strip TIFF around the data; null for mixed coding. Tags as in TIFF 6.0 (Adobe, 1992). */
export function wrapFaxAsTiff(data: Uint8Array, fax: FaxParameters): Uint8Array | null {
  if (fax.k > 0) return null;
  const short = 3;
  const long = 4;
  const entries: [tag: number, type: number, value: number][] = [
    [256, long, fax.columns],
    [257, long, fax.rows],
    [258, short, 1],
    [259, short, fax.k < 0 ? 4 : 3],
    [262, short, fax.inverted ? 1 : 0],
    [266, short, 1],
    [273, long, 0],
    [277, short, 1],
    [278, long, fax.rows],
    [279, long, data.length],
  ];
  const headerLength = 8 + 2 + entries.length * 12 + 4;
  const file = Buffer.alloc(headerLength + data.length);
  file.write('II', 0, 'latin1');
  file.writeUInt16LE(42, 2);
  file.writeUInt32LE(8, 4);
  file.writeUInt16LE(entries.length, 8);
  entries.forEach(([tag, type, value], index) => {
    const at = 10 + index * 12;
    file.writeUInt16LE(tag, at);
    file.writeUInt16LE(type, at + 2);
    file.writeUInt32LE(1, at + 4);
    const filled = tag === 273 ? headerLength : value;
    if (type === short) file.writeUInt16LE(filled, at + 8);
    else file.writeUInt32LE(filled, at + 8);
  });
  file.set(data, headerLength);
  return file;
}
